import { useQuery } from '@tanstack/react-query'
import { Plus } from 'lucide-react'
import { lazy, type ReactNode, Suspense } from 'react'
import { Link, Outlet, useNavigate, useSearchParams } from 'react-router-dom'
import type { Calendar } from '../../../shared/bookings/calendar-schemas.ts'
import { useMay } from '../../lib/session.ts'
import { buttonClass } from '../../ui/button.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { Skeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { BookingMovesProvider } from './booking-moves.tsx'
import { searchWith, useCalendarAddress } from './calendar-address.ts'
import { CalendarGrid } from './calendar-grid.tsx'
import { calendarQueries } from './calendar-queries.ts'
import { CalendarToolbar } from './calendar-toolbar.tsx'
import { CrewList } from './crew-list.tsx'
import { DayList } from './day-list.tsx'
import { UnbookedSide } from './unbooked-side.tsx'
import { useMoveDay } from './use-move-day.ts'
import { useNarrow } from './use-narrow.ts'
import { useWall } from './use-wall.ts'

const CrewWeeks = lazy(async () => ({ default: (await import('./crew-weeks.tsx')).CrewWeeks }))

type Shown = {
  calendar: Calendar
  address: ReturnType<typeof useCalendarAddress>
  mayEdit: boolean
  isNarrow: boolean
}

/** The calendar as a month, a week or crew weeks; as a list on a phone. */
function CalendarBody({ calendar, address, mayEdit, isNarrow }: Shown) {
  const navigate = useNavigate()
  const [search] = useSearchParams()
  const { view, on, span, weeks, isWall } = address
  const move = useMoveDay(calendar)
  const open = (id: string) => void navigate(`/calendar/bookings/${id}${searchWith(search, {})}`)
  const bookOn = (job: string, day: string) =>
    void navigate(`/calendar/book${searchWith(search, { job, day, view, on })}`)
  if (view === 'crews')
    return isNarrow ? (
      <CrewList calendar={calendar} mayEdit={mayEdit} />
    ) : (
      <Suspense fallback={<Skeleton className="h-96" />}>
        <CrewWeeks calendar={calendar} weeks={weeks} mayEdit={mayEdit} isWall={isWall} />
      </Suspense>
    )
  if (isNarrow) return <DayList calendar={calendar} view={view} mayEdit={mayEdit} {...span} />
  return (
    <CalendarGrid
      calendar={calendar}
      view={view}
      on={on}
      mayEdit={mayEdit}
      onOpen={open}
      onMove={move}
      onDropJob={bookOn}
    />
  )
}

function BookLink() {
  const [search] = useSearchParams()
  return (
    <Link className={buttonClass()} to={`/calendar/book${searchWith(search, {})}`}>
      <Plus size={20} aria-hidden />
      Book a crew
    </Link>
  )
}

type Props = {
  /** What other features count beside it. */
  waiting?: ReactNode
  /** What other features say above it. */
  above?: ReactNode
}

/** The wall planner: who is on which roof, day by day. */
export function CalendarPage({ waiting, above }: Props) {
  const isNarrow = useNarrow()
  const mayEdit = useMay('booking:write')
  const address = useCalendarAddress(isNarrow)
  const { view, isWall, span, go } = address
  const { data: calendar, error, refetch } = useQuery(calendarQueries.span(span))
  const setWall = useWall(isWall, (on) => go({ wall: on }))
  const hasSide = mayEdit && !isNarrow && view !== 'crews'
  return (
    <BookingMovesProvider crews={calendar?.crews ?? []}>
      <PageHeader
        title="Calendar"
        actions={
          <>
            {waiting}
            {mayEdit ? <BookLink /> : null}
          </>
        }
      />
      {above}
      <div className={hasSide ? 'gap-5 xl:grid xl:grid-cols-[minmax(0,1fr)_17rem]' : ''}>
        <div
          className={isWall ? 'fixed inset-0 z-20 overflow-auto bg-paper p-3 text-lg' : 'min-w-0'}
        >
          <CalendarToolbar
            address={address}
            mayEdit={mayEdit}
            isNarrow={isNarrow}
            onWall={setWall}
          />
          {mayEdit && isNarrow ? <UnbookedSide isNarrow /> : null}
          {error ? (
            <ErrorState message={error.message} onRetry={() => void refetch()} />
          ) : !calendar ? (
            <Skeleton className="h-96" />
          ) : (
            <CalendarBody
              calendar={calendar}
              address={address}
              mayEdit={mayEdit}
              isNarrow={isNarrow}
            />
          )}
        </div>
        {hasSide ? <UnbookedSide isNarrow={false} /> : null}
      </div>
      <Outlet />
    </BookingMovesProvider>
  )
}
