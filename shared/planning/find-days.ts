import { type Day, dayPlus } from '../calendar/days.ts'
import { isWorked, type WorkingCalendar } from '../calendar/working-days.ts'
import { type CrewDays, crewDaysOf, makeRoom, type RoomMade } from './make-room.ts'

export type OpeningCrew = { id: string; letter: string }

/** A booking that stands; `isPencilled` and not begun, it may give way. */
export type StandingBooking = {
  id: string
  crewId: string
  isPencilled: boolean
  /** Of the job that days are sought for: it stays. */
  isOwnJob: boolean
  wantedBy: Day | null
  days: readonly { day: Day; worked: boolean }[]
}

export type FindDaysFacts = {
  calendar: WorkingCalendar
  /** The first day that may be taken, and how many days from it on are looked at. */
  earliest: Day
  horizonDays: number
  crews: readonly OpeningCrew[]
  bookings: readonly StandingBooking[]
  /** Whether the crew cannot work there that day, for who is there or not. */
  isBlocked(crewId: string, day: Day): boolean
  /** Whether these days, ascending, are enough of this crew; more days are never less. */
  isEnough(crewId: string, days: readonly Day[]): boolean
}

/** Days of one crew that hold all of the work, in one run of its working days. */
export type Opening = {
  crewId: string
  days: Day[]
  /** Pencilled bookings that give way, with all their days before and after. */
  moves: RoomMade[]
  /** Working days within the run that the crew cannot work. */
  passedOver: Day[]
}

export const mostOpenings = 3

const lastOf = (days: readonly Day[]): Day => days[days.length - 1] ?? ''
export const finishOf = (opening: Opening): Day => lastOf(opening.days)
const movedDays = (opening: Opening): number =>
  opening.moves.reduce((sum, move) => sum + move.moved.length, 0)

type Run = { days: Day[]; passedOver: Day[] }

/** The crew's own working days from `start` on until the work is done; null when something stands in them. */
function runFrom(facts: FindDaysFacts, crew: CrewDays, start: Day, mayMove: boolean): Run | null {
  const run: Run = { days: [], passedOver: [] }
  const last = dayPlus(facts.earliest, facts.horizonDays - 1)
  for (let day = start; day <= last; day = dayPlus(day, 1)) {
    if (!isWorked(facts.calendar, day)) continue
    const state = crew.stateOf(day)
    if (state === 'fixed' || (state === 'movable' && !mayMove)) return null
    if (state === 'blocked') {
      run.passedOver.push(day)
      continue
    }
    run.days.push(day)
    if (facts.isEnough(crew.crewId, run.days)) return run
  }
  return null
}

/** Days on which a run may begin: those that begin a stretch of free days, and those that make a booking give way. */
function startsOf(facts: FindDaysFacts, crew: CrewDays): { free: Day[]; moving: Day[] } {
  const starts: { free: Day[]; moving: Day[] } = { free: [], moving: [] }
  let wasFree = false
  for (let ahead = 0; ahead < facts.horizonDays; ahead++) {
    const day = dayPlus(facts.earliest, ahead)
    if (!isWorked(facts.calendar, day)) continue
    const state = crew.stateOf(day)
    if (state === 'blocked') continue
    // More days are never less, so of a free stretch its first day finishes soonest.
    if (state === 'free' && !wasFree) starts.free.push(day)
    if (state === 'free' || (state === 'movable' && crew.isFirstOfMovable(day)))
      starts.moving.push(day)
    wasFree = state === 'free'
  }
  return starts
}

function freeOpenings(facts: FindDaysFacts, crew: CrewDays): Opening[] {
  return startsOf(facts, crew).free.flatMap((start): Opening[] => {
    const run = runFrom(facts, crew, start, false)
    return run ? [{ crewId: crew.crewId, ...run, moves: [] }] : []
  })
}

/** Those that finish before a day (null: whenever), others giving way. */
function movingOpenings(facts: FindDaysFacts, crew: CrewDays, before: Day | null): Opening[] {
  const isInTime = (day: Day): boolean => before === null || day < before
  return startsOf(facts, crew)
    .moving.filter(isInTime)
    .flatMap((start): Opening[] => {
      const run = runFrom(facts, crew, start, true)
      const moves = run && isInTime(lastOf(run.days)) ? makeRoom(facts, crew, run.days) : null
      return run && moves && moves.length > 0 ? [{ crewId: crew.crewId, ...run, moves }] : []
    })
}

/** Earliest finish first, then the least moving of others, then the fewest days. */
function byRank(letterOf: (crewId: string) => string): (a: Opening, b: Opening) => number {
  const compare = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0)
  return (a, b) =>
    compare(finishOf(a), finishOf(b)) ||
    movedDays(a) - movedDays(b) ||
    a.days.length - b.days.length ||
    compare(letterOf(a.crewId), letterOf(b.crewId)) ||
    compare(a.days[0] ?? '', b.days[0] ?? '')
}

/**
 * The three best openings for a job, the earliest finish first. One that moves others is only worth a look
 * where it finishes before every one that moves nobody, and is shown once a crew; the best that moves nobody
 * is always among them.
 */
export function findOpenings(facts: FindDaysFacts): Opening[] {
  const letters = new Map(facts.crews.map((crew) => [crew.id, crew.letter]))
  const rank = byRank((crewId) => letters.get(crewId) ?? '')
  const crews = facts.crews.map((crew) => crewDaysOf(facts, crew.id))
  const free = crews.flatMap((crew) => freeOpenings(facts, crew)).sort(rank)
  const bestFree = free[0]
  const before = bestFree ? finishOf(bestFree) : null
  const moving = crews
    .flatMap((crew) => movingOpenings(facts, crew, before).sort(rank).slice(0, 1))
    .sort(rank)
    .slice(0, bestFree ? mostOpenings - 1 : mostOpenings)
  return [...moving, ...free].slice(0, mostOpenings)
}
