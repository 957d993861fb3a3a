import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { PageHeader } from '../../ui/page-header.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { RoofEditor } from './roof-editor.tsx'
import { roofQueries } from './roof-queries.ts'

/** The roof of a job, to type and to issue. */
export function RoofEditorPage() {
  const { jobId = '' } = useParams()
  const query = useQuery({ ...roofQueries.ofJob(jobId), refetchOnMount: 'always' })
  const { data, error, isFetchedAfterMount, refetch } = query
  // Opened from what the server has now, never from what an earlier visit left behind.
  if (data && (isFetchedAfterMount || error)) return <RoofEditor key={jobId} opened={data} />
  if (error) {
    return (
      <>
        <PageHeader title="Roof" />
        <ErrorState message={error.message} onRetry={() => void refetch()} />
      </>
    )
  }
  return <PageSkeleton />
}
