import { permissionScope } from '../../shared/auth/permissions.ts'
import type { CalendarCrew } from '../../shared/bookings/calendar-schemas.ts'
import type { Day } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import { readActiveCrews } from '../bookings/calendar-service.ts'
import type { DbOrTx } from '../db/client.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import { crewIdsOf } from '../people/roster.ts'

export type RainOffViewer = {
  firm: Firm
  today: Day
  now: Date
  isOffice: boolean
  /** All for the office; otherwise those the person is in today or on the day asked about. */
  crews: CalendarCrew[]
}

export function readViewer(db: DbOrTx, user: CurrentUser, now: Date, on?: Day): RainOffViewer {
  const firm = readFirm(db)
  const today = localDayOf(now, firm.timeZone)
  const isOffice = permissionScope(user.role, 'rain-off:ask') === 'all'
  const own = new Set([today, on ?? today].flatMap((day) => crewIdsOf(db, user.id, day)))
  const crews = readActiveCrews(db).filter((crew) => isOffice || own.has(crew.id))
  return { firm, today, now, isOffice, crews }
}
