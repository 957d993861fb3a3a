import { Minus, Plus } from 'lucide-react'
import { type FormEvent, type ReactNode, useEffect, useRef, useState } from 'react'
import type { Calendar, CalendarBooking } from '../../../shared/bookings/calendar-schemas.ts'
import { type Day, formatDay } from '../../../shared/calendar/days.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import { type BookingStep, nameOf } from './booking-steps.ts'
import { moveStep, pullStep, splitStep, swapStep } from './crew-weeks-steps.ts'
import { daysInWords, placeOf } from './drag-plan.ts'

type Props = {
  calendar: Calendar
  booking: CalendarBooking
  stretch: readonly Day[]
  /** null: nothing can come of it. */
  onMake: (step: BookingStep | null) => void
}

/** A form that opens inside the panel, brought into sight. */
function ActionForm(props: { label: string; onSubmit: () => void; children: ReactNode }) {
  const form = useRef<HTMLFormElement>(null)
  useEffect(() => {
    // Newer browsers answer with a promise, which an effect must not hand back.
    void form.current?.scrollIntoView({ block: 'nearest' })
  }, [])
  const submit = (event: FormEvent) => {
    event.preventDefault()
    props.onSubmit()
  }
  return (
    <form
      ref={form}
      onSubmit={submit}
      aria-label={props.label}
      className="space-y-3 border-l-4 border-rule pl-3"
    >
      {props.children}
    </form>
  )
}

/** The run's last day one working day later or earlier. */
export function PullButtons({ calendar, booking, stretch, onMake }: Props) {
  const by = (days: 1 | -1) => pullStep(calendar, booking, stretch, { end: 'last', by: days })
  const shorter = by(-1)
  return (
    <div className="grid grid-cols-2 gap-2">
      <Button kind="plain" className="px-2!" disabled={!shorter} onClick={() => onMake(shorter)}>
        <Minus size={18} aria-hidden />A day less
      </Button>
      <Button kind="plain" className="px-2!" onClick={() => onMake(by(1))}>
        <Plus size={18} aria-hidden />A day more
      </Button>
    </div>
  )
}

export function MoveForm({ calendar, booking, stretch, onMake }: Props) {
  const { worked } = placeOf(booking)
  const firstAhead = stretch.find((day) => !worked.has(day))
  const [to, setTo] = useState(firstAhead ?? '')
  const [crewId, setCrewId] = useState(booking.crew.id)
  if (!firstAhead)
    return <p className="text-ink-soft">These days have been worked and stay where they are.</p>
  const move = () => {
    if (to !== '') onMake(moveStep(calendar, booking, { from: firstAhead, to, crewId }))
  }
  return (
    <ActionForm onSubmit={move} label="Move the booking">
      <Field label="Crew">
        <Select value={crewId} onChange={(e) => setCrewId(e.target.value)}>
          {calendar.crews.map((crew) => (
            <option key={crew.id} value={crew.id}>
              {crew.name}
            </option>
          ))}
        </Select>
      </Field>
      <Field label={`${formatDay(firstAhead)} goes to`} hint="The days after it go along.">
        <TextInput type="date" value={to} onChange={(e) => setTo(e.target.value)} />
      </Field>
      <Button type="submit">Move it</Button>
    </ActionForm>
  )
}

export function SplitForm({ booking, onMake }: Props) {
  const at = booking.allDays.slice(1).filter((day) => splitStep(booking, day) !== null)
  const [day, setDay] = useState(at[0] ?? '')
  if (at.length === 0)
    return <p className="text-ink-soft">No day ahead to split it at: worked days stay together.</p>
  return (
    <ActionForm onSubmit={() => onMake(splitStep(booking, day))} label="Split the booking">
      <Field label="From this day on it is a booking of its own">
        <Select value={day} onChange={(e) => setDay(e.target.value)}>
          {at.map((one) => (
            <option key={one} value={one}>
              {formatDay(one)}
            </option>
          ))}
        </Select>
      </Field>
      <Button type="submit">Split it</Button>
    </ActionForm>
  )
}

export function SwapForm({ calendar, booking, onMake }: Props) {
  const others = calendar.bookings
    .filter((other) => other.id !== booking.id && swapStep(calendar, booking, other) !== null)
    .sort((a, b) => (a.firstDay < b.firstDay ? -1 : 1))
  const [otherId, setOtherId] = useState(others[0]?.id ?? '')
  const other = others.find((one) => one.id === otherId)
  if (!other) return <p className="text-ink-soft">No other booking here to change places with.</p>
  return (
    <ActionForm
      onSubmit={() => onMake(swapStep(calendar, booking, other))}
      label="Change places with another booking"
    >
      <Field label="Change places with">
        <Select value={otherId} onChange={(e) => setOtherId(e.target.value)}>
          {others.map((one) => (
            <option key={one.id} value={one.id}>
              {nameOf(one)}, {one.crew.name}, {daysInWords(one.allDays)}
            </option>
          ))}
        </Select>
      </Field>
      <Button type="submit">Change places</Button>
    </ActionForm>
  )
}
