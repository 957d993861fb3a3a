import { Draggable } from '@fullcalendar/interaction'
import { GripVertical } from 'lucide-react'
import { useEffect, useRef } from 'react'
import { Link, useSearchParams } from 'react-router-dom'
import type { CalendarCrew, UnbookedJob } from '../../../shared/bookings/calendar-schemas.ts'
import { formatDay } from '../../../shared/calendar/days.ts'
import { RoofGlyph } from '../../drawings/roof-glyph.tsx'
import { searchWith } from './calendar-address.ts'
import { workWords } from './work-words.ts'

type Props = { jobs: readonly UnbookedJob[]; crews: readonly CalendarCrew[]; mayDrag: boolean }

/** Jobs won without a booking; dragged onto a day, or booked by their link. */
export function UnbookedList({ jobs, crews, mayDrag }: Props) {
  const [search] = useSearchParams()
  const list = useRef<HTMLUListElement>(null)
  useEffect(() => {
    if (!mayDrag || !list.current) return
    const draggable = new Draggable(list.current, {
      itemSelector: '[data-job]',
      // The drop opens the form; the grid itself makes nothing.
      eventData: () => ({ create: false, title: '' }),
    })
    return () => draggable.destroy()
  }, [mayDrag])
  return (
    <ul ref={list} className="space-y-2">
      {jobs.map((job) => (
        <li
          key={job.id}
          data-job={job.id}
          className={`rounded-md border border-rule bg-sheet p-2 ${mayDrag ? 'cursor-grab' : ''}`}
        >
          <div className="flex items-start gap-2">
            {job.glyph ? <RoofGlyph glyph={job.glyph} sizePx={40} /> : null}
            <div className="min-w-0 flex-1">
              <p className="font-semibold [overflow-wrap:anywhere]">{job.title}</p>
              <p className="text-sm text-ink-soft">
                {job.number}
                {job.wantedBy ? ` · wanted by ${formatDay(job.wantedBy)}` : ''}
              </p>
            </div>
            {mayDrag ? (
              <GripVertical size={18} aria-hidden className="shrink-0 text-ink-soft" />
            ) : null}
          </div>
          <p className="mt-1 text-sm">{workWords(job, crews)}</p>
          <p className="flex flex-wrap gap-x-4">
            <Link
              to={`/calendar/book${searchWith(search, { job: job.id })}`}
              aria-label={`Book ${job.title}`}
              className="inline-flex min-h-11 items-center font-semibold text-chalk underline"
            >
              Book
            </Link>
            <Link
              to={`/calendar/find-days${searchWith(search, { job: job.id })}`}
              aria-label={`Find days for ${job.title}`}
              className="inline-flex min-h-11 items-center font-semibold text-chalk underline"
            >
              Find days
            </Link>
          </p>
        </li>
      ))}
    </ul>
  )
}
