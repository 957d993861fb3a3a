import { keepPreviousData, useQuery } from '@tanstack/react-query'
import { ChevronLeft, ChevronRight, Download } from 'lucide-react'
import { Link, useSearchParams } from 'react-router-dom'
import { dayPlus, formatDay, formatDayWithYear } from '../../../shared/calendar/days.ts'
import type { WeekHours } from '../../../shared/day-logs/hours-schemas.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { failureText } from '../../lib/failure-text.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState, Note } from '../../ui/states.tsx'
import { dayLogQueries } from './day-log-queries.ts'
import { WeekTable } from './week-table.tsx'

function WeekPicker({ hours, onWeek }: { hours: WeekHours; onWeek: (day: string) => void }) {
  const monday = hours.days[0] ?? hours.today
  return (
    <nav aria-label="Weeks" className="mb-4 flex flex-wrap items-center gap-2">
      <Button kind="plain" aria-label="Week before" onClick={() => onWeek(dayPlus(monday, -7))}>
        <ChevronLeft size={20} aria-hidden />
      </Button>
      <div className="w-44">
        <TextInput
          type="date"
          aria-label="A day of the week to show"
          value={monday}
          onChange={(event) => (event.target.value ? onWeek(event.target.value) : undefined)}
        />
      </div>
      <Button kind="plain" aria-label="Week after" onClick={() => onWeek(dayPlus(monday, 7))}>
        <ChevronRight size={20} aria-hidden />
      </Button>
      {hours.days.includes(hours.today) ? null : (
        <Button kind="quiet" onClick={() => onWeek(hours.today)}>
          This week
        </Button>
      )}
    </nav>
  )
}

/** Days past that nobody has closed: the week is not ready for the wages yet. */
function OpenDays({ open }: Pick<WeekHours, 'open'>) {
  if (open.length === 0) return null
  return (
    <div className="mb-4">
      <Note
        kind="caution"
        title={
          open.length === 1
            ? 'One day is not closed: its hours are missing'
            : `${open.length} days are not closed: their hours are missing`
        }
      >
        <ul>
          {open.map(({ bookingDayId, day, job, crew }) => (
            <li key={bookingDayId}>
              <Link
                to={`/today/close/${bookingDayId}`}
                className="inline-flex min-h-11 items-center gap-x-3 text-chalk underline"
              >
                <CrewPennant letter={crew.letter} colour={crew.colour} name={crew.name} />
                <span>
                  {formatDay(day)}, {job.number} {job.title}
                </span>
              </Link>
            </li>
          ))}
        </ul>
      </Note>
    </div>
  )
}

function WeekBody({ hours, onWeek }: { hours: WeekHours; onWeek: (day: string) => void }) {
  const [monday = hours.today, , , , , , sunday = hours.today] = hours.days
  return (
    <>
      <PageHeader
        title="Hours"
        lead={`${formatDay(monday)} to ${formatDayWithYear(sunday)}, as the crews closed their days.`}
        actions={
          hours.people.length > 0 ? (
            <a href={`/api/hours.csv?week=${monday}`} download className={buttonClass('plain')}>
              <Download size={18} aria-hidden />
              Save as CSV
            </a>
          ) : null
        }
      />
      <WeekPicker hours={hours} onWeek={onWeek} />
      <OpenDays open={hours.open} />
      {hours.people.length === 0 ? (
        <EmptyState
          title="Nobody works on site yet"
          action={
            <Link to="/people" className={buttonClass('plain')}>
              Go to People
            </Link>
          }
        >
          Add leading hands and apprentices; their hours come from the days they close.
        </EmptyState>
      ) : (
        <WeekTable hours={hours} />
      )}
    </>
  )
}

/** Everybody's hours of a week, to read and to take to the wages. */
export function WeekHoursPage() {
  const [params, setParams] = useSearchParams()
  const query = useQuery({
    ...dayLogQueries.week(params.get('week')),
    placeholderData: keepPreviousData,
  })
  if (query.isPending) return <PageSkeleton />
  if (query.isError && !query.data)
    return (
      <>
        <PageHeader title="Hours" />
        <ErrorState
          message={failureText(query.error) ?? 'The hours could not be loaded.'}
          onRetry={() => void query.refetch()}
        />
      </>
    )
  return (
    <div aria-busy={query.isPlaceholderData}>
      <WeekBody hours={query.data} onWeek={(week) => setParams({ week })} />
    </div>
  )
}
