import { z } from 'zod'

/** ISO 3166: 'AU', and its state 'QLD'. */
export const countryCodeSchema = z.string().regex(/^[A-Z]{2}$/, 'Choose a country from the list.')
export const stateCodeSchema = z
  .string()
  .regex(/^[A-Z0-9]{1,4}$/, 'Choose a state from the list, or none.')

export const holidaysQuerySchema = z.strictObject({
  country: countryCodeSchema.optional(),
  state: stateCodeSchema.optional(),
  year: z.coerce.number().int().min(2000).max(2199).optional(),
})

const placeSchema = z.object({ code: z.string(), name: z.string() })

export const publicHolidaySchema = z.object({
  day: z.string(),
  name: z.string(),
  /** The holiday itself, also on the weekday it is moved to: what *worked all the same* is said of. */
  holiday: z.string(),
})
export type PublicHoliday = z.infer<typeof publicHolidaySchema>

export const publicHolidaysSchema = z.object({
  year: z.number(),
  countries: z.array(placeSchema),
  states: z.array(placeSchema),
  holidays: z.array(publicHolidaySchema),
})
export type PublicHolidays = z.infer<typeof publicHolidaysSchema>
