import { useQuery } from '@tanstack/react-query'
import { Printer } from 'lucide-react'
import { useState } from 'react'
import { Link, useNavigate, useParams } from 'react-router-dom'
import { cutOneFirst } from '../../../shared/marking/marking-card.ts'
import type { Comparison } from '../../../shared/revisions/comparison-schemas.ts'
import { useMay, useSession } from '../../lib/session.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PrintFoot } from '../../ui/print-foot.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { ComparisonLines } from './comparison-lines.tsx'
import { changeCounts } from './comparison-words.ts'
import { CutButUnusedNote } from './cut-but-unused.tsx'
import { roofQueries } from './roof-queries.ts'

const notMeasured = 'From plan, plates not measured'

function LetterSelect({ comparison }: { comparison: Comparison }) {
  const navigate = useNavigate()
  const { job, before, after, letters } = comparison
  if (letters.length < 3) return null
  const options = letters.filter((letter) => letter !== after.letter)
  return (
    <label className="flex items-center gap-2">
      Against
      <select
        className="min-h-11 rounded-md border border-ink-soft bg-sheet px-2"
        value={before.letter}
        onChange={(event) =>
          void navigate(`/jobs/${job.id}/revisions/${after.letter}/against/${event.target.value}`, {
            replace: true,
          })
        }
      >
        {options.map((letter) => (
          <option key={letter} value={letter}>
            Revision {letter}
          </option>
        ))}
      </select>
    </label>
  )
}

function Header({ comparison }: { comparison: Comparison }) {
  const { job, after, before } = comparison
  const mayOpenJob = useMay('job:read')
  return (
    <PageHeader
      title={`${job.number} roof, revision ${before.letter} to ${after.letter}`}
      lead={
        mayOpenJob ? (
          <Link to={`/jobs/${job.id}`} className="font-semibold text-chalk underline">
            {job.title}
          </Link>
        ) : (
          job.title
        )
      }
      actions={
        <>
          <LetterSelect comparison={comparison} />
          <Link to={`/jobs/${job.id}/revisions/${after.letter}`} className={buttonClass('plain')}>
            Open revision {after.letter}
          </Link>
          <Button kind="plain" onClick={() => window.print()}>
            <Printer size={18} aria-hidden /> Print
          </Button>
        </>
      }
    />
  )
}

function Whole({ comparison }: { comparison: Comparison }) {
  const { job, before, after, lines, cutButUnused, platesMeasured } = comparison
  const [withSame, setWithSame] = useState(false)
  const { firm } = useSession()
  const sameCount = lines.filter((line) => line.kind === 'same').length
  const shown = withSame ? lines : lines.filter((line) => line.kind !== 'same')
  return (
    <>
      <PrintFoot
        left={`${job.number} ${job.title}`}
        middle={`Revision ${before.letter} to ${after.letter}${platesMeasured ? '' : `. ${notMeasured}`}`}
      />
      <Header comparison={comparison} />
      <div className="space-y-4">
        {cutButUnused.length > 0 ? (
          <CutButUnusedNote letter={after.letter} cut={cutButUnused} />
        ) : null}
        <Card>
          <h2 className="mb-1 text-lg font-extrabold">Line by line</h2>
          <p className="mb-2">{changeCounts(lines)}</p>
          {platesMeasured ? null : <p className="mb-2 font-semibold text-ochre">{notMeasured}</p>}
          <p className="mb-3 font-semibold">{cutOneFirst}</p>
          {sameCount > 0 ? (
            <label className="mb-3 flex min-h-11 w-fit items-center gap-2 print:hidden">
              <input
                type="checkbox"
                className="h-5 w-5"
                checked={withSame}
                onChange={(event) => setWithSame(event.target.checked)}
              />
              Show the lines that stay the same ({sameCount})
            </label>
          ) : null}
          {shown.length === 0 ? (
            <EmptyState title="Every line is the same">
              The two revisions differ in nothing that is cut.
            </EmptyState>
          ) : (
            <ComparisonLines
              lines={shown}
              units={firm.lengthUnits}
              letters={[before.letter, after.letter]}
            />
          )}
        </Card>
      </div>
    </>
  )
}

/** Two revisions of a roof side by side: what is added, gone, longer, shorter, and what is cut in vain. */
export function ComparisonPage() {
  const { jobId = '', letter = '', other = '' } = useParams()
  const { data, error, refetch } = useQuery(roofQueries.comparison(jobId, letter, other))
  if (data) return <Whole comparison={data} />
  if (error)
    return (
      <>
        <PageHeader title="Two revisions" />
        <ErrorState message={error.message} onRetry={() => void refetch()} />
      </>
    )
  return <PageSkeleton />
}
