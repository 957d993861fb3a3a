import { permissionScope } from '../../shared/auth/permissions.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { groupedClashes } from '../../shared/clashes/grouped-clashes.ts'
import type { ClashList } from '../../shared/clashes/clash-list-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Db } from '../db/client.ts'
import { readFirm } from '../firm/firm-store.ts'
import type { Clock } from '../lib/clock.ts'
import { bookingDayVisible } from '../lib/visibility.ts'
import { readSeenBookings, readLastBookedDay } from './clash-store.ts'
import { readClashes } from './read-clashes.ts'

export function createClashService({ db, clock }: { db: Db; clock: Clock }) {
  return {
    /** Everything that stands in the way from today on, as far as the user may see the days. */
    list(user: CurrentUser): ClashList {
      const firm = readFirm(db)
      const now = clock.now()
      const today = localDayOf(now, firm.timeZone)
      const isOffice = permissionScope(user.role, 'booking:write') === 'all'
      const span = { from: today, to: readLastBookedDay(db) ?? today }
      const visible = bookingDayVisible(user, 'calendar:read', firm, now)
      const seen = readSeenBookings(db, span, visible)
      const found = readClashes(db, span, { firm, today, reader: isOffice ? 'office' : 'crew' })
      const clashes = groupedClashes(
        found.filter(({ bookingId, day }) => seen.days.has(`${bookingId} ${day}`)),
      )
      const concerned = new Set(clashes.map((clash) => clash.bookingId))
      return {
        today,
        clashes,
        bookings: seen.bookings.filter((booking) => concerned.has(booking.id)),
      }
    },
  }
}
