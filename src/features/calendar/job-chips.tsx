import { useDraggable } from '@dnd-kit/core'
import { GripVertical } from 'lucide-react'
import { Link, useSearchParams } from 'react-router-dom'
import type { CalendarCrew, UnbookedJob } from '../../../shared/bookings/calendar-schemas.ts'
import { formatDay } from '../../../shared/calendar/days.ts'
import { RoofGlyph } from '../../drawings/roof-glyph.tsx'
import { searchWith } from './calendar-address.ts'
import { workWords } from './work-words.ts'

function JobChip({ job, crews }: { job: UnbookedJob; crews: readonly CalendarCrew[] }) {
  const [search] = useSearchParams()
  const { attributes, listeners, setNodeRef, setActivatorNodeRef } = useDraggable({
    id: `job ${job.id}`,
    data: { kind: 'job', job },
    attributes: { roleDescription: 'job to book' },
  })
  return (
    <li
      ref={setNodeRef}
      {...listeners}
      className="flex cursor-grab items-start gap-2 rounded-md border border-rule bg-sheet p-2"
    >
      <button
        type="button"
        ref={setActivatorNodeRef}
        {...attributes}
        role={undefined}
        aria-label={`Take ${job.number} ${job.title} in hand`}
        className="-my-1 -ml-1 flex h-11 w-8 shrink-0 cursor-grab items-center justify-center rounded-md text-ink-soft"
      >
        <GripVertical size={18} aria-hidden />
      </button>
      {job.glyph ? <RoofGlyph glyph={job.glyph} sizePx={36} /> : null}
      <div className="min-w-0 flex-1 text-sm">
        <p className="line-clamp-2 text-base font-semibold leading-tight [overflow-wrap:anywhere]">
          {job.title}
        </p>
        <p className="text-ink-soft">
          {job.number}
          {job.wantedBy ? ` · wanted by ${formatDay(job.wantedBy)}` : ''}
        </p>
        <p>{workWords(job, crews)}</p>
      </div>
      <Link
        to={`/calendar/book${searchWith(search, { job: job.id })}`}
        aria-label={`Book ${job.title}`}
        className="inline-flex min-h-11 items-center px-1 font-semibold text-chalk underline"
      >
        Book
      </Link>
    </li>
  )
}

/** Jobs won without a booking, carried onto a crew's day by pointer or keys. */
export function JobChips(props: { jobs: readonly UnbookedJob[]; crews: readonly CalendarCrew[] }) {
  const { jobs, crews } = props
  return (
    <section aria-labelledby="job-chips" className="mt-5">
      <h2 id="job-chips" className="text-lg font-extrabold">
        Won, not booked{jobs.length > 0 ? ` (${jobs.length})` : ''}
      </h2>
      {jobs.length === 0 ? (
        <p className="text-ink-soft">None waiting. A job comes here once its price is accepted.</p>
      ) : (
        <>
          <p className="mb-2 text-sm text-ink-soft">
            Carry one onto a crew’s day to pencil it in for as many days as the work needs.
          </p>
          <ul className="grid gap-2 sm:grid-cols-2 xl:grid-cols-3">
            {jobs.map((job) => (
              <JobChip key={job.id} job={job} crews={crews} />
            ))}
          </ul>
        </>
      )}
    </section>
  )
}
