import type { DemoCrewLetter } from './demo-people.ts'
import type { DemoRoofKey } from './demo-roofs.ts'

/** Days are counted in working days from today: 0 today, −1 the one before. */
export type DemoBooking = {
  crew: DemoCrewLetter
  fromWorkingDay: number
  days: number
  state: 'pencilled' | 'firm'
  gear: string
  /** Share of the tasks of days up to today that is ticked: 'all', 'half' of the last one, or 'none'. */
  done: 'all' | 'half' | 'none'
}

export type DemoJob = {
  number: string
  title: string
  siteAddress: string
  accessNotes: string
  siteContactName: string
  siteContactPhone: string
  customerName: string
  customerPhone: string
  customerEmail: string
  covering: 'tiles' | 'sheet' | 'shingles' | 'other'
  wantedInDays: number | null
  priceDollars: number | null
  /** Days before today. */
  priceSentAgo: number | null
  acceptedAgo: number | null
  completedAgo: number | null
  notes: string
  crewNotes: string
  roof: DemoRoofKey | null
  issued: boolean
  platesMeasured: boolean
  booking: DemoBooking | null
}

/** A job of which nothing more is known. */
export const blankJob = {
  accessNotes: '',
  wantedInDays: null,
  priceDollars: null,
  priceSentAgo: null,
  acceptedAgo: null,
  completedAgo: null,
  notes: '',
  crewNotes: '',
  roof: null,
  issued: false,
  platesMeasured: false,
  booking: null,
}
