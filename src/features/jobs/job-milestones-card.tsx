import { useQuery } from '@tanstack/react-query'
import { isMilestoneKept } from '../../../shared/milestones/milestone-rules.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useMay } from '../../lib/session.ts'
import { Card } from '../../ui/card.tsx'
import { Skeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { milestoneQueries } from './milestone-queries.ts'
import { MilestoneRow } from './milestone-row.tsx'

/** What the job waits for, by whom and when; a crew sees only what has been said. */
export function JobMilestonesCard({ jobId }: { jobId: string }) {
  const mayWrite = useMay('milestone:write')
  const { data, error, refetch } = useQuery(milestoneQueries.ofJob(jobId))
  const shown = data?.milestones.filter((one) => mayWrite || isMilestoneKept(one)) ?? []
  return (
    <Card aria-labelledby="job-milestones">
      <h2 id="job-milestones" className="text-lg font-extrabold">
        What the job waits for
      </h2>
      {data && shown.length > 0 ? (
        <ul className="divide-y divide-rule">
          {shown.map((milestone) => (
            <MilestoneRow key={milestone.kind} jobId={jobId} milestone={milestone} />
          ))}
        </ul>
      ) : data ? (
        <p>The office has not said anything of it yet.</p>
      ) : error ? (
        <ErrorState
          message={failureText(error) ?? 'This could not be loaded.'}
          onRetry={() => void refetch()}
        />
      ) : (
        <Skeleton className="h-40" />
      )}
    </Card>
  )
}
