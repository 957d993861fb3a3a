import { useDroppable } from '@dnd-kit/core'
import { type KeyboardEvent, useMemo } from 'react'
import type { Calendar, CalendarCrew } from '../../../shared/bookings/calendar-schemas.ts'
import { type Day, isoWeekday } from '../../../shared/calendar/days.ts'
import { isWorked } from '../../../shared/calendar/working-days.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { CrewWeeksBar } from './crew-weeks-bar.tsx'
import { type Bar, crewRowOf, loadOf } from './crew-weeks-layout.ts'
import type { LandingWeight } from './drag-plan.ts'
import { LoadCell } from './load-cell.tsx'

export type RowLanding = { days: readonly Day[]; weight: LandingWeight } | null

type Props = {
  calendar: Calendar
  crew: CalendarCrew
  days: readonly Day[]
  columns: string
  minWidth: string
  mayEdit: boolean
  landing: RowLanding
  inHandKey: string | null
  /** The bar that Tab comes to. */
  stopKey: string | null
  onOpen: (bar: Bar, anchor: HTMLElement) => void
  onKey: (bar: Bar, event: KeyboardEvent<HTMLElement>) => void
  onFocus: (key: string) => void
}

const landingClasses: Record<LandingWeight, string> = {
  free: 'lands-free',
  caution: 'lands-caution',
  clash: 'lands-clash',
}

function DayCell(props: {
  crewId: string
  day: Day
  column: number
  looks: string
  mayEdit: boolean
}) {
  const { crewId, day, column, looks, mayEdit } = props
  const { setNodeRef } = useDroppable({
    id: `cell ${crewId} ${day}`,
    data: { crewId, day },
    disabled: !mayEdit,
  })
  return (
    <span
      ref={setNodeRef}
      aria-hidden
      data-cell={`${crewId} ${day}`}
      className={looks}
      style={{ gridColumn: column + 2, gridRow: '1 / -1' }}
    />
  )
}

/** One crew: its bookings over the days, and under them its hours, a day a cell. */
export function CrewWeeksRow(props: Props) {
  const { calendar, crew, days, columns, minWidth, mayEdit, landing, inHandKey, stopKey } = props
  const { bars, laneCount } = useMemo(
    () => crewRowOf(calendar, crew.id, days),
    [calendar, crew.id, days],
  )
  const load = useMemo(() => loadOf(calendar, crew.id), [calendar, crew.id])
  const looksOf = (day: Day): string => {
    const edge = isoWeekday(day) === 1 ? 'border-l-2 border-ink-soft' : 'border-l border-rule'
    const lands = landing?.days.includes(day) ? landingClasses[landing.weight] : ''
    const off = isWorked(calendar, day) ? '' : 'day-off'
    return `${edge} ${off} ${lands}`
  }
  return (
    <section
      aria-label={crew.name}
      data-crew={crew.id}
      className="grid grow border-b-2 border-ink-soft last:border-b-0"
      style={{
        gridTemplateColumns: columns,
        gridTemplateRows: `repeat(${laneCount}, minmax(4.75rem, 1fr)) auto`,
        minWidth,
      }}
    >
      <h3
        className="sticky left-0 z-10 flex flex-col items-start gap-1 border-r-2 border-ink-soft bg-sheet p-2 font-extrabold leading-tight"
        style={{ gridColumn: 1, gridRow: '1 / -1' }}
      >
        <CrewPennant {...crew} />
        <span className="max-w-full text-sm [overflow-wrap:anywhere]">{crew.name}</span>
      </h3>
      {days.map((day, column) => (
        <DayCell
          key={day}
          crewId={crew.id}
          day={day}
          column={column}
          looks={looksOf(day)}
          mayEdit={mayEdit}
        />
      ))}
      {bars.map((bar) => (
        <CrewWeeksBar
          key={bar.key}
          bar={bar}
          mayEdit={mayEdit}
          isFirstStop={stopKey === bar.key}
          isInHand={inHandKey === bar.key}
          onOpen={props.onOpen}
          onKey={props.onKey}
          onFocus={props.onFocus}
        />
      ))}
      {days.map((day, column) => (
        <div
          key={day}
          className="relative min-w-0 overflow-hidden"
          style={{ gridColumn: column + 2, gridRow: laneCount + 1 }}
        >
          <LoadCell day={day} isOff={!isWorked(calendar, day)} load={load.get(day)} />
        </div>
      ))}
    </section>
  )
}
