import { useState } from 'react'
import type {
  Calendar,
  CalendarBooking,
  CalendarCrew,
} from '../../../shared/bookings/calendar-schemas.ts'
import { type Day, formatDay } from '../../../shared/calendar/days.ts'
import { isWorked, whyNotWorked } from '../../../shared/calendar/working-days.ts'
import { formatHours, formatLoad } from '../../../shared/labour/format-hours.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { EmptyState } from '../../ui/states.tsx'
import { cellClass, StateMark } from './booking-cell.tsx'
import { DayFlagLines } from './booking-flags.tsx'
import { daysFromTo } from './calendar-with-step.ts'
import { type Bar, crewRowOf, type Load, loadOf } from './crew-weeks-layout.ts'
import { type Opened, OpenedBooking } from './opened-booking.tsx'

type Open = (booking: CalendarBooking, stretch: readonly Day[], anchor: HTMLElement) => void

function loadWords({ plannedMinutes, availableMinutes, isBooked }: Load): string {
  if (isBooked) return formatLoad(plannedMinutes, availableMinutes)
  return availableMinutes > 0 ? `free, ${formatHours(availableMinutes)}` : 'nobody there'
}

type Entry = { from: Day; to: Day; there: Bar[]; load: Load | undefined }

/** Days booked one by one; free days of the same hours that follow one another together. */
function entriesOf(calendar: Calendar, crewId: string): Entry[] {
  const days = daysFromTo(calendar)
  const { bars } = crewRowOf(calendar, crewId, days)
  const load = loadOf(calendar, crewId)
  const entries: Entry[] = []
  for (const day of days) {
    const there = bars.filter((bar) => bar.shown.includes(day))
    const isOpen = isWorked(calendar, day) && day >= calendar.today
    if (there.length === 0 && !isOpen) continue
    const entry = { from: day, to: day, there, load: load.get(day) }
    const before = entries[entries.length - 1]
    const isSame =
      before?.there.length === 0 &&
      there.length === 0 &&
      before.load?.availableMinutes === entry.load?.availableMinutes
    if (before && isSame) before.to = day
    else entries.push(entry)
  }
  return entries
}

function BookedBar(props: { bar: Bar; day: Day; mayEdit: boolean; onOpen: Open }) {
  const { bar, day, mayEdit, onOpen } = props
  const { booking, stretch } = bar
  return (
    <button
      type="button"
      onClick={(event) => onOpen(booking, stretch, event.currentTarget)}
      className={`${cellClass(booking.state)} mt-1 min-h-11 w-full p-2`}
    >
      <span className="flex items-start justify-between gap-2">
        <span className="min-w-0 font-semibold [overflow-wrap:anywhere]">{booking.job.title}</span>
        <span className="shrink-0 font-semibold text-chalk underline">
          {mayEdit ? 'Move' : 'Open'}
        </span>
      </span>
      <span className="text-sm">
        <StateMark state={booking.state} />
        <DayFlagLines flags={booking.days.find((one) => one.day === day)?.flags ?? []} />
      </span>
    </button>
  )
}

function CrewDays(props: {
  calendar: Calendar
  crew: CalendarCrew
  mayEdit: boolean
  onOpen: Open
}) {
  const { calendar, crew, mayEdit, onOpen } = props
  return (
    <section aria-label={crew.name}>
      <h3 className="mb-2 flex items-center gap-2 text-lg font-extrabold">
        <CrewPennant {...crew} />
        {crew.name}
      </h3>
      <ol className="space-y-2">
        {entriesOf(calendar, crew.id).map(({ from, to, there, load }) => {
          const isOver = load !== undefined && load.plannedMinutes > load.availableMinutes
          const isToday = from === calendar.today
          const closed = whyNotWorked(calendar, from)
          return (
            <li key={from} className="border-t border-rule pt-2">
              <p className="flex items-baseline justify-between gap-3">
                <span className={isToday ? 'font-extrabold text-clay' : 'font-semibold'}>
                  {formatDay(from)}
                  {from === to ? '' : ` to ${formatDay(to)}`}
                  {isToday && from === to ? ' · today' : ''}
                  {closed ? <span className="font-normal text-ink-soft"> {closed}</span> : null}
                </span>
                <span
                  className={`text-sm ${isOver ? 'font-extrabold text-stop' : 'text-ink-soft'}`}
                >
                  {load ? loadWords(load) : ''}
                  {load && from !== to ? ' a day' : ''}
                </span>
              </p>
              {there.map((bar) => (
                <BookedBar key={bar.key} bar={bar} day={from} mayEdit={mayEdit} onOpen={onOpen} />
              ))}
            </li>
          )
        })}
      </ol>
    </section>
  )
}

/** Crew weeks on a phone: crew by crew, day by day; a press on a booking says what can be done with it. */
export function CrewList({ calendar, mayEdit }: { calendar: Calendar; mayEdit: boolean }) {
  const [opened, setOpened] = useState<Opened | null>(null)
  const close = () => setOpened(null)
  if (calendar.crews.length === 0)
    return <EmptyState title="Nothing is booked here">Look at other weeks.</EmptyState>
  return (
    <div className="space-y-6">
      {calendar.crews.map((crew) => (
        <CrewDays
          key={crew.id}
          calendar={calendar}
          crew={crew}
          mayEdit={mayEdit}
          onOpen={(one, stretch, anchor) => setOpened({ bookingId: one.id, stretch, anchor })}
        />
      ))}
      <OpenedBooking calendar={calendar} opened={opened} mayEdit={mayEdit} onClose={close} />
    </div>
  )
}
