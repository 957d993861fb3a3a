import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { ChevronLeft, ChevronRight, Hand } from 'lucide-react'
import { Link, useParams } from 'react-router-dom'
import { formatDay, formatDayWithYear } from '../../../shared/calendar/days.ts'
import type { DayTask, TaskDetail } from '../../../shared/day-sheets/task-schemas.ts'
import { workAtHeight } from '../../../shared/marking/marking-card.ts'
import { MarkingCardView } from '../../drawings/marking-card-view.tsx'
import { ApiFailure } from '../../lib/api-client.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useSession, useUser } from '../../lib/session.ts'
import { useDayAsk } from '../../lib/use-day-ask.tsx'
import { useTicks, withTask } from '../../lib/use-ticks.ts'
import { Badge } from '../../ui/badge.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { CountStepper } from '../../ui/count-stepper.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PrintFoot } from '../../ui/print-foot.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState, Note } from '../../ui/states.tsx'
import { SunlightSwitch } from '../../ui/sunlight-switch.tsx'
import { useToast } from '../../ui/toast.tsx'
import { myTasksQueries, raiseHand } from './my-tasks-queries.ts'

function HandKey({ task }: { task: DayTask }) {
  const client = useQueryClient()
  const toast = useToast()
  const queryKey = myTasksQueries.all()
  const hand = useMutation({
    mutationFn: (raised: boolean) => raiseHand(task.id, raised),
    onSuccess: (answer) =>
      void client.setQueriesData({ queryKey }, (data: unknown) => withTask(data, answer.task)),
    onError: (error) => toast(failureText(error) ?? '', { kind: 'stop' }),
    onSettled: () => client.invalidateQueries({ queryKey }),
  })
  const isUp = task.handRaisedAt !== null
  return (
    <button
      type="button"
      aria-label={isUp ? 'Hand is up. Lower it' : 'Stuck? Raise a hand'}
      disabled={hand.isPending}
      aria-busy={hand.isPending || undefined}
      onClick={() => hand.mutate(!isUp)}
      className={`flex h-20 w-16 shrink-0 flex-col items-center justify-center rounded-md border-2 text-sm font-semibold leading-tight disabled:opacity-50 ${isUp ? 'border-stop text-stop' : 'border-ink'}`}
    >
      <Hand size={28} aria-hidden />
      <span aria-hidden>{isUp ? 'Hand up' : 'Stuck?'}</span>
    </button>
  )
}

/** The tasks before and after this one, of the same person and day. */
function Neighbours({ task }: { task: DayTask }) {
  const { data } = useQuery(myTasksQueries.ofDay(task.day))
  const all = data?.places.flatMap((place) => place.tasks) ?? []
  const at = all.findIndex((one) => one.id === task.id)
  if (at < 0) return null
  const [before, after] = [all[at - 1], all[at + 1]]
  const keyClass = `${buttonClass('plain', 'site')} min-w-0 flex-1`
  return (
    <nav aria-label="Tasks" className="flex gap-2">
      {before ? (
        <Link to={`/my-tasks/${before.id}`} className={keyClass}>
          <ChevronLeft size={24} aria-hidden className="shrink-0" />
          <span className="min-w-0">{before.title}</span>
        </Link>
      ) : null}
      {after ? (
        <Link to={`/my-tasks/${after.id}`} className={keyClass}>
          <span className="min-w-0">{after.title}</span>
          <ChevronRight size={24} aria-hidden className="shrink-0" />
        </Link>
      ) : null}
    </nav>
  )
}

/** Within reach of a thumb while the card above is read. */
function TickBar({ task, today }: { task: DayTask; today: string }) {
  const { askFirst, question } = useDayAsk(task.day, today)
  const { count, unsent, step } = useTicks(task)
  return (
    <div className="sticky bottom-[calc(3.5rem+env(safe-area-inset-bottom))] z-10 -mx-4 flex items-center justify-between gap-2 border-t-2 border-ink bg-sheet px-3 py-2 sm:justify-center sm:gap-6 lg:bottom-0 lg:mx-0 lg:rounded-md lg:border-2 print:hidden">
      <CountStepper
        label={task.title}
        count={count}
        total={task.quantity}
        unsent={unsent}
        onStep={(delta) => askFirst(() => step(delta))}
        size="large"
      />
      <HandKey task={task} />
      {question}
    </div>
  )
}

