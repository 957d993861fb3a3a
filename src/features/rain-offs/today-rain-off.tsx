import { useQuery } from '@tanstack/react-query'
import { CloudRain } from 'lucide-react'
import { Link } from 'react-router-dom'
import { dayPlus, formatDay } from '../../../shared/calendar/days.ts'
import type { RainOffRow } from '../../../shared/rain-offs/rain-off-schemas.ts'
import { useMay } from '../../lib/session.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Note } from '../../ui/states.tsx'
import { rainOffQueries } from './rain-off-queries.ts'
import { workingDaysWords } from './rain-off-words.ts'
import { useAnswering } from './use-answering.ts'

const shownDaysBack = 2

function stateWords(row: RainOffRow): string {
  const day = formatDay(row.fromDay)
  const by = row.settledBy ?? 'The office'
  if (row.state === 'asked')
    return `Rain-off asked for ${day}, ${workingDaysWords(row.workingDays)}. The office has it.`
  if (row.state === 'made')
    return `${by} has moved the crew on from ${day}. See the next booked day.`
  if (row.state === 'undone')
    return `The rain-off of ${day} is taken back: the days stand as before.`
  return `${by} said no to a rain-off on ${day}. Ring the office.`
}

function Answer({ row }: { row: RainOffRow }) {
  const answering = useAnswering()
  return (
    <Note kind={row.state === 'asked' ? 'plain' : 'caution'} title={stateWords(row)}>
      {row.reason ? <p className="text-base">“{row.reason}”</p> : null}
      {row.state === 'asked' && row.isMine ? (
        <Button
          kind="plain"
          size="site"
          className="mt-2"
          busy={answering.isPending}
          onClick={() => answering.withdraw(row)}
        >
          Take it back
        </Button>
      ) : null}
    </Note>
  )
}

/** What was said of a crew's days lately, newest first; of one day only the last. */
function useAnswers(crewId: string): RainOffRow[] {
  const mayAsk = useMay('rain-off:ask')
  const { data } = useQuery({ ...rainOffQueries.list(), enabled: mayAsk })
  if (!data) return []
  const since = dayPlus(data.today, -shownDaysBack)
  const own = data.rainOffs.filter(
    (row) => row.crew.id === crewId && row.fromDay >= since && !row.takenBack,
  )
  return own.filter((row, i) => own.findIndex((one) => one.fromDay === row.fromDay) === i)
}

type Which = { crewId: string; day: string }

/** Over the day sheet: what was asked for, and what the office said to it. */
export function RainOffAnswers({ crewId }: Which) {
  const answers = useAnswers(crewId)
  if (answers.length === 0) return null
  return (
    <section aria-label="Rain-offs" className="mb-4 space-y-3 print:hidden">
      {answers.map((row) => (
        <Answer key={row.id} row={row} />
      ))}
    </section>
  )
}

/** Under the day sheet: the way to ask; for the office the way to make one. */
export function AskRainOffLink({ crewId, day }: Which) {
  const mayAsk = useMay('rain-off:ask')
  const mayMake = useMay('rain-off:write')
  const isAsked = useAnswers(crewId).some((row) => row.state === 'asked' && row.fromDay === day)
  if (!mayAsk || isAsked) return null
  const search = new URLSearchParams({ crew: crewId, day }).toString()
  return (
    <p className="mt-6 print:hidden">
      <Link
        to={mayMake ? `/calendar/rain-off?${search}` : `/today/rain-off?${search}`}
        className={buttonClass('plain', 'site')}
      >
        <CloudRain size={22} aria-hidden />
        {mayMake ? 'Rain-off' : 'Ask for a rain-off'}
      </Link>
    </p>
  )
}
