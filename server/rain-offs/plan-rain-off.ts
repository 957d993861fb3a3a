import type { Day } from '../../shared/calendar/days.ts'
import { type RainOff, rainOff } from '../../shared/planning/rain-off.ts'
import type { MakeRainOff } from '../../shared/rain-offs/rain-off-schemas.ts'
import type { DbOrTx } from '../db/client.ts'
import type { Firm } from '../firm/firm-store.ts'
import { AppError } from '../http/app-error.ts'
import { type CrewToMove, readCrewToMove } from './crew-to-move.ts'

export type RainOffAsked = Pick<MakeRainOff, 'crewId' | 'fromDay' | 'workingDays' | 'useFreeDays'>
export type PlannedRainOff = RainOff & Pick<CrewToMove, 'rowOf'>

/** What a rain-off would move as the calendar stands. @throws AppError 409 when there is no room. */
export function planRainOff(
  db: DbOrTx,
  asked: RainOffAsked,
  { firm, today }: { firm: Firm; today: Day },
): PlannedRainOff {
  const { bookings, rowOf } = readCrewToMove(db, asked.crewId, asked.fromDay)
  const plan = rainOff({ calendar: firm, today, bookings, ...asked })
  if (!plan)
    throw new AppError(
      'conflict',
      'The firm has no working days to move to. Set its working weekdays under Firm.',
    )
  return { ...plan, rowOf }
}
