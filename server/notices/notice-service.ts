import { and, eq, inArray } from 'drizzle-orm'
import { formatDay } from '../../shared/calendar/days.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import type { NotToldPerson, NotYetTold, TellThem } from '../../shared/notices/notice-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { outbox } from '../db/tables/mail-tables.ts'
import { people } from '../db/tables/people-tables.ts'
import type { Env } from '../env.ts'
import type { EventHub } from '../events/event-hub.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import { AppError } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { enqueueNotice, holdEndsAt } from '../mail/change-notices.ts'
import { dayChanges } from '../mail/day-changes.ts'
import { dayUrl } from '../mail/day-mail.ts'
import { noticeDays } from '../mail/notice-days.ts'
import { type DayDifference, readNotYetTold } from '../mail/told-differences.ts'

export type NoticeDeps = { db: Db; clock: Clock; events: EventHub; env: Env }
type PersonRow = typeof people.$inferSelect

/** `person day` of each day that a mail in the outbox tells. */
function readOnTheirWay(db: DbOrTx): Set<string> {
  const rows = db
    .select()
    .from(outbox)
    .where(and(eq(outbox.kind, 'change-notice'), inArray(outbox.state, ['waiting', 'sending'])))
    .all()
  return new Set(
    rows.flatMap((row) => noticeDays(row.payload).map((day) => `${row.personId} ${day}`)),
  )
}

function readActive(db: DbOrTx, ids: readonly string[]): PersonRow[] {
  return db
    .select()
    .from(people)
    .where(and(inArray(people.id, [...ids]), eq(people.active, true)))
    .orderBy(people.name)
    .all()
}

type DayWords = NotToldPerson['days'][number]

function textWords(days: readonly DayWords[], url: string): string {
  return [...days.map((one) => `${formatDay(one.day)}: ${one.changes.join(' ')}`), url].join('\n')
}

export function createNoticeService({ db, clock, events, env }: NoticeDeps) {
  function dayWords(
    firm: Firm,
    difference: DayDifference,
    onTheirWay: ReadonlySet<string>,
  ): DayWords {
    const { personId, day, row, before, after } = difference
    return {
      day,
      isNew: row === null,
      changes: dayChanges(db, personId, day, before, after),
      goesAt: holdEndsAt(firm, difference)?.toISOString() ?? null,
      isOnItsWay: onTheirWay.has(`${personId} ${day}`),
    }
  }

  /** What changed and has not been told, a person each; there and back is nothing. */
  function read(): NotYetTold {
    const firm = readFirm(db)
    const byPerson = groupBy(readNotYetTold(db, firm, clock.now()), (one) => one.personId)
    const onTheirWay = readOnTheirWay(db)
    const shown = readActive(db, [...byPerson.keys()]).flatMap((person): NotToldPerson[] => {
      const days = (byPerson.get(person.id) ?? [])
        .map((one) => dayWords(firm, one, onTheirWay))
        .filter(({ changes }) => changes.length > 0)
      const [first] = days
      if (!first) return []
      const words = textWords(days, dayUrl(env.appUrl, person.role, first.day))
      const { id, name, role, phone } = person
      const textIt = phone === '' ? null : { phone, words }
      return [{ id, name, role, days, textIt, hasNoEmail: person.email === '' }]
    })
    return { people: shown, holdMinutes: firm.changeHoldMinutes }
  }

  /**
   * One mail a person, with what of these days still differs when it is written. Pressed twice, it goes once.
   *
   * @throws AppError 409 when nothing of it is left to tell.
   */
  function tell(user: CurrentUser, input: TellThem): number {
    const now = clock.now()
    const mails = db.transaction((tx) => {
      const byPerson = groupBy(readNotYetTold(tx, readFirm(tx), now), (one) => one.personId)
      const asked = input.people.map(({ id, days }) =>
        (byPerson.get(id) ?? []).filter((one) => days.includes(one.day)),
      )
      if (asked.every((days) => days.length === 0))
        throw new AppError('conflict', 'Nothing of this is left to tell. The list is as it is now.')
      const made = asked.filter((days) => enqueueNotice(tx, days, now, { evenFailed: true })).length
      writeAudit(tx, {
        at: now,
        personId: user.id,
        action: 'people told',
        entity: 'notice',
        entityId: user.id,
        detail: { people: input.people },
      })
      return made
    })
    events.publish({ topic: 'messages' })
    return mails
  }

  return { read, tell }
}
