import { Printer } from 'lucide-react'
import { type ReactNode } from 'react'
import { Link, useSearchParams } from 'react-router-dom'
import { formatDayWithYear } from '../../../shared/calendar/days.ts'
import { localDayOf, localTimeOf } from '../../../shared/calendar/local-time.ts'
import { cutOneFirst, workAtHeight } from '../../../shared/marking/marking-card.ts'
import { letterBefore } from '../../../shared/revisions/revision-letters.ts'
import type { Revision } from '../../../shared/revisions/revision-schemas.ts'
import { sizesTypedWords } from '../../../shared/revisions/sizes-typed.ts'
import { RoofPlan } from '../../drawings/roof-plan.tsx'
import { useMay, useSession } from '../../lib/session.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { Note } from '../../ui/states.tsx'
import { CardDialog } from './card-dialog.tsx'
import { CutList } from './cut-list.tsx'
import { useMarkingOptions } from './marking-options.ts'
import { PrintCards } from './print-cards.tsx'
import { PrintFoot } from '../../ui/print-foot.tsx'
import { SpecCautions, SpecFit, SpecTotals } from './spec-summary.tsx'

const notMeasured = 'From plan, plates not measured'

/** Tap a timber on the plan or a mark in the list to see its card; the picked one is in the address. */
export function RevisionView({ revision }: { revision: Revision }) {
  const { roof, spec, settings, job, letter } = revision
  const [search, setSearch] = useSearchParams()
  const picked = search.get('timber')
  const options = useMarkingOptions(settings)
  const pick = (mark: string | null) =>
    setSearch(mark === null ? {} : { timber: mark }, { preventScrollReset: true })
  const issuedOn = useIssuedText(revision)
  return (
    <>
      <PrintFoot
        left={`${job.number} ${job.title}, revision ${letter}`}
        middle={revision.platesMeasured ? issuedOn : `${issuedOn}. ${notMeasured}`}
      />
      <RevisionHeader revision={revision} issuedOn={issuedOn} />
      <RevisionNotes revision={revision} />
      <div className="space-y-4">
        <Card aria-label="Plan">
          <RoofPlan
            roof={roof}
            spec={spec}
            units={options.units}
            selected={picked}
            label={`Plan of the roof of ${job.number}, revision ${letter}`}
            maxHeightPx={640}
            onPick={pick}
          />
        </Card>
        <Part title="Cut list" className="break-before-page">
          <p className="mb-1 font-semibold">{cutOneFirst}</p>
          <CutList spec={spec} options={options} onPick={pick} />
        </Part>
        <Part title="Cautions">
          <SpecCautions spec={spec} />
        </Part>
        <Part title="Totals">
          <SpecTotals spec={spec} options={options} />
        </Part>
        <Part title="Fit">
          <SpecFit spec={spec} options={options} />
        </Part>
      </div>
      <PrintCards spec={spec} options={options} />
      <CardDialog
        spec={spec}
        mark={picked}
        options={options}
        platesMeasured={revision.platesMeasured}
        onClose={() => pick(null)}
      />
    </>
  )
}

function useIssuedText({ issuedAt }: Revision): string {
  const { timeZone } = useSession().firm
  const at = new Date(issuedAt)
  return `Issued ${formatDayWithYear(localDayOf(at, timeZone))}, ${localTimeOf(at, timeZone)}`
}

function RevisionHeader({ revision, issuedOn }: { revision: Revision; issuedOn: string }) {
  const { job, letter } = revision
  const sizesBy = sizesTypedWords(revision.sizesTyped, useSession().firm.timeZone)
  const mayEdit = useMay('roof:write')
  const mayOpenJob = useMay('job:read')
  const before = letterBefore(letter)
  return (
    <PageHeader
      title={`${job.number} roof, revision ${letter}`}
      lead={
        <>
          {mayOpenJob ? (
            <Link to={`/jobs/${job.id}`} className="font-semibold text-chalk underline">
              {job.title}
            </Link>
          ) : (
            job.title
          )}{' '}
          · {issuedOn} by {revision.issuedBy}
          {sizesBy ? <p>{sizesBy}</p> : null}
        </>
      }
      actions={
        <>
          {before ? (
            <Link
              to={`/jobs/${job.id}/revisions/${letter}/against/${before}`}
              className={buttonClass('plain')}
            >
              What changed since {before}
            </Link>
          ) : null}
          {mayEdit ? (
            <Link to={`/jobs/${job.id}/roof`} className={buttonClass('plain')}>
              Open the editor
            </Link>
          ) : null}
          <Button kind="plain" onClick={() => window.print()}>
            <Printer size={18} aria-hidden /> Print
          </Button>
        </>
      }
    />
  )
}

function RevisionNotes({ revision }: { revision: Revision }) {
  const { job, letter, latestLetter, platesMeasured } = revision
  return (
    <div className="mb-4 space-y-2">
      {latestLetter === letter ? null : (
        <Note kind="caution" title={`Revision ${latestLetter} has been issued since`}>
          <p className="flex flex-wrap gap-x-6">
            <Link
              to={`/jobs/${job.id}/revisions/${latestLetter}`}
              className="font-semibold text-chalk underline"
            >
              Open revision {latestLetter}
            </Link>
            <Link
              to={`/jobs/${job.id}/revisions/${latestLetter}/against/${letter}`}
              className="font-semibold text-chalk underline"
            >
              What changed since {letter}
            </Link>
          </p>
        </Note>
      )}
      {platesMeasured ? null : (
        <Note kind="caution" title={notMeasured}>
          <p className="text-sm">
            Every length here is from the plan. Measure sides and diagonals before the first cut.
          </p>
        </Note>
      )}
      <Note>
        <p className="text-sm">{workAtHeight}</p>
      </Note>
    </div>
  )
}

function Part({
  title,
  className = '',
  children,
}: {
  title: string
  className?: string
  children: ReactNode
}) {
  return (
    <Card className={`print:border-0 print:p-0 ${className}`}>
      <h2 className="mb-2 text-lg font-extrabold">{title}</h2>
      {children}
    </Card>
  )
}
