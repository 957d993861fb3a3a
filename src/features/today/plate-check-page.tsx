import { useQuery } from '@tanstack/react-query'
import { Link, useNavigate, useParams, useSearchParams } from 'react-router-dom'
import type { DayRoof } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import {
  type ComparedLength,
  type PlateCheckAnswer,
  plateToleranceMm,
} from '../../../shared/day-sheets/plate-check.ts'
import { formatMm } from '../../../shared/units/format-length.ts'
import { RoofPlan } from '../../drawings/roof-plan.tsx'
import { failureText } from '../../lib/failure-text.ts'
import { Badge } from '../../ui/badge.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { ErrorState, Note } from '../../ui/states.tsx'
import { PlateCheckForm } from './plate-check-form.tsx'
import { todayQueries } from './today-queries.ts'

function Compared({ one }: { one: ComparedLength }) {
  return (
    <li className="flex flex-wrap items-baseline justify-between gap-x-3 border-t border-rule py-1">
      <span>
        Corner {one.from + 1} to corner {one.to + 1}
      </span>
      <span>
        <span className="font-extrabold tabular-nums">{formatMm(one.measuredMm)}</span> for{' '}
        <span className="tabular-nums">{formatMm(one.planMm)}</span> mm{' '}
        {one.differs ? <Badge kind="stop">{formatMm(one.offMm)} off</Badge> : null}
      </span>
    </li>
  )
}

function LastCheck({ check }: { check: PlateCheckAnswer }) {
  const { sides, diagonals } = check.comparison
  const differs = [...sides, ...diagonals].some((one) => one.differs)
  return (
    <Note
      kind={differs ? 'stop' : 'done'}
      title={
        differs
          ? `Measured by ${check.takenBy}: more than ${plateToleranceMm} mm off plan`
          : `Measured by ${check.takenBy}: within ${plateToleranceMm} mm of plan`
      }
    >
      <ul className="list-none p-0 text-base">
        {[...sides, ...diagonals].map((one) => (
          <Compared key={`${one.from} ${one.to}`} one={one} />
        ))}
      </ul>
      {check.note ? <p className="text-base">{check.note}</p> : null}
      {differs ? (
        <p className="text-base font-semibold">
          Lengths are still cut to the plan. Tell the office before the first cut.
        </p>
      ) : null}
    </Note>
  )
}

function PlateCheckBody({ roof, backTo }: { roof: DayRoof; backTo: string }) {
  const navigate = useNavigate()
  const latest = useQuery(todayQueries.plateCheck(roof.jobId, roof.letter))
  const check = latest.data?.check
  return (
    <div className="grid gap-4 lg:grid-cols-2 lg:gap-6">
      <div className="space-y-4">
        <Card aria-label="Plan with its corners numbered">
          <RoofPlan
            roof={roof.roof}
            spec={null}
            mode="edit"
            units={roof.marking.units}
            label="Plates with their corners numbered"
          />
        </Card>
        {check ? <LastCheck check={check} /> : null}
      </div>
      <PlateCheckForm roof={roof} onDone={() => void navigate(backTo)} />
    </div>
  )
}

/** The check of sides and diagonals before the first cut. */
export function PlateCheckPage() {
  const { bookingDayId = '' } = useParams()
  const [params] = useSearchParams()
  const day = params.get('day')
  const backTo = day ? `/today?day=${day}` : '/today'
  const query = useQuery(todayQueries.roof(bookingDayId, params.get('revision') ?? 'unnamed'))
  return (
    <div className="site-screen">
      <PageHeader
        title="Measure the plates"
        lead={query.data ? `Revision ${query.data.letter}` : null}
        actions={
          <Link to={backTo} className={buttonClass('plain', 'site')}>
            Back to the day
          </Link>
        }
      />
      {query.isPending ? <PageSkeleton /> : null}
      {query.isError ? (
        <ErrorState
          message={failureText(query.error) ?? query.error.message}
          onRetry={() => void query.refetch()}
        />
      ) : null}
      {query.data ? <PlateCheckBody roof={query.data} backTo={backTo} /> : null}
    </div>
  )
}
