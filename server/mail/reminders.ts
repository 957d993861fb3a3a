import { and, eq } from 'drizzle-orm'
import type { Day } from '../../shared/calendar/days.ts'
import { instantAt, localDayOf } from '../../shared/calendar/local-time.ts'
import { previousWorkedDay } from '../../shared/calendar/working-days.ts'
import type { DbOrTx } from '../db/client.ts'
import { toldDays } from '../db/tables/mail-tables.ts'
import { people } from '../db/tables/people-tables.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import { enqueueOrRevive } from './outbox-store.ts'
import { firmDaysFrom, peopleToTell, startsOf, toldDayOf } from './told-day.ts'

/** When a day's reminder goes: the firm's hour on the working day before; null when none is near. */
export function reminderInstant(firm: Firm, day: Day): Date | null {
  const before = previousWorkedDay(firm, day)
  return before === null ? null : instantAt(before, firm.reminderAt, firm.timeZone)
}

/** Days that have firm bookings and whose reminder hour has come, today's included. */
function dueDays(db: DbOrTx, firm: Firm, now: Date): Day[] {
  const today = localDayOf(now, firm.timeZone)
  const days = firmDaysFrom(db, today)
  const notYet = days.findIndex((day) => {
    const at = reminderInstant(firm, day)
    return at === null || at > now
  })
  return notYet === -1 ? days : days.slice(0, notYet)
}

function wasReminded(db: DbOrTx, personId: string, day: Day): boolean {
  const row = db
    .select({ id: toldDays.id })
    .from(toldDays)
    .where(and(eq(toldDays.personId, personId), eq(toldDays.day, day), eq(toldDays.reminded, true)))
    .get()
  return row !== undefined
}

function remind(db: DbOrTx, firm: Firm, personId: string, day: Day, now: Date): boolean {
  if (wasReminded(db, personId, day)) return false
  const starts = startsOf(toldDayOf(db, firm, personId, day), day, firm.timeZone)
  if (starts === null || starts.first <= now) return false
  const person = db.select().from(people).where(eq(people.id, personId)).get()
  if (!person) return false
  return enqueueOrRevive(db, {
    key: `reminder:${personId}:${day}`,
    kind: 'crew-reminder',
    personId,
    toName: person.name,
    toEmail: person.email,
    payload: { day },
    now,
    notAfter: starts.first,
  })
}

/**
 * Puts in the outbox the reminders whose hour has come: one a person and day, whatever is booked. What is
 * booked after the hour is found by the next call, and so goes at once; nothing is made once work starts.
 */
export function scheduleReminders(db: DbOrTx, now: Date): number {
  const firm = readFirm(db)
  let made = 0
  for (const day of dueDays(db, firm, now)) {
    for (const personId of peopleToTell(db, day)) {
      if (remind(db, firm, personId, day, now)) made += 1
    }
  }
  return made
}
