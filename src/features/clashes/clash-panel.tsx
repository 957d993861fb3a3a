import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Link } from 'react-router-dom'
import type { ClashList } from '../../../shared/clashes/clash-list-schemas.ts'
import type { ClashCode } from '../../../shared/clashes/clash-schemas.ts'
import { neededFirst } from '../../../shared/clashes/clash-words.ts'
import { daysInWords } from '../../../shared/clashes/days-in-words.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { failureText } from '../../lib/failure-text.ts'
import { useMay } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { FlagItem } from '../../ui/flag-line.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { useClashAddress } from './clash-address.ts'
import { ClashFilters } from './clash-filters.tsx'
import { clashQueries } from './clash-queries.ts'
import { type ClashBookingView, clashBookings, countWords } from './clash-view.ts'

function BookingCard({ booking, search }: { booking: ClashBookingView; search: string }) {
  const mayBook = useMay('booking:write')
  const { crew, job, state } = booking
  return (
    <li className="rounded-md border border-rule p-3">
      <p className="flex flex-wrap items-center gap-x-2">
        <CrewPennant {...crew} />
        <Link
          to={`/calendar/bookings/${booking.id}${search}`}
          className="inline-flex min-h-11 items-center font-semibold text-chalk underline [overflow-wrap:anywhere]"
        >
          {job.number} {job.title}
        </Link>
        <span className="text-sm text-ink-soft">
          {crew.name}, {state}
        </span>
      </p>
      <ul className="divide-y divide-rule">
        {booking.clashes.map((clash) => (
          <FlagItem
            key={`${clash.code} ${clash.weight} ${clash.text}`}
            weight={clash.weight}
            when={daysInWords(clash.days)}
            text={clash.text}
            wayOut={mayBook ? clash.wayOut : undefined}
          />
        ))}
      </ul>
      {isOfMilestones(booking) ? (
        <Link
          to={`/jobs/${job.id}`}
          className="inline-flex min-h-11 items-center font-semibold text-chalk underline"
        >
          What the job waits for
        </Link>
      ) : null}
    </li>
  )
}

/** What is settled on the job rather than on the booking. */
function isOfMilestones({ clashes }: ClashBookingView): boolean {
  return clashes.some(({ code }) => milestoneCodes.includes(code))
}

const milestoneCodes: readonly ClashCode[] = Object.values(neededFirst).map(({ code }) => code)

const shownAtOnce = 40
/** As many as are seen at a glance need no filter. */
const fewBookings = 4

function Bookings({ list }: { list: ClashList }) {
  const address = useClashAddress()
  const mayBook = useMay('booking:write')
  const [most, setMost] = useState(shownAtOnce)
  if (list.clashes.length === 0)
    return (
      <EmptyState title="Nothing stands in the way">
        A crew booked twice, somebody away, a ticket lapsed, timber later than the first cut: from
        today on, all of it would be listed here.
      </EmptyState>
    )
  const found = clashBookings(list, address.filter)
  return (
    <div className="space-y-4">
      <p className="text-ink-soft">
        {countWords(list)}, from today on. A clash must be settled; a caution may stand.
        {mayBook ? '' : ' Ask the office about any of them.'}
      </p>
      {list.bookings.length > fewBookings || address.isFiltered ? (
        <ClashFilters list={list} filter={address.filter} change={address.change} />
      ) : null}
      {found.length === 0 ? (
        <EmptyState
          title="None like that"
          action={
            <Button kind="plain" onClick={address.showAll}>
              Show all
            </Button>
          }
        />
      ) : (
        <ul className="space-y-3">
          {found.slice(0, most).map((booking) => (
            <BookingCard key={booking.id} booking={booking} search={address.calendarSearch} />
          ))}
        </ul>
      )}
      {found.length > most ? (
        <Button kind="plain" onClick={() => setMost(most + shownAtOnce)}>
          Show {Math.min(shownAtOnce, found.length - most)} more
        </Button>
      ) : null}
    </div>
  )
}

/** Everything that stands in the way of the bookings from today on, with a way out of each. */
export function ClashPanel() {
  const { close } = useClashAddress()
  const { data, error, refetch } = useQuery(clashQueries.list())
  return (
    <Dialog open place="panel" title="Clashes" onClose={close}>
      {data ? (
        <Bookings list={data} />
      ) : error ? (
        <ErrorState
          message={failureText(error) ?? 'The list could not be loaded.'}
          onRetry={() => void refetch()}
        />
      ) : (
        <PageSkeleton />
      )}
    </Dialog>
  )
}
