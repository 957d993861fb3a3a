import { ChevronDown, ChevronRight } from 'lucide-react'
import { useState } from 'react'
import { type JobStage, jobStageNames, jobStages } from '../../../shared/jobs/job-stage.ts'
import type { Board, JobCard as Card } from '../../../shared/jobs/job-views.ts'
import { useMay } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { BoardDrag, DraggableCard, useStagePlace } from './board-drag.tsx'
import { JobCard } from './job-card.tsx'

type ColumnProps = { stage: JobStage; cards: Card[]; count: number; onShowAll: () => void }

function Heading({ stage, count }: { stage: JobStage; count: number }) {
  return (
    <>
      <span>{jobStageNames[stage]}</span>
      <span className="font-semibold tabular-nums text-ink-soft">{count}</span>
    </>
  )
}

/** A column at the desk, narrow enough for all seven at 1360 px; on a phone a section that folds. An empty one is narrower, and left out on a phone. */
function StageColumn({ stage, cards, count, onShowAll }: ColumnProps) {
  const [open, setOpen] = useState(stage !== 'complete')
  const Chevron = open ? ChevronDown : ChevronRight
  const mayWrite = useMay('job:write')
  const { setNodeRef, isOver } = useStagePlace(stage)
  const width = count === 0 ? 'hidden lg:flex lg:w-24' : 'flex lg:w-36 lg:grow'
  return (
    <section
      ref={setNodeRef}
      className={`${width} min-h-0 shrink-0 flex-col rounded-md ${isOver ? 'outline-2 outline-clay' : ''}`}
    >
      <h2 className="text-lg font-extrabold">
        <span className="hidden items-baseline justify-between gap-2 border-b-2 border-ink pb-1 lg:flex">
          <Heading stage={stage} count={count} />
        </span>
        <button
          type="button"
          aria-expanded={open}
          onClick={() => setOpen(!open)}
          className="flex min-h-11 w-full items-center gap-2 border-b-2 border-ink text-left lg:hidden"
        >
          <Chevron size={20} aria-hidden />
          <Heading stage={stage} count={count} />
        </button>
      </h2>
      {count === 0 ? <p className="py-3 text-sm text-ink-soft">None</p> : null}
      <ul
        className={`min-h-0 gap-2 py-2 lg:flex lg:flex-1 lg:flex-col lg:overflow-y-auto lg:pr-1 ${open ? 'grid sm:grid-cols-2' : 'hidden'}`}
      >
        {cards.map((card) => (
          <li key={card.id}>
            {mayWrite ? <DraggableCard card={card} /> : <JobCard card={card} />}
          </li>
        ))}
        {count > cards.length ? (
          <li>
            <Button kind="plain" className="w-full" onClick={onShowAll}>
              Show all {count}
            </Button>
          </li>
        ) : null}
      </ul>
    </section>
  )
}

/** Every stage side by side; scrolls inside itself at the desk, stands in one stack on a phone. */
export function BoardColumns({
  board,
  onShowStage,
}: {
  board: Board
  onShowStage: (stage: JobStage) => void
}) {
  return (
    <BoardDrag cards={board.jobs}>
      <div className="space-y-3 lg:-mx-1 lg:flex lg:h-[calc(100dvh-14.25rem)] lg:min-h-96 lg:gap-2 lg:space-y-0 lg:overflow-x-auto lg:px-1 lg:pb-2">
        {jobStages.map((stage) => (
          <StageColumn
            key={stage}
            stage={stage}
            count={board.counts[stage]}
            cards={board.jobs.filter((card) => card.stage === stage)}
            onShowAll={() => onShowStage(stage)}
          />
        ))}
      </div>
    </BoardDrag>
  )
}
