import { type FormEvent, useState } from 'react'
import type { CalendarCrew, UnbookedJob } from '../../../shared/bookings/calendar-schemas.ts'
import type { BookingState } from '../../../shared/bookings/booking-schemas.ts'
import { RoofGlyph } from '../../drawings/roof-glyph.tsx'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import { useToast } from '../../ui/toast.tsx'
import { BookingFields, CrewField } from './booking-fields.tsx'
import { useBookingMoves } from './booking-moves-context.ts'
import { bookedStep } from './booking-steps.ts'
import { conflictOf, useCreateBooking } from './calendar-queries.ts'
import { ClashAnswer, type OnPurpose } from './clash-answer.tsx'
import { FormFailure, issuesOf } from './form-failure.tsx'
import { workWords } from './work-words.ts'

type Props = {
  jobs: readonly UnbookedJob[]
  crews: readonly CalendarCrew[]
  jobId: string
  day: string
  onDone: () => void
}

function useBookForm({ jobs, crews, jobId, day, onDone }: Props) {
  const toast = useToast()
  const moves = useBookingMoves()
  const create = useCreateBooking()
  const [clientId] = useState(() => crypto.randomUUID())
  const [form, setForm] = useState({
    jobId: jobId || (jobs[0]?.id ?? ''),
    crewId: crews[0]?.id ?? '',
    startsOn: day,
    workingDays: '',
    state: 'pencilled' as BookingState,
    startAt: '',
    gear: '',
  })
  const send = (said: OnPurpose = {}) => {
    if (create.isPending) return
    create.mutate(
      {
        clientId,
        jobId: form.jobId,
        crewId: form.crewId,
        startsOn: form.startsOn,
        ...(form.workingDays === '' ? {} : { workingDays: Number(form.workingDays) }),
        state: form.state,
        startAt: form.startAt === '' ? null : form.startAt,
        gear: form.gear,
        ...said,
      },
      {
        onSuccess: (booking) => {
          const step = bookedStep(booking)
          moves.record(step)
          toast(`${step.words}.`, { undo: () => moves.undo(step.id) })
          onDone()
        },
      },
    )
  }
  return {
    form,
    set: (next: Partial<typeof form>) => setForm((now) => ({ ...now, ...next })),
    create,
    send,
  }
}

/** Job, crew, days and state of a new booking. */
export function BookForm(props: Props) {
  const { jobs, crews } = props
  const { form, set, create, send } = useBookForm(props)
  const formRef = useFaultFocus(create.error)
  const conflict = conflictOf(create.error)
  const issueAt = issuesOf(create.error)
  const job = jobs.find((one) => one.id === form.jobId)
  if (conflict)
    return (
      <ClashAnswer
        conflict={conflict}
        busy={create.isPending}
        onAnswer={send}
        onBack={() => create.reset()}
      />
    )
  const submit = (event: FormEvent) => {
    event.preventDefault()
    send()
  }
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-4">
      <Field label="Job" error={issueAt('jobId')}>
        <Select value={form.jobId} onChange={(e) => set({ jobId: e.target.value })}>
          {jobs.map((one) => (
            <option key={one.id} value={one.id}>
              {one.number} {one.title}
            </option>
          ))}
        </Select>
      </Field>
      {job ? (
        <p className="flex items-center gap-3 text-ink-soft">
          {job.glyph ? <RoofGlyph glyph={job.glyph} sizePx={44} /> : null}
          {workWords(job, crews)}
        </p>
      ) : null}
      <CrewField
        crews={crews}
        crewId={form.crewId}
        onChange={(crewId) => set({ crewId })}
        error={issueAt('crewId')}
      />
      <FirstDays
        startsOn={form.startsOn}
        workingDays={form.workingDays}
        daysNeeded={job?.crewDays.find((c) => c.crewId === form.crewId)?.days ?? null}
        onChange={set}
        issueAt={issueAt}
      />
      <BookingFields values={form} onChange={set} issueAt={issueAt} />
      <FormFailure error={create.error} />
      <Button type="submit" busy={create.isPending}>
        Book
      </Button>
    </form>
  )
}

function FirstDays(props: {
  startsOn: string
  workingDays: string
  daysNeeded: number | null
  onChange: (changes: { startsOn?: string; workingDays?: string }) => void
  issueAt: (path: string) => string | undefined
}) {
  const { startsOn, workingDays, daysNeeded, onChange, issueAt } = props
  const about = daysNeeded ? `, about ${daysNeeded}` : ''
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <Field label="First day" error={issueAt('startsOn')}>
        <TextInput
          type="date"
          value={startsOn}
          onChange={(e) => onChange({ startsOn: e.target.value })}
        />
      </Field>
      <Field
        label="Working days"
        hint={`Empty: as many as the work needs${about}.`}
        error={issueAt('workingDays')}
      >
        <TextInput
          type="number"
          inputMode="numeric"
          min={1}
          max={60}
          value={workingDays}
          onChange={(e) => onChange({ workingDays: e.target.value })}
        />
      </Field>
    </div>
  )
}