function TaskBody({ detail }: { detail: TaskDetail }) {
  const { task, place, card, member, units, shareWords } = detail
  const { role } = useUser()
  const { firm } = useSession()
  const { count } = useTicks(task)
  const backTo = role === 'apprentice' ? `/my-tasks?day=${task.day}` : `/today?day=${task.day}`
  return (
    <>
      <PageHeader
        title={task.title}
        lead={
          <span className="text-ink">
            {place.jobNumber} {place.jobTitle}, {formatDay(task.day)}
            {place.revisionLetter ? `, revision ${place.revisionLetter}` : ''}
          </span>
        }
        actions={
          <>
            <Link to={backTo} className={buttonClass('plain', 'site')}>
              <ChevronLeft size={22} aria-hidden />
              {role === 'apprentice' ? 'My tasks' : 'The day'}
            </Link>
            <SunlightSwitch />
          </>
        }
      />
      <PrintFoot
        left={`${firm.name}: ${place.jobNumber}${place.revisionLetter ? `, revision ${place.revisionLetter}` : ''}`}
        middle={`${task.title}, ${formatDayWithYear(task.day)}`}
      />
      <div className="mx-auto max-w-3xl space-y-4">
        {count >= task.quantity ? (
          <Note kind="done" title={task.quantity === 1 ? 'Done' : `All ${task.quantity} done`} />
        ) : null}
        {card ? (
          <p>
            <span className="text-xl font-extrabold text-clay">{card.mark}</span> {card.name} ·{' '}
            {card.section} · <span className="font-semibold">{shareWords}</span>
            <span className="block text-base">{task.memberMarks.join(', ')}</span>
          </p>
        ) : null}
        {task.work === 'cut' && task.firstPiece ? (
          <Badge kind="leaf">First piece tried by {task.firstPiece.by}</Badge>
        ) : null}
        {card ? (
          <MarkingCardView
            card={card}
            member={member}
            units={units}
            platesMeasured={place.platesMeasured}
          />
        ) : (
          <p>There is no marking card for this. Ask the leading hand how it is to be done.</p>
        )}
        {task.work === 'stand' ? (
          <Note kind="stop" title="Working at height">
            <p className="text-base">{workAtHeight}</p>
          </Note>
        ) : null}
        <div className="print:hidden">
          <Neighbours task={task} />
        </div>
        <TickBar task={task} today={detail.today} />
      </div>
    </>
  )
}

/** A task handed to somebody else is answered like one that is not there. */
function TaskFailure({ error, onRetry }: { error: Error; onRetry: () => void }) {
  const isGone = error instanceof ApiFailure && error.status === 404
  return (
    <div className="site-screen space-y-4">
      <PageHeader title="Task" />
      {isGone ? (
        <EmptyState
          title="This task is not yours"
          action={
            <Link to="/my-tasks" className={buttonClass('primary', 'site')}>
              My tasks
            </Link>
          }
        >
          It may have been handed to somebody else, or the day was planned again.
        </EmptyState>
      ) : (
        <ErrorState message={failureText(error) ?? error.message} onRetry={onRetry} />
      )}
    </div>
  )
}

/** One task: its marking card, its ticks, a raised hand. */
export function TaskPage() {
  const { taskId = '' } = useParams()
  const query = useQuery(myTasksQueries.detail(taskId))
  if (query.isPending) return <PageSkeleton />
  if (query.isError) return <TaskFailure error={query.error} onRetry={() => void query.refetch()} />
  return (
    <div className="site-screen">
      <TaskBody key={query.data.task.id} detail={query.data} />
    </div>
  )
}
