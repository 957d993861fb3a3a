import { ArrowLeftRight, BadgeCheck, MoveRight, Pencil, Scissors } from 'lucide-react'
import { type ReactNode, useState } from 'react'
import { Link, useSearchParams } from 'react-router-dom'
import type { Calendar, CalendarBooking } from '../../../shared/bookings/calendar-schemas.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { MoveForm, PullButtons, SplitForm, SwapForm } from './booking-action-forms.tsx'
import { StateMark } from './booking-cell.tsx'
import { FlagLine } from '../../ui/flag-line.tsx'
import { lengthWords } from './booking-flags.tsx'
import { useBookingMoves } from './booking-moves-context.ts'
import type { BookingStep } from './booking-steps.ts'
import { searchWith } from './calendar-address.ts'
import { stateStep } from './crew-weeks-steps.ts'
import { daysInWords } from './drag-plan.ts'

type Props = {
  calendar: Calendar
  booking: CalendarBooking
  stretch: readonly string[]
  mayEdit: boolean
  onDone: () => void
}

type Part = 'move' | 'split' | 'swap'

function About({ booking, stretch }: { booking: CalendarBooking; stretch: readonly string[] }) {
  const flags = booking.days.flatMap((day) => day.flags)
  const length = lengthWords(booking)
  const isPart = stretch.length < booking.allDays.length
  return (
    <div className="space-y-1">
      <p className="flex flex-wrap items-center gap-x-3">
        <span>{booking.crew.name}</span>
        <StateMark state={booking.state} />
      </p>
      <p>
        {daysInWords(stretch)}
        {isPart ? ` of ${booking.allDays.length}` : ''}
      </p>
      {length ? <FlagLine weight="caution">{length}</FlagLine> : null}
      {flags.slice(0, 3).map((flag) => (
        <FlagLine key={`${flag.code} ${flag.text}`} weight={flag.weight}>
          {flag.text}
        </FlagLine>
      ))}
      {flags.length > 3 ? <p className="text-sm">and {flags.length - 3} more</p> : null}
    </div>
  )
}

function Pick(props: { icon: ReactNode; children: string; isOpen?: boolean; onClick: () => void }) {
  return (
    <Button
      kind="plain"
      className="w-full justify-start!"
      aria-expanded={props.isOpen}
      onClick={props.onClick}
    >
      {props.icon}
      {props.children}
    </Button>
  )
}

/** Everything that can be done with a booking without dragging it. */
export function BookingActions({ calendar, booking, stretch, mayEdit, onDone }: Props) {
  const [search] = useSearchParams()
  const [open, setOpen] = useState<Part | null>(null)
  const moves = useBookingMoves()
  const make = (step: BookingStep | null) => {
    onDone()
    if (step) moves.make(step)
  }
  const toggle = (part: Part) => setOpen(open === part ? null : part)
  const given = { calendar, booking, stretch, onMake: make }
  const isFirm = booking.state === 'firm'
  return (
    <div className="space-y-3">
      <About booking={booking} stretch={stretch} />
      <Link
        className={buttonClass('plain')}
        to={`/calendar/bookings/${booking.id}${searchWith(search, {})}`}
        onClick={onDone}
      >
        Open the booking
      </Link>
      {mayEdit ? (
        <div className="space-y-2">
          <Pick
            icon={isFirm ? <Pencil size={18} aria-hidden /> : <BadgeCheck size={18} aria-hidden />}
            onClick={() => make(stateStep(booking))}
          >
            {isFirm ? 'Back to pencil' : 'Make it firm'}
          </Pick>
          <PullButtons {...given} />
          <Pick
            icon={<MoveRight size={18} aria-hidden />}
            isOpen={open === 'move'}
            onClick={() => toggle('move')}
          >
            Move
          </Pick>
          {open === 'move' ? <MoveForm {...given} /> : null}
          {booking.allDays.length > 1 ? (
            <Pick
              icon={<Scissors size={18} aria-hidden />}
              isOpen={open === 'split'}
              onClick={() => toggle('split')}
            >
              Split
            </Pick>
          ) : null}
          {open === 'split' ? <SplitForm {...given} /> : null}
          <Pick
            icon={<ArrowLeftRight size={18} aria-hidden />}
            isOpen={open === 'swap'}
            onClick={() => toggle('swap')}
          >
            Change places
          </Pick>
          {open === 'swap' ? <SwapForm {...given} /> : null}
        </div>
      ) : null}
    </div>
  )
}
