import type { Clash } from '../../shared/clashes/clash-schemas.ts'
import type { Day } from '../../shared/calendar/days.ts'
import { readCrewHours } from '../bookings/crew-hours.ts'
import type { DbOrTx } from '../db/client.ts'
import type { Firm } from '../firm/firm-store.ts'
import type { PlannedRainOff } from './plan-rain-off.ts'

/** Clashes on the new days, by booking. */
export function newClashes(
  db: DbOrTx,
  input: { plan: PlannedRainOff; crewId: string; firm: Firm; today: Day },
): Map<string, Clash[]> {
  const { plan, crewId, firm } = input
  const days = plan.moves.flatMap((move) => move.daysAfter).sort()
  const [from, to] = [days[0], days[days.length - 1]]
  if (from === undefined || to === undefined) return new Map()
  const hours = readCrewHours(db, { from, to }, firm)
  return new Map(
    plan.moves.map((move) => [
      move.bookingId,
      [...move.moved, ...move.added].flatMap(({ to: day }): Clash[] => {
        const { thereIds, away } = hours.on(crewId, day)
        if (thereIds.length === 0)
          return [
            {
              code: 'nobody-there',
              weight: 'clash',
              day,
              text: 'Nobody of the crew is there that day.',
              wayOut: 'Put people in the crew for that day or give the day to another crew.',
            },
          ]
        if (away.length === 0) return []
        return [
          {
            code: 'on-leave',
            weight: 'caution',
            day,
            text: `On leave: ${away.join(', ')}.`,
            wayOut: 'The hours are counted without them. Add a person or a day.',
          },
        ]
      }),
    ]),
  )
}
