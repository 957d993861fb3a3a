import { useQuery } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { Note } from '../../ui/states.tsx'
import { BookingFields, CrewField } from './booking-fields.tsx'
import { calendarQueries, conflictOf } from './calendar-queries.ts'
import { ClashAnswer } from './clash-answer.tsx'
import { DaysEditor } from './days-editor.tsx'
import { FormFailure, issuesOf } from './form-failure.tsx'
import {
  type BookingChange,
  type BookingEditProps,
  inputOf,
  useBookingEdit,
} from './use-booking-edit.ts'

type Edit = ReturnType<typeof useBookingEdit>

function RestoreBooking({ edit }: { edit: Edit }) {
  const { restore, bringBack } = edit
  const conflict = conflictOf(restore.error)
  if (conflict)
    return (
      <ClashAnswer
        conflict={conflict}
        busy={restore.isPending}
        onAnswer={bringBack}
        onBack={() => restore.reset()}
      />
    )
  return (
    <div className="space-y-3">
      <FormFailure error={restore.error} />
      <Button busy={restore.isPending} onClick={() => bringBack()}>
        Restore the booking
      </Button>
    </div>
  )
}

function ChangedMeanwhile({ onRestart }: { onRestart: () => void }) {
  return (
    <Note kind="caution" title="Somebody else changed this booking">
      <Button kind="plain" className="mt-2" onClick={onRestart}>
        Start again from what is there now
      </Button>
    </Note>
  )
}

/** Crew, days, state, start and gear of a booking; move, cancel and restore. */
export function BookingEditor(props: BookingEditProps) {
  const { booking } = props
  const edit = useBookingEdit(props)
  const { base, draft, setDraft, send, change, cancel } = edit
  const [asked, setAsked] = useState<BookingChange>({})
  const { data } = useQuery(calendarQueries.unbooked())
  const formRef = useFaultFocus(change.error)
  if (booking.cancelled) return <RestoreBooking edit={edit} />
  const ask = (input: BookingChange) => {
    setAsked(input)
    send(input)
  }
  const conflict = conflictOf(change.error)
  if (conflict)
    return (
      <ClashAnswer
        conflict={conflict}
        busy={change.isPending}
        onAnswer={(said) => ask({ ...asked, ...said })}
        onBack={() => change.reset()}
      />
    )
  const issueAt = issuesOf(change.error)
  const set = (changes: Partial<typeof draft>) => setDraft({ ...draft, ...changes })
  const submit = (event: FormEvent) => {
    event.preventDefault()
    ask(inputOf(draft))
  }
  return (
    <section aria-labelledby="booking-change" className="space-y-4">
      <h3 id="booking-change" className="text-lg font-extrabold">
        Change the booking
      </h3>
      {booking.version === base.version ? null : (
        <ChangedMeanwhile onRestart={() => edit.start(booking)} />
      )}
      <form ref={formRef} onSubmit={submit} noValidate className="space-y-4">
        <DaysEditor
          days={draft.days}
          worked={booking.days.filter((d) => d.worked).map((d) => d.day)}
          onChange={(days) => set({ days })}
          onMove={(move) => ask({ move })}
        />
        <CrewField
          crews={data?.crews ?? [booking.crew]}
          crewId={draft.crewId}
          onChange={(crewId) => set({ crewId })}
          error={issueAt('crewId')}
        />
        <BookingFields values={draft} onChange={set} issueAt={issueAt} />
        <FormFailure error={change.error ?? cancel.error} />
        <div className="flex flex-wrap gap-2">
          <Button type="submit" busy={change.isPending}>
            Save
          </Button>
          <Button kind="danger" busy={cancel.isPending} onClick={edit.drop}>
            Cancel the booking
          </Button>
        </div>
      </form>
    </section>
  )
}
