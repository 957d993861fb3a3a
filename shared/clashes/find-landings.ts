import { movedDays } from '../bookings/move-days.ts'
import { type Day, dayPlus, daysBetween } from '../calendar/days.ts'
import { workedDaysFrom } from '../calendar/working-days.ts'
import type { ClashBooking, ClashDay, ClashFacts } from './clash-facts.ts'
import type { Clash, Landings } from './clash-schemas.ts'
import { clashesOfBooking, type ClashIndex, clashIndex } from './find-clashes.ts'

type Crew = { id: string; name: string }
type Landing = Landings['landings'][number]
type Place = { crew: Crew; day: Day }

export type LandingSpan = { from: Day; to: Day; crews: readonly Crew[] }

/** Nothing of the roof depends on where a booking lands. */
const sameAnywhere: readonly Clash['code'][] = ['no-roof', 'roof-revised']

function placesOf({ today }: ClashFacts, { from, to, crews }: LandingSpan): Place[] {
  const days = Array.from({ length: daysBetween(from, to) + 1 }, (_, i) => dayPlus(from, i))
  return days.filter((day) => day >= today).flatMap((day) => crews.map((crew) => ({ crew, day })))
}

function landingOf(
  index: ClashIndex,
  { crew, day }: Place,
  landed: ClashBooking,
  isAsked: (day: Day) => boolean,
): Landing {
  const clashes = clashesOfBooking(index, landed)
    .filter((clash) => isAsked(clash.day) && !sameAnywhere.includes(clash.code))
    .map(({ code, weight, day: on, text, wayOut }) => ({ code, weight, day: on, text, wayOut }))
  return { crewId: crew.id, day, clashes }
}

/** Minutes for which the days have no room; the day plan, which keeps pieces whole, may find a few more. */
function shortMinutes(
  { crews }: ClashFacts,
  crew: Crew,
  days: readonly Day[],
  workMinutes: number,
): number {
  const there = days.reduce((sum, day) => sum + crews.on(crew.id, day).minutes, 0)
  return Math.max(0, Math.round(workMinutes - there))
}

/**
 * What would stand in the way if a booking were taken hold of at `day` and dropped on each crew and day of
 * the span. Left out, since it cannot be: a day before today, and another crew once a day has been worked.
 */
export function bookingLandings(
  facts: ClashFacts,
  booking: ClashBooking,
  move: { day: Day; workMinutes: number },
  span: LandingSpan,
): Landing[] {
  const index = clashIndex(facts)
  const before = booking.days.map((one) => one.day)
  const worked = new Set(booking.days.filter((one) => one.worked).map((one) => one.day))
  if (!before.includes(move.day) || worked.has(move.day)) return []
  return placesOf(facts, span)
    .filter(({ crew }) => worked.size === 0 || crew.id === booking.crew.id)
    .map((place) => {
      const after = movedDays(facts.calendar, before, worked, { from: move.day, to: place.day })
      const known = new Map(booking.days.map((one) => [one.day, one]))
      const isOther = place.crew.id !== booking.crew.id
      const stays = (day: Day): boolean => day < move.day || worked.has(day)
      const days = after.map((day) => known.get(day) ?? freshDay(booking, day))
      const ahead = after.filter((day) => day >= facts.today && !worked.has(day))
      const short = shortMinutes(facts, place.crew, ahead, move.workMinutes)
      const landed = { ...booking, crew: place.crew, days, shortMinutes: short, clashReason: null }
      return landingOf(
        index,
        place,
        landed,
        (day) => isOther || !before.includes(day) || !stays(day),
      )
    })
}

function freshDay({ job }: Pick<ClashBooking, 'job'>, day: Day): ClashDay {
  return { day, worked: false, revision: job.newestRevision, toldLetters: [] }
}

const longestDays = 60

/** The day dropped on and the working days after it, as many as the work fills. */
function daysToFill(facts: ClashFacts, { crew, day }: Place, workMinutes: number): Day[] {
  const following = workedDaysFrom(facts.calendar, dayPlus(day, 1), longestDays - 1)
  const days: Day[] = []
  let there = 0
  for (const one of [day, ...following]) {
    days.push(one)
    there += facts.crews.on(crew.id, one).minutes
    if (there >= workMinutes) return days
  }
  // Nobody of the crew is there, or the work is more than one booking holds: the first day says enough.
  return [day]
}

/** The furthest day that a job dropped on the last day of a span may reach. */
export function lastLandingDay(calendar: ClashFacts['calendar'], to: Day): Day {
  const days = workedDaysFrom(calendar, to, longestDays)
  return days[days.length - 1] ?? to
}

/** The same for a job, or what is left of it, that has no days there yet. */
export function jobLandings(
  facts: ClashFacts,
  job: ClashBooking['job'],
  workMinutes: number,
  span: LandingSpan,
): Landing[] {
  const index = clashIndex(facts)
  return placesOf(facts, span).map((place) => {
    const days = daysToFill(facts, place, workMinutes).map((day) => freshDay({ job }, day))
    const landed: ClashBooking = {
      id: '',
      crew: place.crew,
      job,
      state: 'pencilled',
      clashReason: null,
      shortMinutes: 0,
      days,
    }
    return landingOf(index, place, landed, () => true)
  })
}
