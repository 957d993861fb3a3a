import { useQuery } from '@tanstack/react-query'
import { ArrowLeft, FileClock } from 'lucide-react'
import { Link, useParams } from 'react-router-dom'
import {
  daysByCrew,
  hoursRatio,
  hoursSum,
  lostTimeOf,
} from '../../../shared/day-logs/hours-sums.ts'
import type { JobHours } from '../../../shared/day-logs/hours-schemas.ts'
import { formatHours } from '../../../shared/labour/format-hours.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { failureText } from '../../lib/failure-text.ts'
import { buttonClass } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { dayLogQueries } from './day-log-queries.ts'
import { JobDays } from './job-days.tsx'

function Figure({ name, value, hint }: { name: string; value: string; hint?: string }) {
  return (
    <div>
      <dt className="text-ink-soft">{name}</dt>
      <dd className="numeral text-2xl">{value}</dd>
      {hint ? <dd className="text-sm text-ink-soft">{hint}</dd> : null}
    </div>
  )
}

/** 'as planned', '1.2 times the plan'. */
function ratioWords(ratio: number | null): string {
  if (ratio === null) return '–'
  const rounded = Math.round(ratio * 10) / 10
  return rounded === 1 ? 'as planned' : `${rounded.toFixed(1)} times the plan`
}

/** The whole job in a line of figures, then each crew's. */
function Together({ hours }: { hours: JobHours }) {
  const sum = hoursSum(hours.days)
  const crews = daysByCrew(hours.days)
  return (
    <Card aria-label="Together">
      <dl className="grid grid-cols-2 gap-x-6 gap-y-3 sm:grid-cols-4">
        <Figure
          name="The roof by your rates"
          value={hours.roofMinutes === null ? '–' : formatHours(hours.roofMinutes)}
          {...(hours.roofMinutes === null ? { hint: 'No roof issued yet.' } : {})}
        />
        <Figure name="Logged" value={formatHours(sum.loggedMinutes)} />
        <Figure name="Of them lost" value={formatHours(sum.lostMinutes)} />
        <Figure
          name="Time the work took"
          value={ratioWords(hoursRatio(sum))}
          hint="Logged less lost, against the plan of what was ticked, on closed days."
        />
      </dl>
      {crews.length > 1 ? (
        <ul className="mt-4 divide-y divide-rule border-t border-rule">
          {crews.map(({ crew, days }) => {
            const own = hoursSum(days)
            return (
              <li key={crew.id} className="flex flex-wrap items-center gap-x-4 gap-y-1 py-2">
                <CrewPennant letter={crew.letter} colour={crew.colour} name={crew.name} />
                <span className="font-semibold">{crew.name}</span>
                <span>{formatHours(own.loggedMinutes)} logged</span>
                <span>{formatHours(own.lostMinutes)} lost</span>
                <span>{ratioWords(hoursRatio(own))}</span>
              </li>
            )
          })}
        </ul>
      ) : null}
    </Card>
  )
}

function HoursBody({ hours }: { hours: JobHours }) {
  const { job, days } = hours
  const hasLost = lostTimeOf(days).length > 0
  return (
    <>
      <Link
        to={`/jobs/${job.id}`}
        className="mb-1 inline-flex min-h-11 items-center gap-2 font-semibold text-chalk"
      >
        <ArrowLeft size={18} aria-hidden />
        {job.number}
      </Link>
      <PageHeader
        title={`Hours: ${job.title}`}
        lead="Planned and logged side by side, hours of one person."
        actions={
          hasLost ? (
            <Link to={`/jobs/${job.id}/lost-time`} className={buttonClass('plain')}>
              <FileClock size={18} aria-hidden />
              Lost time for the builder
            </Link>
          ) : null
        }
      />
      {days.length === 0 ? (
        <EmptyState
          title="No crew is booked on this job"
          action={
            <Link to={`/calendar/book?job=${job.id}`} className={buttonClass('plain')}>
              Book a crew
            </Link>
          }
        >
          Hours come from the days that crews close on site.
        </EmptyState>
      ) : (
        <div className="space-y-4">
          <Together hours={hours} />
          <JobDays hours={hours} />
          <p className="max-w-prose text-sm text-ink-soft">
            Where the work keeps taking longer or shorter than planned, correct the minutes under{' '}
            <Link to="/firm" className="text-chalk underline">
              Firm, Labour
            </Link>
            .
          </p>
        </div>
      )}
    </>
  )
}

/** What a job was planned to take and what it took. */
export function JobHoursPage() {
  const { jobId = '' } = useParams()
  const query = useQuery(dayLogQueries.job(jobId))
  if (query.isPending) return <PageSkeleton />
  if (query.isError && !query.data)
    return (
      <>
        <PageHeader title="Hours" />
        <ErrorState
          message={failureText(query.error) ?? 'The hours could not be loaded.'}
          onRetry={() => void query.refetch()}
        />
      </>
    )
  return <HoursBody hours={query.data} />
}
