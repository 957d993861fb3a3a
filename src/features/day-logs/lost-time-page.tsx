import { useQuery } from '@tanstack/react-query'
import { ArrowLeft, Printer } from 'lucide-react'
import { useState } from 'react'
import { Link, useParams } from 'react-router-dom'
import { formatDayWithYear } from '../../../shared/calendar/days.ts'
import { type DelayReason, delayReasons } from '../../../shared/day-logs/delay-reasons.ts'
import { delayReasonNames } from '../../../shared/day-logs/delay-words.ts'
import type { JobHours } from '../../../shared/day-logs/hours-schemas.ts'
import { type LostTime, lostTimeOf } from '../../../shared/day-logs/hours-sums.ts'
import { formatHours } from '../../../shared/labour/format-hours.ts'
import { failureText } from '../../lib/failure-text.ts'
import { Button } from '../../ui/button.tsx'
import { Checkbox } from '../../ui/inputs.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PrintFoot } from '../../ui/print-foot.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { dayLogQueries } from './day-log-queries.ts'

const minutesOf = (lost: readonly LostTime[]) =>
  lost.reduce((total, one) => total + one.lostMinutes, 0)

function Heading({ hours }: { hours: JobHours }) {
  const { firm, job, today } = hours
  const facts = [
    ['Job', `${job.number} ${job.title}`],
    ['Site', job.siteAddress],
    ['For', job.customerName],
    ['As of', formatDayWithYear(today)],
  ].filter(([, value]) => value !== '')
  return (
    <div className="mb-4 flex flex-wrap justify-between gap-x-8 gap-y-2">
      <dl className="grid grid-cols-[auto_1fr] gap-x-4">
        {facts.map(([name, value]) => (
          <div key={name} className="contents">
            <dt className="text-ink-soft">{name}</dt>
            <dd className="font-semibold">{value}</dd>
          </div>
        ))}
      </dl>
      <p className="font-semibold">
        {firm.name}
        <br />
        {firm.phone}
      </p>
    </div>
  )
}

/** Remarks of a day stand once, with its first delay. */
function isFirstOfDay(lost: readonly LostTime[], index: number): boolean {
  return lost[index - 1]?.bookingDayId !== lost[index]?.bookingDayId
}

function LostTable({ lost, withRemarks }: { lost: LostTime[]; withRemarks: boolean }) {
  const head = 'border-b-2 border-ink px-2 py-1 text-left font-semibold'
  const cell = 'border-b border-rule px-2 py-1 align-top [overflow-wrap:anywhere]'
  return (
    <table className="w-full border-collapse max-sm:text-sm">
      <thead>
        <tr>
          <th className={head}>Day</th>
          <th className={head}>Reason</th>
          <th className={`${head} text-right`}>Hours lost</th>
          <th className={`${head} max-sm:hidden print:table-cell`}>Remarks</th>
        </tr>
      </thead>
      <tbody>
        {lost.map((one, i) => {
          const remarks = withRemarks && isFirstOfDay(lost, i) ? one.remarks : ''
          const words = [one.note, remarks].filter(Boolean).join('. ')
          return (
            <tr key={`${one.bookingDayId} ${i}`} className="break-inside-avoid">
              <th scope="row" className={`${cell} whitespace-nowrap text-left font-semibold`}>
                {formatDayWithYear(one.day)}
                <span className="block text-sm font-normal">{one.crewName}</span>
              </th>
              <td className={cell}>
                {delayReasonNames[one.reason]}
                <span className="block text-sm sm:hidden print:hidden">{words}</span>
              </td>
              <td className={`${cell} text-right tabular-nums`}>{formatHours(one.lostMinutes)}</td>
              <td className={`${cell} w-2/5 max-sm:hidden print:table-cell`}>{words}</td>
            </tr>
          )
        })}
      </tbody>
    </table>
  )
}

function ByReason({ lost }: { lost: LostTime[] }) {
  const sums = delayReasons
    .map((reason): [DelayReason, number] => [
      reason,
      minutesOf(lost.filter((one) => one.reason === reason)),
    ])
    .filter(([, minutes]) => minutes > 0)
  return (
    <section className="mt-5 max-w-md break-inside-avoid">
      <h2 className="mb-1 text-lg font-extrabold">By reason</h2>
      <dl>
        {sums.map(([reason, minutes]) => (
          <div key={reason} className="flex justify-between gap-4">
            <dt>{delayReasonNames[reason]}</dt>
            <dd className="tabular-nums">{formatHours(minutes)}</dd>
          </div>
        ))}
        <div className="mt-1 flex justify-between gap-4 border-t-2 border-ink font-extrabold">
          <dt>Together</dt>
          <dd className="tabular-nums">{formatHours(minutesOf(lost))}</dd>
        </div>
      </dl>
      <p className="mt-2 text-sm">
        Hours of one person, as put down on site on the day. Two people held up for an hour are two
        hours.
      </p>
    </section>
  )
}

function LostBody({ hours }: { hours: JobHours }) {
  const [withRemarks, setWithRemarks] = useState(false)
  const { job, firm } = hours
  const lost = lostTimeOf(hours.days)
  return (
    <>
      <Link
        to={`/jobs/${job.id}/hours`}
        className="mb-1 inline-flex min-h-11 items-center gap-2 font-semibold text-chalk print:hidden"
      >
        <ArrowLeft size={18} aria-hidden />
        Hours of {job.number}
      </Link>
      <PageHeader
        title={`Lost time: ${job.title}`}
        actions={
          lost.length > 0 ? (
            <>
              <Checkbox
                label="With the day’s remarks"
                checked={withRemarks}
                onChange={() => setWithRemarks(!withRemarks)}
              />
              <Button onClick={() => window.print()}>
                <Printer size={18} aria-hidden />
                Print or save as PDF
              </Button>
            </>
          ) : null
        }
      />
      <PrintFoot
        left={`${firm.name}: ${job.number} ${job.title}`}
        middle={`Lost time, ${formatDayWithYear(hours.today)}`}
      />
      {lost.length === 0 ? (
        <EmptyState title="No hours lost on this job">
          What holds a crew up is put down when they close the day.
        </EmptyState>
      ) : (
        <section className="rounded-md border border-rule bg-sheet p-4 print:border-0 print:p-0">
          <Heading hours={hours} />
          <LostTable lost={lost} withRemarks={withRemarks} />
          <ByReason lost={lost} />
        </section>
      )}
    </>
  )
}

/** Hours lost on a job and to what, on paper for its builder: no prices, and remarks only when ticked. */
export function LostTimePage() {
  const { jobId = '' } = useParams()
  const query = useQuery(dayLogQueries.job(jobId))
  if (query.isPending) return <PageSkeleton />
  if (query.isError && !query.data)
    return (
      <>
        <PageHeader title="Lost time" />
        <ErrorState
          message={failureText(query.error) ?? 'The lost time could not be loaded.'}
          onRetry={() => void query.refetch()}
        />
      </>
    )
  return <LostBody hours={query.data} />
}
