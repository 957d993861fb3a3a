import { z } from 'zod'

/** Building blocks of request schemas, each with words a person can act on. */
export const idSchema = z.uuid('That link is not complete.')

/** Days reckoned from a day stay days of four-figure years. */
const years = { first: '2000', last: '2199' }

export const daySchema = z
  .string()
  .regex(/^\d{4}-\d{2}-\d{2}$/, 'Give the day as year-month-day.')
  .refine((day) => {
    const at = new Date(`${day}T00:00:00Z`)
    const isDay = !Number.isNaN(at.getTime()) && at.toISOString().startsWith(day)
    return isDay && day.slice(0, 4) >= years.first && day.slice(0, 4) <= years.last
  }, `There is no such day in the years ${years.first} to ${years.last}.`)

export const timeOfDaySchema = z
  .string()
  .regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'Give the time as hours and minutes, like 07:00.')

export const emailSchema = z
  .string()
  .trim()
  .toLowerCase()
  .max(254, 'That e-mail address is too long.')
  .pipe(z.email('Give a whole e-mail address, like name@firm.example.'))

export const phoneSchema = z
  .string()
  .trim()
  .max(30, 'That phone number is too long.')
  .regex(/^[0-9+() -]*$/, 'A phone number has digits, spaces, brackets and a plus only.')

export function textSchema(maxLength: number, options: { required?: string } = {}) {
  const text = z.string().trim().max(maxLength, `Keep this to ${maxLength} characters.`)
  return options.required ? text.min(1, options.required) : text
}

/** Text that stands on one line of a screen, a sheet or a mail's subject. */
export function lineSchema(maxLength: number, options: { required?: string } = {}) {
  return textSchema(maxLength, options).regex(/^\P{Cc}*$/u, 'Keep this to one line.')
}

export const versionSchema = z.number().int().min(1)
