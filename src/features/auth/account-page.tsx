import { type FormEvent, useState } from 'react'
import { roleNames } from '../../../shared/auth/roles.ts'
import { issueAt } from '../../lib/failure-text.ts'
import { setPreference, usePreference } from '../../lib/preferences.ts'
import { useUser } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { Field } from '../../ui/field.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { Segmented } from '../../ui/segmented.tsx'
import { useToast } from '../../ui/toast.tsx'
import { useChangePassword, useSignOut } from './auth-queries.ts'
import { OwnTickets } from './own-tickets.tsx'

const looks = [
  { value: '', label: 'As the device' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
] as const

const sunlight = [
  { value: '', label: 'Off' },
  { value: 'on', label: 'On' },
] as const

function PasswordForm() {
  const [current, setCurrent] = useState('')
  const [next, setNext] = useState('')
  const change = useChangePassword()
  const toast = useToast()
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (change.isPending) return
    change.mutate(
      { current, next },
      {
        onSuccess: () => {
          setCurrent('')
          setNext('')
          toast('Password changed. Other devices are signed out.')
        },
      },
    )
  }
  return (
    <form onSubmit={submit} noValidate className="space-y-4">
      <Field label="Password now" error={issueAt(change.error, 'current')}>
        <TextInput
          type="password"
          autoComplete="current-password"
          value={current}
          onChange={(e) => setCurrent(e.target.value)}
        />
      </Field>
      <Field label="New password" error={issueAt(change.error, 'next')}>
        <TextInput
          type="password"
          autoComplete="new-password"
          value={next}
          onChange={(e) => setNext(e.target.value)}
        />
      </Field>
      <FormFailure error={change.error} shownPaths={['current', 'next']} />
      <Button type="submit" busy={change.isPending}>
        Change password
      </Button>
    </form>
  )
}

export function AccountPage() {
  const user = useUser()
  const signOut = useSignOut()
  const theme = usePreference('theme')
  const sun = usePreference('sunlight')
  return (
    <>
      <PageHeader
        title={user.name}
        lead={`${roleNames[user.role]} · ${user.email}`}
        actions={
          <Button kind="plain" busy={signOut.isPending} onClick={() => signOut.mutate()}>
            Sign out
          </Button>
        }
      />
      <div className="grid items-start gap-4 lg:grid-cols-2">
        <OwnTickets />
        <Card>
          <h2 className="mb-3 text-lg font-extrabold">Change password</h2>
          <PasswordForm />
        </Card>
        <Card className="space-y-4">
          <h2 className="text-lg font-extrabold">How this device looks</h2>
          <div>
            <p className="mb-1 font-semibold">Light or dark</p>
            <Segmented
              label="Light or dark"
              options={looks}
              value={theme as '' | 'light' | 'dark'}
              onChange={(value) => setPreference('theme', value)}
            />
          </div>
          <div>
            <p className="mb-1 font-semibold">Sunlight</p>
            <Segmented
              label="Sunlight"
              options={sunlight}
              value={sun as '' | 'on'}
              onChange={(value) => setPreference('sunlight', value)}
            />
            <p className="mt-1 text-sm text-ink-soft">Black on white, no greys, larger numbers.</p>
          </div>
        </Card>
      </div>
    </>
  )
}
