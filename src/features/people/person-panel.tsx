import { type FormEvent, useState } from 'react'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { Crew, Person } from '../../../shared/people/people-schemas.ts'
import { issueAt } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { Field } from '../../ui/field.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { useToast } from '../../ui/toast.tsx'
import { CrewSelect } from './crew-select.tsx'
import { useAddLeave, useDropLeave, useInviteAgain, useMoveCrew } from './people-queries.ts'
import { PersonForm } from './person-form.tsx'

type Props = { person: Person; crews: Crew[]; onClose: () => void }

function CrewMove({ person, crews }: Omit<Props, 'onClose'>) {
  const { firm } = useSession()
  const [crewId, setCrewId] = useState(person.crewId ?? '')
  const [from, setFrom] = useState(firm.today)
  const move = useMoveCrew()
  const formRef = useFaultFocus(move.error)
  const toast = useToast()
  const nameOf = (id: string | null) => crews.find((crew) => crew.id === id)?.name ?? 'no crew'
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (move.isPending) return
    move.mutate(
      { id: person.id, crewId: crewId || null, from },
      {
        onSuccess: () =>
          toast(`${person.name}: ${nameOf(crewId || null)} from ${formatDay(from)}.`),
      },
    )
  }
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-3">
      <p className="text-ink-soft">
        Now in {nameOf(person.crewId)}.
        {person.nextMove
          ? ` From ${formatDay(person.nextMove.from)}: ${nameOf(person.nextMove.crewId)}.`
          : ''}
      </p>
      <div className="grid gap-3 sm:grid-cols-2">
        <Field label="Crew" error={issueAt(move.error, 'crewId')}>
          <CrewSelect crews={crews} value={crewId} onChange={setCrewId} />
        </Field>
        <Field label="From" error={issueAt(move.error, 'from')}>
          <TextInput
            type="date"
            value={from}
            min={firm.today}
            onChange={(event) => setFrom(event.target.value)}
          />
        </Field>
      </div>
      <FormFailure error={move.error} shownPaths={['crewId', 'from']} />
      <Button type="submit" kind="plain" busy={move.isPending}>
        Move
      </Button>
    </form>
  )
}

function LeaveForm({ person }: { person: Person }) {
  const { firm } = useSession()
  const [startsOn, setStartsOn] = useState(firm.today)
  const [endsOn, setEndsOn] = useState(firm.today)
  const [reason, setReason] = useState('')
  const add = useAddLeave()
  const formRef = useFaultFocus(add.error)
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (add.isPending) return
    add.mutate({ id: person.id, startsOn, endsOn, reason }, { onSuccess: () => setReason('') })
  }
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-3">
      <div className="grid gap-3 sm:grid-cols-2">
        <Field label="First day away" error={issueAt(add.error, 'startsOn')}>
          <TextInput
            type="date"
            value={startsOn}
            onChange={(event) => {
              setStartsOn(event.target.value)
              if (endsOn < event.target.value) setEndsOn(event.target.value)
            }}
          />
        </Field>
        <Field label="Last day away" error={issueAt(add.error, 'endsOn')}>
          <TextInput
            type="date"
            value={endsOn}
            onChange={(event) => setEndsOn(event.target.value)}
          />
        </Field>
      </div>
      <Field
        label="Reason"
        hint="Trade school, annual leave …"
        error={issueAt(add.error, 'reason')}
      >
        <TextInput value={reason} onChange={(event) => setReason(event.target.value)} />
      </Field>
      <FormFailure error={add.error} shownPaths={['startsOn', 'endsOn', 'reason']} />
      <Button type="submit" kind="plain" busy={add.isPending}>
        Add leave
      </Button>
    </form>
  )
}

function Leave({ person }: { person: Person }) {
  const add = useAddLeave()
  const drop = useDropLeave()
  const toast = useToast()
  const takeBack = ({ id, ...leave }: Person['leave'][number]) =>
    drop.mutate(
      { id: person.id, leaveId: id },
      {
        onSuccess: () =>
          toast('Leave taken back.', { undo: () => add.mutate({ id: person.id, ...leave }) }),
      },
    )
  return (
    <div className="space-y-3">
      {person.leave.length === 0 ? <p className="text-ink-soft">None from today on.</p> : null}
      <ul className="space-y-2">
        {person.leave.map((leave) => (
          <li key={leave.id} className="flex items-center justify-between gap-3">
            <span>
              {formatDay(leave.startsOn)}
              {leave.endsOn === leave.startsOn ? '' : ` to ${formatDay(leave.endsOn)}`}
              {leave.reason ? ` · ${leave.reason}` : ''}
            </span>
            <Button
              kind="quiet"
              onClick={() => takeBack(leave)}
              aria-label={`Take back leave from ${formatDay(leave.startsOn)}`}
            >
              Take back
            </Button>
          </li>
        ))}
      </ul>
      <LeaveForm person={person} />
    </div>
  )
}

/** One person beside the list: details, crew, leave, link to sign in. */
export function PersonPanel({ person, crews, onClose }: Props) {
  const invite = useInviteAgain()
  const toast = useToast()
  return (
    <Dialog open onClose={onClose} title={person.name} place="panel">
      <PersonForm key={person.version} person={person} crews={crews} onDone={onClose} />
      <section className="mt-8 border-t border-rule pt-4">
        <h2 className="mb-2 text-lg font-extrabold">Crew</h2>
        <CrewMove person={person} crews={crews} />
      </section>
      <section className="mt-8 border-t border-rule pt-4">
        <h2 className="mb-2 text-lg font-extrabold">Leave</h2>
        <Leave person={person} />
      </section>
      <section className="mt-8 border-t border-rule pt-4">
        <h2 className="mb-2 text-lg font-extrabold">Link to sign in</h2>
        <p className="mb-2 text-ink-soft">
          {person.invited
            ? 'Has not chosen a password yet.'
            : 'Has a password. A new link lets them choose another.'}
        </p>
        <Button
          kind="plain"
          busy={invite.isPending}
          disabled={!person.active}
          onClick={() =>
            invite.mutate(person.id, {
              onSuccess: () => toast(`A link is on its way to ${person.email}.`),
            })
          }
        >
          Send a link
        </Button>
      </section>
    </Dialog>
  )
}
