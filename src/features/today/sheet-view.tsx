import { useQuery } from '@tanstack/react-query'
import { useMemo, useState } from 'react'
import type { DayRoof, DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import { posedMemberOf } from '../../../shared/drawing/timber-pose.ts'
import { markingCardOf } from '../../../shared/marking/marking-card.ts'
import { MarkingCardView } from '../../drawings/marking-card-view.tsx'
import { RoofPlan } from '../../drawings/roof-plan.tsx'
import { Badge } from '../../ui/badge.tsx'
import { Card } from '../../ui/card.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { Skeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { CloseDayKey } from './close-day-key.tsx'
import { CautionNotes, ChangesNote, HeightNote } from './day-notes.tsx'
import { DayFacts } from './day-facts.tsx'
import { JumpKeys, planPlaceId } from './jump-keys.tsx'
import { PlatesNote } from './plates-note.tsx'
import { todayQueries } from './today-queries.ts'
import { WorkList } from './work-list.tsx'

function SheetPlan({ sheet, roof }: { sheet: DaySheet; roof: DayRoof }) {
  const [picked, setPicked] = useState<string | null>(null)
  const due = useMemo(() => new Set(sheet.dueMarks), [sheet.dueMarks])
  const done = useMemo(() => new Set(sheet.doneMarks), [sheet.doneMarks])
  return (
    <Card
      id={planPlaceId(sheet)}
      tabIndex={-1}
      aria-label="Roof plan"
      className="scroll-mt-2 self-start p-2 sm:p-4 lg:sticky lg:top-4 print:static print:mx-auto print:w-[120mm] print:break-inside-avoid"
    >
      <RoofPlan
        roof={roof.roof}
        spec={roof.spec}
        due={due}
        done={done}
        selected={picked}
        units={roof.marking.units}
        label={`Roof plan of ${sheet.job.title}, what is due this day marked`}
        onPick={setPicked}
      />
      <PickedCard sheet={sheet} roof={roof} mark={picked} onClose={() => setPicked(null)} />
    </Card>
  )
}

type PickedProps = { sheet: DaySheet; roof: DayRoof; mark: string | null; onClose: () => void }

/** The card of a timber tapped on the plan. */
function PickedCard({ sheet, roof, mark, onClose }: PickedProps) {
  const line = roof.spec.cutLines.find((one) => mark !== null && one.members.includes(mark))
  if (!line) return null
  const card = markingCardOf(roof.spec, line.mark, roof.marking)
  const member = posedMemberOf(roof.spec, mark)
  return (
    <Dialog open place="panel" onClose={onClose} title={`${mark}, ${card.name}`}>
      <div className="site-screen">
        <MarkingCardView
          card={card}
          member={member}
          units={roof.marking.units}
          platesMeasured={sheet.plates !== null}
        />
      </div>
    </Dialog>
  )
}

function SheetRoof({ sheet, revisionId }: { sheet: DaySheet; revisionId: string }) {
  const query = useQuery(todayQueries.roof(sheet.bookingDayId, revisionId))
  if (query.isPending) return <Skeleton className="h-72" />
  if (query.isError)
    return (
      <ErrorState
        message="The roof did not come. Its numbers are missing below."
        onRetry={() => void query.refetch()}
      />
    )
  return <SheetPlan sheet={sheet} roof={query.data} />
}

/** One booking of the day: facts and plan beside the work. */
export function SheetView({ sheet, today }: { sheet: DaySheet; today: string }) {
  const { job, revision } = sheet
  const roof = useQuery({
    ...todayQueries.roof(sheet.bookingDayId, revision?.id ?? ''),
    enabled: revision !== null,
  })
  return (
    <section className="border-t-2 border-ink pt-4" aria-labelledby={`job-${sheet.bookingDayId}`}>
      <div className="mb-3 flex flex-wrap items-baseline gap-x-3 gap-y-1">
        <h2 id={`job-${sheet.bookingDayId}`} className="text-2xl font-extrabold leading-tight">
          {job.number} {job.title}
        </h2>
        <p className="flex flex-wrap items-center gap-2 text-base">
          Day {sheet.dayNumber} of {sheet.dayCount}
          {revision ? <Badge kind="chalk">Revision {revision.letter}</Badge> : null}
          {sheet.state === 'pencilled' ? <Badge kind="ochre">Pencilled</Badge> : null}
        </p>
      </div>
      {/* A phone reads facts, work, plan; a desk has the plan under the facts, beside the work. */}
      <div className="grid gap-4 lg:grid-cols-[minmax(0,5fr)_minmax(0,6fr)] lg:grid-rows-[auto_1fr] lg:gap-x-6 print:block print:space-y-3">
        <div className="space-y-3">
          <JumpKeys sheet={sheet} />
          <ChangesNote sheet={sheet} />
          <DayFacts sheet={sheet} />
          <PlatesNote sheet={sheet} />
          <CautionNotes sheet={sheet} />
          <HeightNote />
        </div>
        <div className="space-y-5 lg:col-start-2 lg:row-span-2 lg:row-start-1">
          <WorkList sheet={sheet} roof={roof.data ?? null} today={today} />
          <CloseDayKey sheet={sheet} today={today} />
        </div>
        {revision ? <SheetRoof sheet={sheet} revisionId={revision.id} /> : null}
      </div>
    </section>
  )
}
