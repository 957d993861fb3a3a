import { PencilRuler } from 'lucide-react'
import { Link } from 'react-router-dom'
import { formatDay } from '../../../shared/calendar/days.ts'
import { localDayOf, localTimeOf } from '../../../shared/calendar/local-time.ts'
import { coveringNames } from '../../../shared/jobs/job-schemas.ts'
import type { JobView } from '../../../shared/jobs/job-views.ts'
import { RoofGlyph } from '../../drawings/roof-glyph.tsx'
import { useMay, useSession } from '../../lib/session.ts'
import { buttonClass } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { Note } from '../../ui/states.tsx'

const glyphPx = 132

/** 'Thu 4 Dec at 15:05', by the firm's clock. */
function issuedText(instant: string, timeZone: string): string {
  const at = new Date(instant)
  return `${formatDay(localDayOf(at, timeZone))} at ${localTimeOf(at, timeZone)}`
}

function draftText(job: JobView): string | null {
  if (!job.draft || job.draft.isIssued) return null
  return job.revisions.length > 0
    ? 'The roof was changed after the last revision and not issued.'
    : 'The roof is in draft and not issued.'
}

function Revisions({ job }: { job: JobView }) {
  const { timeZone } = useSession().firm
  return (
    <ol className="divide-y divide-rule">
      {job.revisions.map((revision, i) => {
        const before = job.revisions[i + 1]
        return (
          <li key={revision.letter} className="flex flex-wrap items-center justify-between gap-x-4">
            <Link
              to={`/jobs/${job.id}/revisions/${revision.letter}`}
              className="flex min-h-12 items-center gap-3 py-1 hover:underline"
            >
              <RoofGlyph glyph={revision.glyph} sizePx={36} />
              <span>
                <span className="font-semibold text-chalk underline">
                  Revision {revision.letter}
                </span>
                {i === 0 ? ' (latest)' : ''}
                <span className="block text-sm text-ink-soft">
                  Issued {issuedText(revision.issuedAt, timeZone)}
                </span>
              </span>
            </Link>
            {before ? (
              <Link
                to={`/jobs/${job.id}/revisions/${revision.letter}/against/${before.letter}`}
                className="inline-flex min-h-11 items-center text-chalk underline"
              >
                What changed since {before.letter}
              </Link>
            ) : null}
          </li>
        )
      })}
    </ol>
  )
}

/** The roof by its shape, its revisions, and the way to its editor. */
export function JobRoofCard({ job }: { job: JobView }) {
  const mayWrite = useMay('roof:write')
  const latest = job.revisions[0]
  const draft = draftText(job)
  const action = latest || job.draft ? 'Open the roof' : 'Enter the roof'
  return (
    <Card>
      <div className="mb-3 flex flex-wrap items-center justify-between gap-3">
        <h2 className="text-lg font-extrabold">Roof</h2>
        {mayWrite ? (
          <Link
            to={`/jobs/${job.id}/roof`}
            className={buttonClass(latest || job.draft ? 'plain' : 'primary')}
          >
            <PencilRuler size={18} aria-hidden />
            {action}
          </Link>
        ) : null}
      </div>
      <p className="mb-2 text-ink-soft">Covering: {coveringNames[job.covering]}</p>
      {draft ? <Note kind="caution" title={draft} /> : null}
      {latest ? (
        <div className="mt-2 flex flex-wrap items-start gap-x-6 gap-y-2">
          <RoofGlyph
            glyph={latest.glyph}
            sizePx={glyphPx}
            title={`Plan of revision ${latest.letter}`}
          />
          <div className="min-w-56 flex-1">
            <Revisions job={job} />
          </div>
        </div>
      ) : null}
      {!latest && !draft ? (
        <p>
          {mayWrite
            ? 'Enter it from the plan; lengths, bevels and the cut list follow at once.'
            : 'No roof has been issued for this job.'}
        </p>
      ) : null}
      {latest && !job.arePlatesMeasured ? (
        <p className="mt-3 font-semibold text-ochre">From plan, plates not measured</p>
      ) : null}
    </Card>
  )
}
