import type { BookingState } from '../bookings/booking-schemas.ts'
import type { Day } from '../calendar/days.ts'
import type { WorkingCalendar } from '../calendar/working-days.ts'
import type { Role } from '../auth/roles.ts'
import type { MilestoneKind, MilestoneState } from '../milestones/milestone-kinds.ts'
import type { LeaveKind } from '../people/leave-kinds.ts'
import type { TicketKind } from '../people/ticket-kinds.ts'

export type ClashPerson = { id: string; name: string; role: Role }
export type ClashTicket = { kind: TicketKind; expiresOn: Day | null }

/** Who of each crew is there and away on a day, and what tickets they hold. */
export type ClashCrews = {
  on(
    crewId: string,
    day: Day,
  ): {
    there: readonly ClashPerson[]
    away: readonly { id: string; name: string; kind: LeaveKind }[]
    minutes: number
  }
  ticketsOf(personId: string): readonly ClashTicket[]
}

/** A milestone something has been said of. */
export type ClashMilestone = {
  kind: MilestoneKind
  day: Day | null
  state: MilestoneState
  broughtBy: string
}

export type ClashRevision = { letter: string; sequence: number }

export type ClashJob = {
  id: string
  number: string
  title: string
  isComplete: boolean
  newestRevision: ClashRevision | null
  milestones: readonly ClashMilestone[]
}

export type ClashDay = {
  day: Day
  worked: boolean
  /** What the day is cut to. */
  revision: ClashRevision | null
  /** The roof (null: none yet) each person there was told of for this day; empty when nobody was told. */
  toldLetters: readonly (string | null)[]
}

/** A booking that stands, with all its days in order. */
export type ClashBooking = {
  id: string
  crew: { id: string; name: string }
  job: ClashJob
  state: BookingState
  clashReason: string | null
  /** Minutes of the job's work that no booked day has room for. */
  shortMinutes: number
  days: readonly ClashDay[]
}

/** Plain data of a firm, enough to say what stands in the way of its bookings. */
export type ClashFacts = {
  /** Days before it are over and have no clash. */
  today: Day
  calendar: WorkingCalendar
  crews: ClashCrews
  bookings: readonly ClashBooking[]
  /** Whom it is worded for: a crew is not told the office's own notes, nor why somebody is away. */
  reader: 'office' | 'crew'
}
