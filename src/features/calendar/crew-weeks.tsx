import { DndContext } from '@dnd-kit/core'
import { useQuery } from '@tanstack/react-query'
import { type KeyboardEvent, useMemo, useState } from 'react'
import type { Calendar } from '../../../shared/bookings/calendar-schemas.ts'
import { EmptyState } from '../../ui/states.tsx'
import { useBookingMoves } from './booking-moves-context.ts'
import { calendarQueries } from './calendar-queries.ts'
import { daysFromTo } from './calendar-with-step.ts'
import { CrewWeeksHead } from './crew-weeks-head.tsx'
import { cellInReach } from './crew-weeks-keyboard.ts'
import { type Bar, crewRowOf, gridColumnsOf } from './crew-weeks-layout.ts'
import { CrewWeeksRow } from './crew-weeks-row.tsx'
import { pullStep } from './crew-weeks-steps.ts'
import './crew-weeks.css'
import { DragGhost } from './drag-ghost.tsx'
import { weightOf } from './drag-plan.ts'
import { JobChips } from './job-chips.tsx'
import { useBarFocus } from './use-bar-focus.ts'
import { useCrewWeeksDrag } from './use-crew-weeks-drag.ts'
import { type Opened, OpenedBooking } from './opened-booking.tsx'

type Props = { calendar: Calendar; weeks: number; mayEdit: boolean; isWall: boolean }

function Jobs() {
  const { data } = useQuery(calendarQueries.unbooked())
  return data ? <JobChips jobs={data.jobs} crews={data.crews} /> : null
}

function useCrewWeeks({ calendar }: Props) {
  const moves = useBookingMoves()
  const [grid, setGrid] = useState<HTMLElement | null>(null)
  const [opened, setOpened] = useState<Opened | null>(null)
  const [stopKey, setStopKey] = useState<string | null>(null)
  const focus = useBarFocus(grid)
  const days = useMemo(
    () => daysFromTo({ from: calendar.from, to: calendar.to }),
    [calendar.from, calendar.to],
  )
  const dragging = useCrewWeeksDrag({
    calendar,
    days,
    onDrop: (step, options) => {
      const [part] = step.parts
      if (part) focus.keep(part.id)
      moves.make(step, options)
    },
  })
  const open = (bar: Bar, anchor: HTMLElement) => {
    focus.keep(bar.booking.id)
    setOpened({ bookingId: bar.booking.id, stretch: bar.stretch, anchor })
  }
  const press = (bar: Bar, event: KeyboardEvent<HTMLElement>, mayEdit: boolean) => {
    if (dragging.drag) return
    const by = { ArrowRight: 1, ArrowLeft: -1 } as const
    if (event.key === 'Enter') open(bar, event.currentTarget)
    else if (
      event.shiftKey &&
      mayEdit &&
      (event.key === 'ArrowRight' || event.key === 'ArrowLeft')
    ) {
      event.preventDefault()
      const step = pullStep(calendar, bar.booking, bar.stretch, { end: 'last', by: by[event.key] })
      focus.keep(bar.booking.id)
      if (step) moves.make(step)
    } else focus.step(event)
  }
  const keys = useMemo(
    () =>
      calendar.crews.flatMap(({ id }) => crewRowOf(calendar, id, days).bars.map((bar) => bar.key)),
    [calendar, days],
  )
  const stop = stopKey !== null && keys.includes(stopKey) ? stopKey : (keys[0] ?? null)
  return { setGrid, days, dragging, open, press, opened, setOpened, stop, setStopKey }
}

/** Crews down, days across: bookings carried from day to day and crew to crew, pulled, split and swapped. */
export function CrewWeeks(props: Props) {
  const { calendar, weeks, mayEdit, isWall } = props
  const { setGrid, days, dragging, opened, setOpened, open, press, stop, setStopKey } =
    useCrewWeeks(props)
  const { drag, landing, context } = dragging
  const sizes = useMemo(
    () => gridColumnsOf(calendar, days, { weeks, isWall }),
    [calendar, days, weeks, isWall],
  )
  const close = () => setOpened(null)
  if (calendar.crews.length === 0)
    return (
      <EmptyState title="There is no crew yet">
        Add a crew and who is in it under People first.
      </EmptyState>
    )
  return (
    <DndContext {...context} collisionDetection={cellInReach}>
      <div
        ref={setGrid}
        role="group"
        aria-label="Crew weeks"
        className={`crew-weeks relative flex flex-col overflow-auto rounded-md border-2 border-ink-soft bg-sheet ${isWall ? 'h-[calc(100dvh-5.5rem)]' : 'max-h-[calc(100dvh-7rem)]'}`}
      >
        <CrewWeeksHead calendar={calendar} days={days} {...sizes} />
        {calendar.crews.map((crew) => (
          <CrewWeeksRow
            key={crew.id}
            calendar={calendar}
            crew={crew}
            days={days}
            {...sizes}
            mayEdit={mayEdit}
            landing={
              landing?.crewId === crew.id && !landing.isIdle
                ? { days: landing.days, weight: weightOf(landing) }
                : null
            }
            inHandKey={drag && drag.kind !== 'job' ? drag.bar.key : null}
            stopKey={stop}
            onOpen={open}
            onKey={(bar, event) => press(bar, event, mayEdit)}
            onFocus={setStopKey}
          />
        ))}
      </div>
      {mayEdit && !isWall ? <Jobs /> : null}
      {drag ? <DragGhost calendar={calendar} drag={drag} landing={landing} /> : null}
      <OpenedBooking calendar={calendar} opened={opened} mayEdit={mayEdit} onClose={close} />
    </DndContext>
  )
}
