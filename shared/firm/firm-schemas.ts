import { z } from 'zod'
import { closureDays, longestClosureDays } from '../calendar/closures.ts'
import { daysBetween } from '../calendar/days.ts'
import { isTimeZone } from '../calendar/local-time.ts'
import {
  daySchema,
  phoneSchema,
  lineSchema,
  timeOfDaySchema,
  versionSchema,
} from '../http/fields.ts'
import { countryCodeSchema, stateCodeSchema } from './holiday-schemas.ts'

const minutes = z
  .number()
  .min(0, 'Not below nothing.')
  .max(600, 'Over ten hours is no single piece.')
const piece = z.strictObject({ cutMinutes: minutes, standMinutes: minutes })

export const labourRatesSchema = z.strictObject({
  pieces: z.strictObject({
    ridge: piece,
    common: piece,
    'crown-end': piece,
    hip: piece,
    'broken-hip': piece,
    valley: piece,
    creeper: piece,
    'valley-creeper': piece,
    'cripple-creeper': piece,
    underpurlin: piece,
    'collar-tie': piece,
    fascia: piece,
    barge: piece,
  }),
  setOutMinutes: minutes,
  setOutMinutesPerPlateM: minutes,
  firstPairMinutes: minutes,
  braceRidgeMinutes: minutes,
  tailLineMinutesPerEaveM: minutes,
  packageMinutes: z.strictObject({
    'set-out-plates': minutes,
    'first-pair': minutes,
    'cut-commons': minutes,
    ridge: minutes,
    'crown-ends': minutes,
    hips: minutes,
    'remaining-commons': minutes,
    creepers: minutes,
    purlins: minutes,
    tails: minutes,
  }),
  startUpMinutes: minutes.max(240, 'Over four hours is no start to a day.'),
})

const within = (low: number, high: number, what: string) =>
  z
    .number({ error: `Give ${what} as a number.` })
    .min(low, `Give ${what}, ${low} or more.`)
    .max(high, `Give ${what}, ${high} or less.`)

export const firmRoofSettingsSchema = z.strictObject({
  sawMaxTiltDeg: within(0, 60, 'the saw’s tilt in degrees'),
  minCreeperMm: within(0, 2000, 'the shortest creeper in mm'),
  longestStockMm: within(1000, 15_000, 'the longest stock in mm'),
  densityKgM3: within(200, 1500, 'the density in kg per m³'),
  roundMm: within(0.1, 10, 'the rounding in mm'),
  roundDeg: within(0.1, 5, 'the rounding in degrees'),
  maxRafterSpanMm: within(500, 10_000, 'the longest rafter span in mm'),
  collarTieSpacingMm: within(300, 3000, 'the widest spacing of collar ties in mm').default(1200),
})

const dayHours = within(0, 14, 'the hours of each weekday')

const closureSchema = z
  .strictObject({
    day: daySchema,
    lastDay: daySchema.nullish(),
    name: lineSchema(60, { required: 'Say why it is closed.' }),
  })
  .refine(({ day, lastDay }) => !lastDay || lastDay >= day, {
    path: ['lastDay'],
    message: 'The last day is before the first.',
  })
  .refine(({ day, lastDay }) => !lastDay || daysBetween(day, lastDay) < longestClosureDays, {
    path: ['lastDay'],
    message: `A closure is ${longestClosureDays} days long at most.`,
  })

const firmFields = {
  name: lineSchema(80, { required: 'Give the firm’s name.' }),
  phone: phoneSchema,
  timeZone: z
    .string()
    .refine(isTimeZone, 'Choose a time zone from the list, like Australia/Brisbane.'),
  reminderAt: timeOfDaySchema,
  changeHoldMinutes: within(0, 240, 'the hold in minutes'),
  startAt: timeOfDaySchema,
  hoursPerDay: within(1, 14, 'hours a day'),
  workingWeekdays: z.array(z.number().int().min(1).max(7)).min(1, 'Tick at least one day.').max(7),
  weekHours: z.array(dayHours).length(7).nullable(),
  ownClosedDays: z.array(closureSchema).max(200),
  holidayCountry: countryCodeSchema.nullable(),
  holidayState: stateCodeSchema.nullable(),
  holidaysWorked: z.array(lineSchema(120)).max(60),
  brickOffsetMm: within(0, 500, 'the brickwork’s offset in mm'),
  lengthUnits: z.enum(['mm', 'feet-inches']),
  roofSettings: firmRoofSettingsSchema,
  labourRates: labourRatesSchema,
}

/** More than years of long shutdowns; every working day that is counted is held against them all. */
const mostClosedDays = 1000

const ownClosedDaysSchema = firmFields.ownClosedDays.refine(
  (closures) => closureDays(closures).length <= mostClosedDays,
  `All closures together are ${mostClosedDays} days at most. Take off those that are past.`,
)

export const editFirmSchema = z.strictObject({
  ...firmFields,
  ownClosedDays: ownClosedDaysSchema,
  version: versionSchema,
})
export const firmSchema = z.object({
  ...firmFields,
  roofSettings: z.object(firmRoofSettingsSchema.shape),
  version: z.number(),
})
export type FirmSettings = z.infer<typeof firmSchema>
