import { type Day, dayPlus } from '../calendar/days.ts'
import { isWorked, type WorkingCalendar } from '../calendar/working-days.ts'

/** How far a day may be pushed before it is said that there is no room. */
export const furthestPushDays = 400

/** Days a crew can be put on: worked by the firm, and not one of those kept. */
export type Slots = {
  /** The first slot on `day` or after it; null when there is none within `furthestPushDays`. */
  from(day: Day): Day | null
}

/** Slots of a working calendar less the days `isKept`, none of them before `earliest`. */
export function slotsOf(
  calendar: WorkingCalendar,
  input: { earliest: Day; isKept: (day: Day) => boolean },
): Slots {
  return {
    from(day) {
      const first = day < input.earliest ? input.earliest : day
      for (let ahead = 0; ahead <= furthestPushDays; ahead++) {
        const candidate = dayPlus(first, ahead)
        if (isWorked(calendar, candidate) && !input.isKept(candidate)) return candidate
      }
      return null
    },
  }
}

/** The `count`th slot after `day`; null when there is none. */
export function slotAfter(slots: Slots, day: Day, count: number): Day | null {
  let at: Day | null = day
  for (let i = 0; i < count && at !== null; i++) at = slots.from(dayPlus(at, 1))
  return at
}

/**
 * Gives each day its place, in the order of the days, so that none overtakes and no two meet: the place
 * `wanted` gives it, or the next slot after the place of the day before where that is later.
 *
 * @param days ascending, each once.
 * @param wanted the place a day would have alone; null when there is none.
 * @returns null when there is no room.
 */
export function spreadDays(
  days: readonly Day[],
  slots: Slots,
  wanted: (day: Day) => Day | null,
): Map<Day, Day> | null {
  const places: Day[] = []
  for (const day of days) {
    const alone = wanted(day)
    const last = places[places.length - 1]
    const isFree = alone === null || last === undefined || alone > last
    const place = isFree ? alone : slotAfter(slots, last, 1)
    if (place === null) return null
    places.push(place)
  }
  return new Map(days.map((day, i) => [day, places[i] ?? day]))
}
