import type { Day } from '../calendar/days.ts'
import { whyNotWorked } from '../calendar/working-days.ts'
import { groupBy } from '../collections/group-by.ts'
import { formatHours } from '../labour/format-hours.ts'
import type { ClashBooking, ClashDay, ClashFacts } from './clash-facts.ts'
import { type BookingClash, clashCodes, type Clash } from './clash-schemas.ts'
import {
  milestoneTooLate,
  milestoneWithoutDay,
  type NeededFirst,
  neededFirst,
} from './clash-words.ts'
import { type DayClash, peopleClashes } from './people-clashes.ts'

/** Facts with what all bookings of a crew and day share looked up once, however many are asked about. */
export type ClashIndex = {
  facts: ClashFacts
  onCrewDay: Map<string, ClashBooking[]>
  /** What is amiss with a crew's people and with the day itself. */
  ofCrewDay: (crew: ClashBooking['crew'], day: Day) => readonly DayClash[]
}

const crewDayKey = (crewId: string, day: Day): string => `${crewId} ${day}`

export function clashIndex(facts: ClashFacts): ClashIndex {
  const placed = facts.bookings.flatMap((booking) =>
    booking.days.map(({ day }) => ({ booking, key: crewDayKey(booking.crew.id, day) })),
  )
  const onCrewDay = new Map(
    [...groupBy(placed, (one) => one.key)].map(([key, ones]) => [
      key,
      ones.map((one) => one.booking),
    ]),
  )
  const known = new Map<string, readonly DayClash[]>()
  const ofCrewDay: ClashIndex['ofCrewDay'] = (crew, day) => {
    const key = crewDayKey(crew.id, day)
    const found = known.get(key) ?? [
      ...peopleClashes(facts, crew, day),
      ...dayNotWorked(facts, day),
    ]
    known.set(key, found)
    return found
  }
  return { facts, onCrewDay, ofCrewDay }
}

function crewTwice({ facts, onCrewDay }: ClashIndex, booking: ClashBooking, day: Day): DayClash[] {
  const others = (onCrewDay.get(crewDayKey(booking.crew.id, day)) ?? []).filter(
    (other) => other.id !== booking.id,
  )
  if (others.length === 0) return []
  const names = others.map(({ job }) => `${job.number} ${job.title}`).join(' and ')
  const reason = booking.clashReason ?? others.find((o) => o.clashReason !== null)?.clashReason
  if (reason)
    return [
      {
        code: 'crew-twice-on-purpose',
        weight: 'caution',
        // Why both are booked is the office's own note.
        text: `${booking.crew.name} is also on ${names}, on purpose${facts.reader === 'office' ? `: ${reason}` : '.'}`,
        wayOut: 'Move one of them when that no longer holds.',
      },
    ]
  return [
    {
      code: 'crew-twice',
      weight: 'clash',
      text: `${booking.crew.name} is also on ${names}.`,
      wayOut: 'Move one of them or give it to another crew.',
    },
  ]
}

function dayNotWorked({ calendar }: ClashFacts, day: Day): DayClash[] {
  const closed = whyNotWorked(calendar, day)
  if (closed === null) return []
  return [
    {
      code: 'day-not-worked',
      weight: 'caution',
      text: `${closed}.`,
      wayOut: 'Move the day to a working day unless the crew has agreed to it.',
    },
  ]
}

/** The roof a day not worked is to be cut to. */
function roofClashes({ job, state }: ClashBooking, booked: ClashDay): DayClash[] {
  if (booked.worked || job.isComplete) return []
  const { revision, toldLetters } = booked
  const newest = job.newestRevision
  if (revision === null)
    return [
      {
        code: 'no-roof',
        weight: state === 'firm' ? 'clash' : 'caution',
        text: 'No roof issued yet.',
        wayOut: 'Issue the roof, and the days fill themselves.',
      },
    ]
  if (state !== 'firm') return []
  if (newest !== null && revision.sequence < newest.sequence)
    return [
      {
        code: 'roof-revised',
        weight: 'clash',
        text: `Planned to roof ${revision.letter}; the newest is ${newest.letter}.`,
        wayOut: `Change the booking, and its days not worked take roof ${newest.letter}.`,
      },
    ]
  const before = toldLetters.find((letter) => letter !== revision.letter)
  if (before === undefined) return []
  return [
    {
      code: 'roof-revised',
      weight: 'caution',
      text:
        before === null
          ? `Roof ${revision.letter} was issued after the crew was told.`
          : `The crew was told roof ${before}; it is ${revision.letter} now.`,
      wayOut: 'See that they are told before the first cut.',
    },
  ]
}

/** A first day, not yet worked, before what it waits for. */
function beforeMilestones({ job }: ClashBooking, first: ClashDay): DayClash[] {
  if (first.worked || job.isComplete) return []
  return (Object.keys(neededFirst) as NeededFirst[]).flatMap((kind): DayClash[] => {
    const milestone = job.milestones.find((one) => one.kind === kind)
    if (!milestone || milestone.state === 'done') return []
    const { code } = neededFirst[kind]
    if (milestone.day === null)
      return [{ code, weight: 'caution', ...milestoneWithoutDay(kind, milestone) }]
    if (milestone.day <= first.day) return []
    return [{ code, weight: 'clash', ...milestoneTooLate(kind, milestone, milestone.day) }]
  })
}

function tooShort({ job, shortMinutes }: ClashBooking): DayClash[] {
  if (shortMinutes <= 0 || job.isComplete) return []
  return [
    {
      code: 'too-short',
      weight: 'caution',
      text: `Too short by ${formatHours(shortMinutes)}.`,
      wayOut: 'Add a day, or put more people in the crew.',
    },
  ]
}

/** The worse first, and among those as `clashCodes` has them. */
function byWeight(a: Pick<Clash, 'code' | 'weight'>, b: Pick<Clash, 'code' | 'weight'>): number {
  if (a.weight !== b.weight) return a.weight === 'clash' ? -1 : 1
  return clashCodes.indexOf(a.code) - clashCodes.indexOf(b.code)
}

/**
 * What stands in the way of one booking, day by day from today on; the booking need not be one of the
 * facts, so that it can be asked of where it is not yet. A crew's reader is sent to the office for a way
 * out.
 */
export function clashesOfBooking(index: ClashIndex, booking: ClashBooking): BookingClash[] {
  const { facts } = index
  const [first] = booking.days
  const last = booking.days[booking.days.length - 1]
  return booking.days.flatMap((booked) => {
    if (booked.day < facts.today) return []
    const found = [
      ...crewTwice(index, booking, booked.day),
      ...index.ofCrewDay(booking.crew, booked.day),
      ...roofClashes(booking, booked),
      ...(booked === first ? beforeMilestones(booking, booked) : []),
      ...(booked === last ? tooShort(booking) : []),
    ]
    return found.sort(byWeight).map((clash) => ({
      ...clash,
      ...(facts.reader === 'crew' ? { wayOut: 'Ask the office.' } : {}),
      bookingId: booking.id,
      day: booked.day,
    }))
  })
}

/**
 * Everything that stands in the way of the bookings of a firm from today on, for any number of them, in
 * the order of the bookings and their days.
 */
export function findClashes(facts: ClashFacts): BookingClash[] {
  const index = clashIndex(facts)
  return facts.bookings.flatMap((booking) => clashesOfBooking(index, booking))
}
