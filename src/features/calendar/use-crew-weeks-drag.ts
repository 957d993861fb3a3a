import {
  type Announcements,
  type DragEndEvent,
  type DragStartEvent,
  KeyboardSensor,
  MouseSensor,
  TouchSensor,
  useSensor,
  useSensors,
} from '@dnd-kit/core'
import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import type { Calendar, UnbookedJob } from '../../../shared/bookings/calendar-schemas.ts'
import type { Day } from '../../../shared/calendar/days.ts'
import { isWorked } from '../../../shared/calendar/working-days.ts'
import type { MakeOptions } from './booking-moves-context.ts'
import type { BookingStep } from './booking-steps.ts'
import { calendarQueries } from './calendar-queries.ts'
import { isCell, keyboardOver } from './crew-weeks-keyboard.ts'
import type { Bar } from './crew-weeks-layout.ts'
import { stepOfDrop, swapInsteadOf } from './crew-weeks-steps.ts'
import { type Cell, type Drag, type Landing, landingOf, placeOf } from './drag-plan.ts'
import { dragWords, landingWords } from './drag-words.ts'

export type DragData = { kind: 'bar'; bar: Bar } | { kind: 'job'; job: UnbookedJob }

const isDragData = (data: unknown): data is DragData =>
  typeof data === 'object' && data !== null && 'kind' in data

function pointOf(event: Event): { x: number; y: number } | null {
  if (event instanceof MouseEvent) return { x: event.clientX, y: event.clientY }
  const touch = 'TouchEvent' in window && event instanceof TouchEvent ? event.touches[0] : undefined
  return touch ? { x: touch.clientX, y: touch.clientY } : null
}

/** The day of the grid under a point; null beside the grid. */
function dayAt({ x, y }: { x: number; y: number }): Day | null {
  const cell = document
    .elementsFromPoint(x, y)
    .find((element) => element instanceof HTMLElement && element.dataset['cell'])
  return cell instanceof HTMLElement ? (cell.dataset['cell']?.split(' ')[1] ?? null) : null
}

function dragOf({ active, activatorEvent }: DragStartEvent): Drag | null {
  const data: unknown = active.data.current
  if (!isDragData(data)) return null
  if (data.kind === 'job') return { kind: 'job', job: data.job }
  const { bar } = data
  const { target } = activatorEvent
  const end = target instanceof HTMLElement ? target.dataset['pull'] : undefined
  if (end === 'first' || end === 'last') return { kind: 'pull', bar, end }
  const { worked } = placeOf(bar.booking)
  const firstAhead = bar.shown.find((day) => !worked.has(day)) ?? bar.shown[0] ?? ''
  const point = pointOf(activatorEvent)
  return { kind: 'move', bar, heldDay: (point && dayAt(point)) ?? firstAhead }
}

/** What the server should be asked about a drag: the first day that moves, or the job. */
function askedOf(drag: Drag | null) {
  if (drag?.kind === 'job') return { jobId: drag.job.id }
  if (drag?.kind !== 'move') return null
  const { worked } = placeOf(drag.bar.booking)
  const day = drag.bar.stretch.find((one) => !worked.has(one))
  return day === undefined ? null : { bookingId: drag.bar.booking.id, day }
}

type Given = {
  calendar: Calendar
  days: readonly Day[]
  onDrop: (step: BookingStep, options: MakeOptions) => void
}

/** What is in hand over the grid, where it would land, and what is said of it. */
export function useCrewWeeksDrag({ calendar, days, onDrop }: Given) {
  const [drag, setDrag] = useState<Drag | null>(null)
  const [cell, setCell] = useState<Cell | null>(null)
  const asked = askedOf(drag)
  const span = { from: calendar.from, to: calendar.to }
  const { data: known } = useQuery({
    ...calendarQueries.landings(asked ?? { jobId: '' }, span),
    enabled: asked !== null,
  })
  const landingAt = (data: unknown): Landing | null =>
    drag && isCell(data) ? landingOf(calendar, drag, data, known) : null
  const landing = landingAt(cell)
  const firstDay =
    days.find((day) => day >= calendar.today && isWorked(calendar, day)) ?? days[0] ?? ''
  const crewIds = calendar.crews.map((crew) => crew.id)
  const sensors = useSensors(
    useSensor(MouseSensor, { activationConstraint: { distance: 6 } }),
    useSensor(TouchSensor, { activationConstraint: { delay: 300, tolerance: 8 } }),
    useSensor(KeyboardSensor, {
      coordinateGetter: keyboardOver({ crewIds, days, firstDay }),
      keyboardCodes: { start: ['Space'], cancel: ['Escape'], end: ['Space', 'Enter'] },
    }),
  )
  const stop = () => {
    setDrag(null)
    setCell(null)
  }
  const drop = ({ over }: DragEndEvent) => {
    const at = landingAt(over?.data.current)
    stop()
    if (!drag || !at || at.isIdle || at.cannot) return
    onDrop(stepOfDrop(calendar, drag, at), { otherWay: swapInsteadOf(calendar, drag, at) })
  }
  const wordsOver = (data: unknown): string => {
    const at = landingAt(data)
    return at ? landingWords(calendar, at) : 'Beside the days.'
  }
  const announcements: Announcements = {
    onDragStart: ({ active }) => {
      const data: unknown = active.data.current
      return isDragData(data) ? dragWords.taken(data) : undefined
    },
    onDragOver: ({ over }) => wordsOver(over?.data.current),
    onDragEnd: ({ over }) =>
      landingAt(over?.data.current)?.cannot || !over
        ? 'Put back where it was.'
        : `Put down. ${wordsOver(over.data.current)}`,
    onDragCancel: () => 'Put back where it was.',
  }
  return {
    drag,
    landing,
    context: {
      sensors,
      accessibility: { announcements, screenReaderInstructions: dragWords.instructions },
      onDragStart: (event: DragStartEvent) => setDrag(dragOf(event)),
      onDragOver: ({ over }: { over: { data: { current?: unknown } } | null }) => {
        const data = over?.data.current
        setCell(isCell(data) ? data : null)
      },
      onDragEnd: drop,
      onDragCancel: stop,
    },
  }
}
