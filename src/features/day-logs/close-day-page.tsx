import { useQuery } from '@tanstack/react-query'
import { ArrowLeft } from 'lucide-react'
import { Link, useNavigate, useParams } from 'react-router-dom'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { DayToClose } from '../../../shared/day-logs/day-log-schemas.ts'
import { formatQuarters } from '../../../shared/labour/format-hours.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { failureText } from '../../lib/failure-text.ts'
import { useMay } from '../../lib/session.ts'
import { Card } from '../../ui/card.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState, Note } from '../../ui/states.tsx'
import { SunlightSwitch } from '../../ui/sunlight-switch.tsx'
import { dayLogQueries } from './day-log-queries.ts'
import { CloseDayForm } from './close-day-form.tsx'
import { LogView } from './log-view.tsx'
import { OpenAgain } from './open-again.tsx'

const sheetAddress = ({ day, crew }: DayToClose) => `/today?day=${day}&crew=${crew.id}`

function DayHeader({ day }: { day: DayToClose }) {
  const { job, crew } = day
  return (
    <>
      <Link
        to={sheetAddress(day)}
        className="inline-flex min-h-14 items-center gap-2 font-semibold text-chalk"
      >
        <ArrowLeft size={20} aria-hidden />
        Day sheet
      </Link>
      <PageHeader
        title={`${day.log ? 'Log of' : 'Close'} ${formatDay(day.day)}`}
        lead={
          <span className="flex items-start gap-x-3 text-ink">
            <CrewPennant letter={crew.letter} colour={crew.colour} name={crew.name} />
            <span>
              {job.number} {job.title}, {formatQuarters(day.plannedMinutes)} planned
            </span>
          </span>
        }
        actions={<SunlightSwitch />}
      />
    </>
  )
}

function DayBody({ day }: { day: DayToClose }) {
  const navigate = useNavigate()
  const mayWrite = useMay('day-log:write')
  const { log } = day
  const isOpen = mayWrite && day.closedBecause === null
  return (
    <div className="space-y-4">
      {log ? (
        <Note kind="done" title={`Closed by ${log.loggedBy}`}>
          {isOpen ? <p className="text-base">Correct it below if something is not right.</p> : null}
        </Note>
      ) : null}
      {mayWrite && day.closedBecause ? <Note kind="caution" title={day.closedBecause} /> : null}
      {isOpen ? (
        <>
          {/* A newer log starts the form anew; what was typed meanwhile is kept and compared. */}
          <CloseDayForm
            key={log?.version ?? 0}
            day={day}
            onDone={() => void navigate(sheetAddress(day))}
          />
          <OpenAgain day={day} />
        </>
      ) : log ? (
        <Card>
          <LogView log={log} />
        </Card>
      ) : (
        <EmptyState title="Not closed yet">Who leads the crew closes the day.</EmptyState>
      )}
    </div>
  )
}

/** A day closed on site: who, how long, what held it up. */
export function CloseDayPage() {
  const { bookingDayId = '' } = useParams()
  const query = useQuery(dayLogQueries.day(bookingDayId))
  if (query.isPending) return <PageSkeleton />
  if (query.isError && !query.data)
    return (
      <>
        <PageHeader title="Close the day" />
        <ErrorState
          message={failureText(query.error) ?? 'The day could not be loaded.'}
          onRetry={() => void query.refetch()}
        />
      </>
    )
  return (
    <div className="site-screen mx-auto max-w-3xl">
      <DayHeader day={query.data} />
      <DayBody day={query.data} />
    </div>
  )
}
