import type { Day } from '../../../shared/calendar/days.ts'
import type { Firm } from '../../firm/firm-store.ts'
import { newId } from '../../lib/ids.ts'
import { readNotYetTold } from '../../mail/told-differences.ts'
import { toldHash } from '../../mail/told-day.ts'
import type { Db } from '../client.ts'
import { toldDays } from '../tables/mail-tables.ts'

/** The office has told everybody the days up to `until`; those after it wait under *Not yet told*. */
export function tellDemoDays(db: Db, from: { firm: Firm; until: Day; now: Date }): void {
  for (const { personId, day, after } of readNotYetTold(db, from.firm, from.now)) {
    if (day > from.until) continue
    db.insert(toldDays)
      .values({
        id: newId(),
        personId,
        day,
        contentHash: toldHash(after),
        content: after,
        toldAt: from.now,
        notices: 1,
        reminded: false,
      })
      .run()
  }
}
