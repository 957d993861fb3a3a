import { useQuery } from '@tanstack/react-query'
import { CloudRain } from 'lucide-react'
import { Link, useSearchParams } from 'react-router-dom'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { RainOffRow } from '../../../shared/rain-offs/rain-off-schemas.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { useMay } from '../../lib/session.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { rainOffQueries } from './rain-off-queries.ts'
import { countWords, workingDaysWords } from './rain-off-words.ts'
import { useAnswering } from './use-answering.ts'

/** The panel's address, the calendar's own part kept. */
function panelAddress(search: URLSearchParams, values: Record<string, string>): string {
  const next = new URLSearchParams(search)
  for (const [key, value] of Object.entries(values)) next.set(key, value)
  const text = next.toString()
  return `/calendar/rain-off${text ? `?${text}` : ''}`
}

/** Opens the panel from the calendar's head. */
export function RainOffLink() {
  const [search] = useSearchParams()
  const mayMake = useMay('rain-off:write')
  if (!mayMake) return null
  return (
    <Link className={buttonClass('plain')} to={panelAddress(search, {})}>
      <CloudRain size={20} aria-hidden />
      Rain-off
    </Link>
  )
}

const lineClass =
  'flex flex-wrap items-center justify-between gap-x-4 gap-y-2 rounded-md border border-l-8 bg-sheet px-3 py-2'

function Asked({ row, search }: { row: RainOffRow; search: URLSearchParams }) {
  const values = { asked: row.id, crew: row.crew.id, day: row.fromDay, days: `${row.workingDays}` }
  return (
    <li className={`${lineClass} border-ochre`}>
      <p className="min-w-0 flex-1 basis-64">
        <CrewPennant {...row.crew} className="mr-2 h-6 w-7 align-middle text-sm" />
        <span className="font-semibold">
          {row.askedBy ?? 'Somebody'} asks for a rain-off: {row.crew.name}, {formatDay(row.fromDay)}
          , {workingDaysWords(row.workingDays)}.
        </span>
        {row.reason ? ` “${row.reason}”` : ''}
      </p>
      <Link className={buttonClass('primary')} to={panelAddress(search, values)}>
        Look and answer
      </Link>
    </li>
  )
}

function Made({ row }: { row: RainOffRow }) {
  const answering = useAnswering()
  return (
    <li className={`${lineClass} border-rule`}>
      <p className="min-w-0 flex-1 basis-64">
        <CrewPennant {...row.crew} className="mr-2 h-6 w-7 align-middle text-sm" />
        {row.crew.name} rained off from {formatDay(row.fromDay)}:{' '}
        {countWords(row.movedBookings, 'booking')} moved on by {workingDaysWords(row.workingDays)}
        {row.settledBy ? `, by ${row.settledBy}` : ''}.
      </p>
      <Button kind="plain" busy={answering.isPending} onClick={() => answering.undo(row)}>
        Undo the rain-off
      </Button>
    </li>
  )
}

/** Above the calendar, for the office: what is asked for, and what was made today and can be undone. */
export function RainOffBanner() {
  const [search] = useSearchParams()
  const mayMake = useMay('rain-off:write')
  const { data } = useQuery({ ...rainOffQueries.list(), enabled: mayMake })
  const shown = data?.rainOffs.filter((row) => row.state === 'asked' || row.canUndo) ?? []
  if (!mayMake || shown.length === 0) return null
  return (
    <ul aria-label="Rain-offs" className="mb-3 space-y-2 print:hidden">
      {shown.map((row) =>
        row.state === 'asked' ? (
          <Asked key={row.id} row={row} search={search} />
        ) : (
          <Made key={row.id} row={row} />
        ),
      )}
    </ul>
  )
}
