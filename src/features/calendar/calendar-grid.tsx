import type { EventClickArg, EventContentArg, EventDropArg, EventInput } from '@fullcalendar/core'
import enAu from '@fullcalendar/core/locales/en-au'
import dayGridPlugin from '@fullcalendar/daygrid'
import interactionPlugin, { type DropArg } from '@fullcalendar/interaction'
import FullCalendar from '@fullcalendar/react'
import type {
  Calendar,
  CalendarBooking,
  CalendarDay,
} from '../../../shared/bookings/calendar-schemas.ts'
import { type Day, formatDay } from '../../../shared/calendar/days.ts'
import { whyNotWorked } from '../../../shared/calendar/working-days.ts'
import { BookingCell, cellClass } from './booking-cell.tsx'
import type { CalendarView } from './calendar-address.ts'
import './calendar-grid.css'

type Props = {
  calendar: Calendar
  view: CalendarView
  on: Day
  mayEdit: boolean
  onOpen: (bookingId: string) => void
  onMove: (booking: CalendarBooking, move: { from: Day; to: Day }) => void
  onDropJob: (jobId: string, day: Day) => void
}

type Shown = { booking: CalendarBooking; day: CalendarDay }

function eventsOf(calendar: Calendar, mayEdit: boolean): EventInput[] {
  return calendar.bookings.flatMap((booking) =>
    booking.days.map((day): EventInput => {
      const shown: Shown = { booking, day }
      return {
        id: day.id,
        start: day.day,
        allDay: true,
        title: `${booking.crew.letter} ${booking.job.number}`,
        editable: mayEdit && !day.worked,
        extendedProps: shown,
      }
    }),
  )
}

const shownOf = (props: Record<string, unknown>): Shown => props as Shown

function EventCell({ event }: EventContentArg) {
  const { booking, day } = shownOf(event.extendedProps)
  return (
    <span className={`${cellClass(booking.state)} p-1.5 text-sm`}>
      <BookingCell booking={booking} day={day} />
    </span>
  )
}

/** The wall planner: one cell a booked day, dragged to another day to move it and the days after it. */
export function CalendarGrid(props: Props) {
  const { calendar, view, on, mayEdit, onOpen, onMove, onDropJob } = props
  const drop = (arg: EventDropArg) => {
    const { booking, day } = shownOf(arg.oldEvent.extendedProps)
    // The grid shows what the data says; the move puts it there.
    arg.revert()
    onMove(booking, { from: day.day, to: arg.event.startStr.slice(0, 10) })
  }
  const dropJob = (arg: DropArg) => {
    const jobId = arg.draggedEl.dataset['job']
    if (jobId) onDropJob(jobId, arg.dateStr.slice(0, 10))
  }
  return (
    <div className="wall-planner">
      <FullCalendar
        key={`${view} ${calendar.from} ${calendar.to}`}
        plugins={[dayGridPlugin, interactionPlugin]}
        locale={enAu}
        firstDay={1}
        headerToolbar={false}
        initialView={view === 'week' ? 'dayGridWeek' : 'dayGridMonth'}
        initialDate={on}
        now={calendar.today}
        fixedWeekCount={false}
        height="auto"
        events={eventsOf(calendar, mayEdit)}
        eventOrder="title"
        eventInteractive
        eventContent={EventCell}
        eventDidMount={({ el, event }) => {
          const { booking, day } = shownOf(event.extendedProps)
          el.setAttribute('role', 'button')
          el.setAttribute('data-booking', booking.id)
          el.setAttribute(
            'aria-label',
            `${formatDay(day.day)}: ${booking.job.title}, ${booking.crew.name}, ${booking.state}. Open the booking`,
          )
        }}
        eventClick={(arg: EventClickArg) => {
          arg.jsEvent.preventDefault()
          onOpen(shownOf(arg.event.extendedProps).booking.id)
        }}
        eventDrop={drop}
        droppable={mayEdit}
        drop={dropJob}
        dragScroll
        longPressDelay={400}
        dayHeaderContent={({ date, text }) => (view === 'week' ? formatDay(dayOf(date)) : text)}
        dayCellClassNames={({ date }) =>
          whyNotWorked(calendar, dayOf(date)) ? ['day-not-worked'] : []
        }
        dayCellContent={({ date, dayNumberText }) => {
          const closed = calendar.closedDays.find((c) => c.day === dayOf(date))
          return closed ? `${dayNumberText} ${closed.name}` : dayNumberText
        }}
      />
    </div>
  )
}

/** A cell's date as the firm's calendar day: the grid counts in the browser's own zone. */
function dayOf(date: Date): Day {
  const month = String(date.getMonth() + 1).padStart(2, '0')
  return `${date.getFullYear()}-${month}-${String(date.getDate()).padStart(2, '0')}`
}
