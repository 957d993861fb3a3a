import { Redo2, Undo2 } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { JobRoof } from '../../../shared/revisions/revision-schemas.ts'
import { Button } from '../../ui/button.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { SaveStateLine } from './save-state.tsx'
import type { useIssue } from './use-issue.ts'
import type { useRoofDraft } from './use-roof-draft.ts'

type Props = {
  opened: JobRoof
  draft: ReturnType<typeof useRoofDraft>
  issue: ReturnType<typeof useIssue>
}

export function EditorHeader({ opened, draft, issue }: Props) {
  const { job, revisions, nextLetter } = opened
  return (
    <PageHeader
      title={`${job.number} roof`}
      lead={
        <>
          <Link to={`/jobs/${job.id}`} className="font-semibold text-chalk underline">
            {job.title}
          </Link>
          {revisions.length > 0 ? (
            <span className="ml-3">
              Issued:{' '}
              {revisions.map(({ letter }) => (
                <Link
                  key={letter}
                  to={`/jobs/${job.id}/revisions/${letter}`}
                  className="mr-2 inline-block min-w-6 py-1 font-semibold text-chalk underline"
                >
                  {letter}
                </Link>
              ))}
            </span>
          ) : null}
        </>
      }
      actions={
        <>
          <SaveStateLine state={draft.saveState} onRetry={() => void draft.saver.flush()} />
          <Button kind="plain" disabled={!draft.canUndo} onClick={draft.undo} title="Ctrl Z">
            <Undo2 size={18} aria-hidden /> <span className="sr-only sm:not-sr-only">Undo</span>
          </Button>
          <Button kind="plain" disabled={!draft.canRedo} onClick={draft.redo} title="Ctrl Shift Z">
            <Redo2 size={18} aria-hidden /> <span className="sr-only sm:not-sr-only">Redo</span>
          </Button>
          <Button busy={issue.isPending} onClick={issue.start}>
            Issue as {nextLetter}
          </Button>
        </>
      }
    />
  )
}
