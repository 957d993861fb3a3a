import { ArrowRight, CircleAlert, OctagonAlert } from 'lucide-react'
import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { PreviewMove } from '../../../shared/rain-offs/rain-off-schemas.ts'
import { Badge } from '../../ui/badge.tsx'
import { daysWords, isOvertaken, lateWords, milestoneWords } from './rain-off-words.ts'

/** A remark by icon, word and colour. */
function Remark({ weight, children }: { weight: 'clash' | 'caution'; children: ReactNode }) {
  const Icon = weight === 'clash' ? OctagonAlert : CircleAlert
  return (
    <li
      className={`flex items-start gap-1.5 font-semibold ${weight === 'clash' ? 'text-stop' : 'text-ochre'}`}
    >
      <Icon size={16} aria-hidden className="mt-1 shrink-0" />
      <span>
        <span className="sr-only">{weight === 'clash' ? 'Clash: ' : 'Caution: '}</span>
        {children}
      </span>
    </li>
  )
}

function DaysChange({ move }: { move: PreviewMove }) {
  return (
    <dl className="my-2 grid grid-cols-[1fr_auto_1fr] items-center gap-2">
      <div className="min-w-0">
        <dt className="text-sm text-ink-soft">Now</dt>
        <dd className="font-semibold">{daysWords(move.daysBefore)}</dd>
      </div>
      <ArrowRight size={20} aria-hidden className="text-ink-soft" />
      <div className="min-w-0">
        <dt className="text-sm text-ink-soft">Then</dt>
        <dd className="font-semibold text-clay">{daysWords(move.daysAfter)}</dd>
      </div>
    </dl>
  )
}

/** One booking: from which days to which, and whom and what that touches. */
export function MovingBooking({ move }: { move: PreviewMove }) {
  const late = lateWords(move)
  const isFirm = move.state === 'firm'
  return (
    <li className="rounded-md border border-rule bg-sheet p-3">
      <p className="flex flex-wrap items-center justify-between gap-x-3">
        <Link
          to={`/jobs/${move.job.id}`}
          className="inline-flex min-h-11 min-w-0 items-center font-semibold text-chalk underline [overflow-wrap:anywhere]"
        >
          {move.job.number} {move.job.title}
        </Link>
        <Badge kind={isFirm ? 'plain' : 'ochre'}>{isFirm ? 'firm' : 'pencilled'}</Badge>
      </p>
      <DaysChange move={move} />
      <ul className="space-y-1 text-sm">
        {move.added.map(({ from, to }) => (
          <li key={from}>
            {formatDay(from)} stays, work has begun. {formatDay(to)} is added for what is left.
          </li>
        ))}
        <li>
          {move.customerName ? `Customer: ${move.customerName}` : 'No customer named'}
          {isFirm ? '' : ' (pencilled days were told to nobody)'}
        </li>
        {move.milestones.map((milestone) =>
          isOvertaken(move, milestone) ? (
            <Remark key={milestone.kind} weight="caution">
              {milestoneWords(milestone)}. The frame would not be done.
            </Remark>
          ) : (
            <li key={milestone.kind}>{milestoneWords(milestone)}</li>
          ),
        )}
        {move.otherCrews.map(({ crew, days }) => (
          <li key={crew}>
            {crew} is on this job too and stays: {daysWords(days)}
          </li>
        ))}
        {late ? <Remark weight="caution">{late}</Remark> : null}
        {move.clashes.map((clash) => (
          <Remark key={`${clash.code} ${clash.day}`} weight={clash.weight}>
            {formatDay(clash.day)}: {clash.text}{' '}
            <span className="font-normal text-ink">{clash.wayOut}</span>
          </Remark>
        ))}
      </ul>
    </li>
  )
}
