import { useQuery } from '@tanstack/react-query'
import { ChevronLeft, ChevronRight, Hand } from 'lucide-react'
import { Link, useSearchParams } from 'react-router-dom'
import { formatDay } from '../../../shared/calendar/days.ts'
import { isDone } from '../../../shared/day-sheets/day-pieces.ts'
import type { DayTask, MyTasks } from '../../../shared/day-sheets/task-schemas.ts'
import { workAtHeight } from '../../../shared/marking/marking-card.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useTicks } from '../../lib/use-ticks.ts'
import { Badge } from '../../ui/badge.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState, Note } from '../../ui/states.tsx'
import { SunlightSwitch } from '../../ui/sunlight-switch.tsx'
import { myTasksQueries } from './my-tasks-queries.ts'

const dayKeyClass = `${buttonClass('plain', 'site')} flex-1`

function DayKeys({ mine }: { mine: MyTasks }) {
  const { previousDay, nextDay } = mine
  if (!previousDay && !nextDay) return null
  return (
    <nav aria-label="Days" className="mb-4 flex gap-2">
      {previousDay ? (
        <Link to={`/my-tasks?day=${previousDay}`} className={dayKeyClass}>
          <ChevronLeft size={24} aria-hidden />
          {formatDay(previousDay)}
        </Link>
      ) : null}
      {nextDay ? (
        <Link to={`/my-tasks?day=${nextDay}`} className={dayKeyClass}>
          {formatDay(nextDay)}
          <ChevronRight size={24} aria-hidden />
        </Link>
      ) : null}
    </nav>
  )
}

function TaskLink({ task }: { task: DayTask }) {
  const { count, unsent } = useTicks(task)
  const done = isDone({ quantity: task.quantity, doneCount: count })
  return (
    <Link
      to={`/my-tasks/${task.id}`}
      className={`flex min-h-20 items-center justify-between gap-3 rounded-md border border-l-8 bg-sheet p-4 ${done ? 'border-leaf' : 'border-rule border-l-clay'}`}
    >
      <span className="min-w-0">
        <span className="block text-xl font-extrabold leading-tight">{task.title}</span>
        <span className="flex flex-wrap gap-1">
          {done ? <Badge kind="leaf">Done</Badge> : null}
          {task.handRaisedAt ? (
            <Badge kind="stop">
              <Hand size={16} aria-hidden /> Hand up
            </Badge>
          ) : null}
          {unsent > 0 ? <Badge kind="ochre">{unsent} not yet sent</Badge> : null}
        </span>
      </span>
      <span className="shrink-0 text-right">
        <span className="numeral text-[2rem]">{count}</span>
        <span className="text-base"> of {task.quantity}</span>
      </span>
    </Link>
  )
}

function Place({ place }: { place: MyTasks['places'][number] }) {
  return (
    <section aria-labelledby={`place-${place.bookingDayId}`} className="space-y-3">
      <div>
        <h2 id={`place-${place.bookingDayId}`} className="text-xl font-extrabold leading-tight">
          {place.jobNumber} {place.jobTitle}
        </h2>
        <p className="text-base">
          Start {place.startAt}
          {place.siteAddress ? `, ${place.siteAddress}` : ''}
          {place.revisionLetter ? `. Revision ${place.revisionLetter}` : ''}
        </p>
        {place.platesMeasured || !place.revisionLetter ? null : (
          <p className="text-base font-semibold">From plan, plates not measured.</p>
        )}
      </div>
      <ul className="list-none space-y-3 p-0">
        {place.tasks.map((task) => (
          <li key={task.id}>
            <TaskLink task={task} />
          </li>
        ))}
      </ul>
    </section>
  )
}

function NoTasks({ mine }: { mine: MyTasks }) {
  const { nextDay } = mine
  return (
    <EmptyState
      title="No tasks for you this day"
      action={
        <Link
          to={nextDay ? `/my-tasks?day=${nextDay}` : `/today?day=${mine.day}`}
          className={buttonClass('primary', 'site')}
        >
          {nextDay ? `Open ${formatDay(nextDay)}` : 'See the day sheet'}
        </Link>
      }
    >
      The leading hand hands them out on the day.
    </EmptyState>
  )
}

/** What somebody has been handed for a day. */
export function MyTasksPage() {
  const [params] = useSearchParams()
  const query = useQuery(myTasksQueries.ofDay(params.get('day')))
  if (query.isPending) return <PageSkeleton />
  if (query.isError)
    return (
      <>
        <PageHeader title="My tasks" />
        <ErrorState
          message={failureText(query.error) ?? query.error.message}
          onRetry={() => void query.refetch()}
        />
      </>
    )
  const mine = query.data
  return (
    <div className="site-screen">
      <PageHeader
        title="My tasks"
        lead={
          <span className="text-ink">
            {mine.day === mine.today ? 'Today, ' : ''}
            {formatDay(mine.day)}
          </span>
        }
        actions={<SunlightSwitch />}
      />
      <DayKeys mine={mine} />
      {mine.places.length === 0 ? <NoTasks mine={mine} /> : null}
      <div className="space-y-6">
        {mine.places.map((place) => (
          <Place key={place.bookingDayId} place={place} />
        ))}
        {mine.places.length > 0 ? (
          <Note kind="stop" title="Working at height">
            <p className="text-base">{workAtHeight}</p>
          </Note>
        ) : null}
      </div>
    </div>
  )
}
