import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { PageHeader } from '../../ui/page-header.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { RevisionView } from './revision-view.tsx'
import { roofQueries } from './roof-queries.ts'

/** An issued roof: frame spec, cut list and marking cards. */
export function RevisionPage() {
  const { jobId = '', letter = '' } = useParams()
  const { data, error, refetch } = useQuery(roofQueries.revision(jobId, letter))
  if (data) return <RevisionView revision={data} />
  if (error) {
    return (
      <>
        <PageHeader title={`Revision ${letter}`} />
        <ErrorState message={error.message} onRetry={() => void refetch()} />
      </>
    )
  }
  return <PageSkeleton />
}
