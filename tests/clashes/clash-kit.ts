import type {
  ClashBooking,
  ClashDay,
  ClashFacts,
  ClashPerson,
  ClashTicket,
} from '../../shared/clashes/clash-facts.ts'
import type { BookingClash } from '../../shared/clashes/clash-schemas.ts'

/** The tests of clashes stand on Wed 2 Dec 2026. */
export const wed = '2026-12-02'
export const thu = '2026-12-03'
export const fri = '2026-12-04'
export const sat = '2026-12-05'
export const mon = '2026-12-07'

export const tamsin: ClashPerson = { id: 'tamsin', name: 'Tamsin Rook', role: 'leading-hand' }
export const wim: ClashPerson = { id: 'wim', name: 'Wim Casey', role: 'apprentice' }
export const ivo: ClashPerson = { id: 'ivo', name: 'Ivo Marsh', role: 'apprentice' }

export const plumb = { id: 'plumb', name: 'Plumb crew' }
export const bevel = { id: 'bevel', name: 'Bevel crew' }

type CrewDay = ReturnType<ClashFacts['crews']['on']>
export type Leave = CrewDay['away'][number] & { day: string }

const heights: ClashTicket = { kind: 'working-at-heights', expiresOn: null }

/** A firm of two crews in which nothing is amiss; tests change what they are about. */
export function firmWith(changes: {
  bookings: ClashBooking[]
  there?: Record<string, ClashPerson[]>
  away?: Leave[]
  tickets?: Record<string, ClashTicket[]>
  closedDays?: ClashFacts['calendar']['closedDays']
  today?: string
  reader?: ClashFacts['reader']
}): ClashFacts {
  const there = changes.there ?? { plumb: [tamsin, wim], bevel: [tamsin] }
  const away = changes.away ?? []
  return {
    today: changes.today ?? wed,
    calendar: { workingWeekdays: [1, 2, 3, 4, 5], closedDays: changes.closedDays ?? [] },
    reader: changes.reader ?? 'office',
    bookings: changes.bookings,
    crews: {
      on(crewId, day) {
        const all = there[crewId] ?? []
        const gone = away.filter((one) => one.day === day && all.some((p) => p.id === one.id))
        const present = all.filter((p) => !gone.some((one) => one.id === p.id))
        return { there: present, away: gone, minutes: present.length * 480 }
      },
      ticketsOf: (personId) => changes.tickets?.[personId] ?? [heights],
    },
  }
}

export const roofA = { letter: 'A', sequence: 1 }
export const roofB = { letter: 'B', sequence: 2 }

export function day(on: string, changes: Partial<ClashDay> = {}): ClashDay {
  return { day: on, worked: false, revision: roofA, toldLetters: [], ...changes }
}

type BookingChanges = Partial<Omit<ClashBooking, 'job' | 'days'>> & {
  job?: Partial<ClashBooking['job']>
  days?: (string | ClashDay)[]
}

export function bookingOf(changes: BookingChanges = {}): ClashBooking {
  const { job, days = [thu, fri], ...rest } = changes
  return {
    id: 'hill',
    crew: plumb,
    state: 'firm',
    clashReason: null,
    shortMinutes: 0,
    ...rest,
    job: {
      id: 'hill-job',
      number: 'QR-1',
      title: 'Hill house',
      isComplete: false,
      newestRevision: roofA,
      milestones: [],
      ...job,
    },
    days: days.map((one) => (typeof one === 'string' ? day(one) : one)),
  }
}

export const creekShed = (changes: BookingChanges = {}): ClashBooking =>
  bookingOf({ id: 'creek', ...changes, job: { number: 'QR-2', title: 'Creek shed' } })

/** 'Thu: clash crew-twice', without the words. */
export const marksOf = (found: readonly BookingClash[]): string[] =>
  found.map(({ bookingId, day: on, weight, code }) => `${bookingId} ${on} ${weight} ${code}`)
