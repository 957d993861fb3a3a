import type { Logger } from 'pino'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { Db } from '../db/client.ts'
import type { EventHub } from '../events/event-hub.ts'
import { readFirm } from '../firm/firm-store.ts'
import type { Clock } from '../lib/clock.ts'
import { replanUpcoming } from './replan.ts'

type Deps = { db: Db; clock: Clock; events: EventHub; log: Logger }

export type DayTurn = {
  /** Plans again when the firm's day has turned since the last run; the first run always does. */
  runOnce(): boolean
  start(): void
  stop(): void
}

const lookEveryMs = 60_000

/** What a day past left undone moves on to the days ahead, without anybody touching the calendar. */
export function createDayTurn({ db, clock, events, log }: Deps): DayTurn {
  let plannedFor: string | null = null
  let timer: NodeJS.Timeout | null = null

  function runOnce(): boolean {
    const now = clock.now()
    const today = localDayOf(now, readFirm(db).timeZone)
    if (plannedFor === today) return false
    db.transaction((tx) => replanUpcoming(tx, now))
    plannedFor = today
    events.publish({ topic: 'day-sheet' })
    return true
  }

  function look(): void {
    try {
      runOnce()
    } catch (error) {
      log.error(
        { err: error },
        'the days ahead could not be planned again; the next look tries once more',
      )
    }
  }

  return {
    runOnce,
    start() {
      look()
      timer = setInterval(look, lookEveryMs)
    },
    stop() {
      if (timer) clearInterval(timer)
    },
  }
}
