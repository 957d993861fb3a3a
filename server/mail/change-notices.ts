import { eq, gte, inArray, isNotNull, and } from 'drizzle-orm'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import type { DbOrTx } from '../db/client.ts'
import { toldDays } from '../db/tables/mail-tables.ts'
import { people } from '../db/tables/people-tables.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import { enqueueOrRevive } from './outbox-store.ts'
import { type DayDifference, readToldDifferences, type ToldRow } from './told-differences.ts'

const minuteMs = 60_000

function setPending(db: DbOrTx, row: ToldRow, hash: string, since: Date): void {
  db.update(toldDays)
    .set({ pendingHash: hash, pendingSince: since })
    .where(eq(toldDays.id, row.id))
    .run()
}

/** When a difference that has been seen goes out by itself; null when it has not been seen yet. */
export function holdEndsAt(firm: Firm, difference: DayDifference): Date | null {
  const { row, hash } = difference
  if (!row?.pendingSince || row.pendingHash !== hash) return null
  return new Date(row.pendingSince.getTime() + firm.changeHoldMinutes * minuteMs)
}

/**
 * One mail with the net change of these days of one person, all written when it is sent.
 *
 * @returns whether one now waits that did not before.
 */
export function enqueueNotice(
  db: DbOrTx,
  differences: readonly DayDifference[],
  now: Date,
  options: { evenFailed?: boolean } = {},
): boolean {
  const [first] = differences
  if (!first) return false
  const person = db.select().from(people).where(eq(people.id, first.personId)).get()
  if (!person?.active || person.email === '') return false
  const round = (one: DayDifference) => `${one.day}:${(one.row?.notices ?? 0) + 1}`
  const days = differences.map((one) => one.day)
  const mail = {
    key: `change:${person.id}:${differences.map(round).join('+')}`,
    kind: 'change-notice' as const,
    personId: person.id,
    toName: person.name,
    toEmail: person.email,
    payload: { day: days[0], days },
    now,
    notAfter: new Date(Math.max(...differences.map((one) => one.until.getTime()))),
  }
  return enqueueOrRevive(db, mail, options)
}

/** Marks what is seen for the first time; says which have settled for as long as the firm holds them. */
function settled(db: DbOrTx, firm: Firm, difference: DayDifference, now: Date): boolean {
  if (!difference.row) return false
  const ends = holdEndsAt(firm, difference)
  if (ends !== null) return ends <= now
  setPending(db, difference.row, difference.hash, now)
  return firm.changeHoldMinutes === 0
}

/** A day that came back to what was told has nothing pending any more. */
function forgetSettled(db: DbOrTx, differing: ReadonlySet<string>, today: string): void {
  const pending = db
    .select({ id: toldDays.id })
    .from(toldDays)
    .where(and(gte(toldDays.day, today), isNotNull(toldDays.pendingHash)))
    .all()
  const ids = pending.map((row) => row.id).filter((id) => !differing.has(id))
  if (ids.length === 0) return
  db.update(toldDays)
    .set({ pendingHash: null, pendingSince: null })
    .where(inArray(toldDays.id, ids))
    .run()
}

/**
 * Looks at every day somebody was told of and has not started: what differs settles for the firm's hold,
 * then one notice a person with the net change waits in the outbox; what came back to what was told makes
 * none.
 */
export function scheduleChangeNotices(db: DbOrTx, now: Date): number {
  const firm = readFirm(db)
  const differences = readToldDifferences(db, firm, now)
  const differing = new Set(differences.flatMap((one) => one.row?.id ?? []))
  forgetSettled(db, differing, localDayOf(now, firm.timeZone))
  const ripe = differences.filter((one) => settled(db, firm, one, now))
  const byPerson = groupBy(ripe, (one) => one.personId)
  return [...byPerson.values()].filter((days) => enqueueNotice(db, days, now)).length
}
