import {
  type Announcements,
  DndContext,
  type DragEndEvent,
  DragOverlay,
  type DragOverEvent,
  KeyboardSensor,
  type KeyboardCoordinateGetter,
  MouseSensor,
  pointerWithin,
  rectIntersection,
  useDraggable,
  useDroppable,
  useSensor,
  useSensors,
} from '@dnd-kit/core'
import { type ReactNode, useState } from 'react'
import { jobStageNames, type JobStage, jobStages } from '../../../shared/jobs/job-stage.ts'
import type { JobCard as Card } from '../../../shared/jobs/job-views.ts'
import { stageDrop } from '../../../shared/jobs/stage-drop.ts'
import { useSession } from '../../lib/session.ts'
import { JobCard } from './job-card.tsx'
import { useStageDrop } from './use-stage-drop.ts'

const stageOf = (id: unknown): JobStage | null => jobStages.find((stage) => stage === id) ?? null

/** Arrows go from stage to stage, as the columns stand. */
const betweenStages: KeyboardCoordinateGetter = (event, { context, currentCoordinates }) => {
  const step = event.code === 'ArrowRight' ? 1 : event.code === 'ArrowLeft' ? -1 : 0
  const held = context.collisionRect
  if (step === 0 || !held) return undefined
  const columns = jobStages.flatMap((stage) => {
    const rect = context.droppableRects.get(stage)
    return rect ? [{ stage, rect }] : []
  })
  const here = columns.findIndex(({ stage }) => stage === context.over?.id)
  const next = columns[Math.min(columns.length - 1, Math.max(0, here + step))]
  if (!next) return undefined
  event.preventDefault()
  return { x: next.rect.left + 4, y: currentCoordinates.y }
}

const instructions = {
  draggable:
    'Press space to take hold of the job, left and right arrow to carry it to another stage, space to drop it there, Escape to leave it where it was.',
}

function announcementsFor(cardOf: (id: unknown) => Card | undefined, today: string): Announcements {
  const name = (id: unknown) => cardOf(id)?.number ?? 'The job'
  const meaning = (id: unknown, over: unknown): string => {
    const [card, stage] = [cardOf(id), stageOf(over)]
    if (!card || !stage) return ''
    const drop = stageDrop(card.stage, stage, today)
    if (drop === null) return 'where it was'
    return 'refused' in drop ? drop.refused : drop.said
  }
  return {
    onDragStart: ({ active }) => `${name(active.id)} taken up.`,
    onDragOver: ({ active, over }) => {
      const stage = stageOf(over?.id)
      // With the number: this follows the taking up at once and replaces it.
      return stage
        ? `${name(active.id)} over ${jobStageNames[stage]}: ${meaning(active.id, stage)}`
        : 'Over no stage.'
    },
    onDragEnd: ({ active, over }) =>
      over
        ? `${name(active.id)} dropped: ${meaning(active.id, over.id)}`
        : `${name(active.id)} left.`,
    onDragCancel: ({ active }) => `${name(active.id)} left where it was.`,
  }
}

type Props = { cards: readonly Card[]; children: ReactNode }

/** Lets cards be carried from stage to stage, by mouse or keys; the card in hand says what it would mean. */
export function BoardDrag({ cards, children }: Props) {
  const { today } = useSession().firm
  const drop = useStageDrop()
  const [held, setHeld] = useState<Card | null>(null)
  const [over, setOver] = useState<JobStage | null>(null)
  const sensors = useSensors(
    useSensor(MouseSensor, { activationConstraint: { distance: 6 } }),
    useSensor(KeyboardSensor, {
      coordinateGetter: betweenStages,
      // Enter opens the job.
      keyboardCodes: { start: ['Space'], cancel: ['Escape'], end: ['Space'] },
    }),
  )
  const cardOf = (id: unknown) => cards.find((card) => card.id === id)
  const end = ({ active, over: place }: DragEndEvent) => {
    setHeld(null)
    setOver(null)
    const [card, stage] = [cardOf(active.id), stageOf(place?.id)]
    if (card && stage) drop(card, stage)
  }
  const meaning = held && over ? stageDrop(held.stage, over, today) : null
  return (
    <DndContext
      sensors={sensors}
      collisionDetection={(args) => {
        const within = pointerWithin(args)
        return within.length > 0 ? within : rectIntersection(args)
      }}
      accessibility={{
        announcements: announcementsFor(cardOf, today),
        screenReaderInstructions: instructions,
      }}
      onDragStart={({ active }) => setHeld(cardOf(active.id) ?? null)}
      onDragOver={({ over: place }: DragOverEvent) => setOver(stageOf(place?.id))}
      onDragCancel={() => setHeld(null)}
      onDragEnd={end}
    >
      {children}
      <DragOverlay dropAnimation={null}>
        {held ? (
          <div
            className={`w-48 rounded-md border-2 bg-sheet shadow-float ${meaning && 'refused' in meaning ? 'border-stop' : 'border-clay'}`}
          >
            <JobCard card={held} />
            {meaning ? (
              <p
                className={`px-2.5 pb-2 text-sm font-semibold ${'refused' in meaning ? 'text-stop' : 'text-clay'}`}
              >
                {'refused' in meaning ? meaning.refused : meaning.said}
              </p>
            ) : null}
          </div>
        ) : null}
      </DragOverlay>
    </DndContext>
  )
}

/** A card that can be taken hold of; a click still opens the job. */
export function DraggableCard({ card }: { card: Card }) {
  const { setNodeRef, listeners, attributes, isDragging } = useDraggable({ id: card.id })
  return (
    <div
      ref={setNodeRef}
      {...listeners}
      className={isDragging ? 'opacity-40' : ''}
      onDragStart={(event) => event.preventDefault()}
    >
      <JobCard card={card} holding={{ 'aria-describedby': attributes['aria-describedby'] }} />
    </div>
  )
}

/** Where a card can be dropped. */
export function useStagePlace(stage: JobStage) {
  return useDroppable({ id: stage })
}
