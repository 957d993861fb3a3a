import { createRequire } from 'node:module'
import type Holidays from 'date-holidays'
import { type Day, dayPlus } from '../../shared/calendar/days.ts'
import type { PublicHoliday } from '../../shared/firm/holiday-schemas.ts'

/**
 * Public holidays as `date-holidays` has them. Its data is from Wikipedia articles under CC BY-SA 3.0 (its
 * licence file); the Firm screen and the README say so.
 */
type HolidaysClass = typeof Holidays
type Place = { code: string; name: string }

const language = 'en'
const dayHours = 24
const msPerHour = 3_600_000

// Loaded when the first firm has a country: it takes near half a second, and a firm without one never needs it.
const load = createRequire(import.meta.url)
const holidaysClass = (): HolidaysClass => load('date-holidays') as HolidaysClass

const inOrder = (places: Record<string, string> | undefined): Place[] =>
  Object.entries(places ?? {})
    .map(([code, name]) => ({ code, name }))
    .sort((a, b) => a.name.localeCompare(b.name))

export function holidayCountries(): Place[] {
  return inOrder(new (holidaysClass())().getCountries(language))
}

export function holidayStates(country: string): Place[] {
  return inOrder(new (holidaysClass())().getStates(country, language))
}

function lookUp(country: string, state: string | null, year: number): PublicHoliday[] {
  const Class = holidaysClass()
  const found = state === null ? new Class(country) : new Class(country, state)
  return found.getHolidays(year, language).flatMap(({ date, start, end, name, type }) => {
    const hours = (end.getTime() - start.getTime()) / msPerHour
    // Part of a day (Christmas Eve from 18:00) closes nobody's day; a day of a clock change has 23 or 25 hours.
    if (type !== 'public' || hours < dayHours - 1) return []
    const first: Day = date.slice(0, 10)
    const holiday = name.replace(/ \(substitute day\)$/, '')
    const days = Math.max(1, Math.round(hours / dayHours))
    return Array.from({ length: days }, (_, i) => ({ day: dayPlus(first, i), name, holiday }))
  })
}

// Pure and slow to compute, so kept: a country's holidays of a year do not change while the server runs.
const kept = new Map<string, PublicHoliday[]>()
const mostKept = 400

/** Public holidays of a year on which whole days are off, in order; those of the whole country without a state. */
export function publicHolidays(
  country: string,
  state: string | null,
  year: number,
): PublicHoliday[] {
  const key = `${country} ${state ?? ''} ${year}`
  const known = kept.get(key)
  if (known) return known
  const found = lookUp(country, state, year).sort((a, b) => a.day.localeCompare(b.day))
  if (kept.size >= mostKept) kept.clear()
  kept.set(key, found)
  return found
}
