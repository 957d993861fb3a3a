import { useQuery } from '@tanstack/react-query'
import type { FormEvent } from 'react'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { Note } from '../../ui/states.tsx'
import { BookingFields, CrewField } from './booking-fields.tsx'
import { calendarQueries } from './calendar-queries.ts'
import { DaysEditor } from './days-editor.tsx'
import { FormFailure, issuesOf } from './form-failure.tsx'
import { type BookingEditProps, sideOfDraft, useBookingEdit } from './use-booking-edit.ts'

type Edit = ReturnType<typeof useBookingEdit>

function RestoreBooking({ edit }: { edit: Edit }) {
  return (
    <div className="space-y-3">
      <FormFailure error={edit.failure} />
      <Button busy={edit.isPending} onClick={edit.bringBack}>
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
  const { base, draft, setDraft, failure, isPending } = edit
  const { data } = useQuery(calendarQueries.unbooked())
  const formRef = useFaultFocus(failure)
  if (booking.cancelled) return <RestoreBooking edit={edit} />
  const issueAt = issuesOf(failure)
  const set = (changes: Partial<typeof draft>) => setDraft({ ...draft, ...changes })
  const submit = (event: FormEvent) => {
    event.preventDefault()
    edit.save(sideOfDraft(draft))
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
          onMove={edit.move}
        />
        <CrewField
          crews={data?.crews ?? [booking.crew]}
          crewId={draft.crewId}
          onChange={(crewId) => set({ crewId })}
          error={issueAt('crewId')}
        />
        <BookingFields values={draft} onChange={set} issueAt={issueAt} />
        <FormFailure error={failure} />
        <div className="flex flex-wrap gap-2">
          <Button type="submit" busy={isPending}>
            Save
          </Button>
          <Button kind="danger" busy={isPending} onClick={edit.drop}>
            Cancel the booking
          </Button>
        </div>
      </form>
    </section>
  )
}
