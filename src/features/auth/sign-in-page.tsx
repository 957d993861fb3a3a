import { type FormEvent, Suspense, useState } from 'react'
import { Link, Navigate, useSearchParams } from 'react-router-dom'
import { issueAt } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { useSignIn } from './auth-queries.ts'
import { PublicPage } from './public-page.tsx'
import { wayBack } from './way-back.ts'

function SignInForm() {
  const { user } = useSession()
  const [params] = useSearchParams()
  const [email, setEmail] = useState('')
  const [password, setPassword] = useState('')
  const signIn = useSignIn()
  if (user) return <Navigate to={wayBack(params.get('to'))} replace />
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (!signIn.isPending) signIn.mutate({ email, password })
  }
  return (
    <form onSubmit={submit} noValidate className="space-y-4">
      <Field label="E-mail" error={issueAt(signIn.error, 'email')}>
        <TextInput
          type="email"
          autoComplete="username"
          autoFocus
          value={email}
          onChange={(e) => setEmail(e.target.value)}
        />
      </Field>
      <Field label="Password" error={issueAt(signIn.error, 'password')}>
        <TextInput
          type="password"
          autoComplete="current-password"
          value={password}
          onChange={(e) => setPassword(e.target.value)}
        />
      </Field>
      <FormFailure error={signIn.error} shownPaths={['email', 'password']} />
      <Button type="submit" busy={signIn.isPending} className="w-full">
        Sign in
      </Button>
      <p>
        <Link to="/reset" className="font-semibold text-chalk underline">
          Forgotten the password?
        </Link>
      </p>
    </form>
  )
}

export function SignInPage() {
  return (
    <PublicPage title="Sign in">
      <Suspense fallback={<PageSkeleton />}>
        <SignInForm />
      </Suspense>
    </PublicPage>
  )
}
