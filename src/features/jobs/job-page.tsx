import { useQuery } from '@tanstack/react-query'
import { ArrowLeft, CircleAlert, Pencil } from 'lucide-react'
import { Link, Outlet, useParams } from 'react-router-dom'
import { jobStageNames } from '../../../shared/jobs/job-stage.ts'
import type { JobView } from '../../../shared/jobs/job-views.ts'
import { ApiFailure } from '../../lib/api-client.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useMay } from '../../lib/session.ts'
import { Badge } from '../../ui/badge.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { JobBookingsCard } from './job-bookings-card.tsx'
import { JobContactsCard } from './job-contacts-card.tsx'
import { JobMilestonesCard } from './job-milestones-card.tsx'
import { jobQueries } from './job-queries.ts'
import { JobRoofCard } from './job-roof-card.tsx'
import { JobStageCard } from './job-stage-card.tsx'
import { JobVariationsCard } from './job-variations-card.tsx'
import { missingText } from './missing-text.ts'

function BackToBoard() {
  return (
    <Link
      to="/board"
      className="mb-1 inline-flex min-h-11 items-center gap-2 font-semibold text-chalk print:hidden"
    >
      <ArrowLeft size={18} aria-hidden />
      Board
    </Link>
  )
}

function Missing({ job }: { job: JobView }) {
  if (job.missing.length === 0) return null
  return (
    <p className="mb-4 flex items-start gap-2 font-semibold text-ochre">
      <CircleAlert size={20} aria-hidden className="mt-0.5 shrink-0" />
      <span>{missingText(job.missing)}</span>
    </p>
  )
}

function Notes({ title, text }: { title: string; text: string | undefined }) {
  if (!text) return null
  return (
    <Card>
      <h2 className="mb-1 text-lg font-extrabold">{title}</h2>
      <p className="whitespace-pre-line [overflow-wrap:anywhere]">{text}</p>
    </Card>
  )
}

function NotThere() {
  return (
    <>
      <PageHeader title="This job is not here" />
      <EmptyState
        title="It may be another crew's, or outside your days"
        action={
          <Link to="/board" className={buttonClass('plain')}>
            Go to the board
          </Link>
        }
      />
    </>
  )
}

function JobDetails({ job }: { job: JobView }) {
  const mayWrite = useMay('job:write')
  return (
    <>
      <BackToBoard />
      <PageHeader
        title={job.title}
        lead={
          <span className="flex flex-wrap items-center gap-3">
            <span className="font-semibold tabular-nums">{job.number}</span>
            <Badge kind={job.stage === 'complete' ? 'leaf' : 'chalk'}>
              {jobStageNames[job.stage]}
            </Badge>
          </span>
        }
        actions={
          mayWrite ? (
            <Link to={`/jobs/${job.id}/edit`} className={buttonClass('plain')}>
              <Pencil size={18} aria-hidden />
              Edit the job
            </Link>
          ) : null
        }
      />
      <Missing job={job} />
      <div className="grid items-start gap-4 lg:grid-cols-[3fr_2fr]">
        <div className="space-y-4">
          <JobStageCard job={job} />
          <JobRoofCard job={job} />
          <JobBookingsCard job={job} />
          <JobMilestonesCard jobId={job.id} />
          <JobVariationsCard jobId={job.id} />
        </div>
        {/* On site the way there and whom to ring come first. */}
        <div className={`space-y-4 ${mayWrite ? '' : 'max-lg:order-first'}`}>
          <JobContactsCard job={job} />
          <Notes title="Notes for the crew" text={job.crewNotes} />
          <Notes title="Office notes" text={job.notes} />
        </div>
      </div>
      <Outlet context={job} />
    </>
  )
}

/** All that is known of one job, as far as the reader may know it. */
export function JobPage() {
  const { jobId = '' } = useParams()
  const query = useQuery(jobQueries.detail(jobId))
  if (query.error instanceof ApiFailure && query.error.status === 404) return <NotThere />
  if (query.data) return <JobDetails job={query.data} />
  if (query.isError) {
    const message = failureText(query.error) ?? 'The job could not be loaded.'
    return <ErrorState message={message} onRetry={() => void query.refetch()} />
  }
  return <PageSkeleton />
}
