import { useQuery } from '@tanstack/react-query'
import { Skeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { calendarQueries } from './calendar-queries.ts'
import { UnbookedList } from './unbooked-list.tsx'

/** Jobs won and not booked, beside the calendar; folded away on a phone. */
export function UnbookedSide({ isNarrow }: { isNarrow: boolean }) {
  const { data, error, refetch } = useQuery(calendarQueries.unbooked())
  const jobs = data?.jobs ?? []
  const body = error ? (
    <ErrorState message={error.message} onRetry={() => void refetch()} />
  ) : !data ? (
    <Skeleton className="h-24" />
  ) : jobs.length === 0 ? (
    <p className="text-ink-soft">None waiting. A job comes here once its price is accepted.</p>
  ) : (
    <UnbookedList jobs={jobs} crews={data.crews} mayDrag={!isNarrow} />
  )
  if (isNarrow)
    return (
      <details className="mb-4 rounded-md border border-rule bg-sheet px-3">
        <summary className="min-h-11 content-center font-semibold">
          Won, not booked ({jobs.length})
        </summary>
        <div className="pb-3">{body}</div>
      </details>
    )
  return (
    <section aria-labelledby="unbooked" className="xl:sticky xl:top-4 xl:self-start">
      <h2 id="unbooked" className="text-lg font-extrabold">
        Won, not booked
      </h2>
      {jobs.length > 0 ? (
        <p className="mb-2 text-sm text-ink-soft">Drag one onto its first day, or press Book.</p>
      ) : null}
      {body}
    </section>
  )
}
