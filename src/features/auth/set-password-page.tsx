import { type FormEvent, useState } from 'react'
import { Link, useNavigate, useSearchParams } from 'react-router-dom'
import { passwordMinLength } from '../../../shared/auth/auth-schemas.ts'
import { ApiFailure } from '../../lib/api-client.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { useSetPassword } from './auth-queries.ts'
import { PublicPage } from './public-page.tsx'

/** Where the link of an invitation or a reset leads. */
export function SetPasswordPage() {
  const [params] = useSearchParams()
  const [password, setPassword] = useState('')
  const navigate = useNavigate()
  const set = useSetPassword()
  const failure = set.error instanceof ApiFailure ? set.error : null
  const linkFault = failure?.issueAt('token')
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (set.isPending) return
    set.mutate(
      { token: params.get('token') ?? '', password },
      { onSuccess: () => void navigate('/', { replace: true }) },
    )
  }
  return (
    <PublicPage title="Choose a password">
      <form onSubmit={submit} noValidate className="space-y-4">
        <Field
          label="New password"
          hint={`At least ${passwordMinLength} characters. A few plain words in a row do well.`}
          error={
            failure && !linkFault ? (failure.issueAt('password') ?? failure.message) : undefined
          }
        >
          <TextInput
            type="password"
            autoComplete="new-password"
            autoFocus
            value={password}
            onChange={(e) => setPassword(e.target.value)}
          />
        </Field>
        {linkFault ? (
          <p role="alert" className="font-semibold text-stop">
            {linkFault}{' '}
            <Link to="/reset" className="text-chalk underline">
              Send a new link
            </Link>
          </p>
        ) : null}
        <Button type="submit" busy={set.isPending} className="w-full">
          Save and sign in
        </Button>
      </form>
    </PublicPage>
  )
}
