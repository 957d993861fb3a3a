import { type FormEvent, useState } from 'react'
import { Link } from 'react-router-dom'
import { ApiFailure } from '../../lib/api-client.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { useAskReset } from './auth-queries.ts'
import { PublicPage } from './public-page.tsx'

export function AskResetPage() {
  const [email, setEmail] = useState('')
  const ask = useAskReset()
  const failure = ask.error instanceof ApiFailure ? ask.error : null
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (!ask.isPending) ask.mutate(email)
  }
  return (
    <PublicPage title="Reset your password">
      {ask.isSuccess ? (
        <p role="status">
          If that address has an account, a mail with a link is on its way. The link works for two
          hours. Nothing there after a few minutes? Ask the office.
        </p>
      ) : (
        <form onSubmit={submit} noValidate className="space-y-4">
          <Field
            label="E-mail"
            error={failure ? (failure.issueAt('email') ?? failure.message) : undefined}
          >
            <TextInput
              type="email"
              autoComplete="username"
              autoFocus
              value={email}
              onChange={(e) => setEmail(e.target.value)}
            />
          </Field>
          <Button type="submit" busy={ask.isPending} className="w-full">
            Send me a link
          </Button>
        </form>
      )}
      <p className="mt-4">
        <Link to="/sign-in" className="font-semibold text-chalk underline">
          Back to sign-in
        </Link>
      </p>
    </PublicPage>
  )
}
