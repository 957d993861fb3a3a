import { z } from 'zod'
import {
  daySchema,
  emailSchema,
  idSchema,
  phoneSchema,
  lineSchema,
  textSchema,
  versionSchema,
} from '../http/fields.ts'
import { jobStages } from './job-stage.ts'
import { priceCentsOf } from './price-text.ts'

export const coverings = ['tiles', 'sheet', 'shingles', 'other'] as const
export type Covering = (typeof coverings)[number]
export const coveringNames: Record<Covering, string> = {
  tiles: 'Tiles',
  sheet: 'Sheet metal',
  shingles: 'Shingles',
  other: 'Something else',
}

/** A day, or nothing typed. */
const maybeDaySchema = z
  .string()
  .trim()
  .transform((text) => (text === '' ? null : text))
  .pipe(daySchema.nullable())

const priceSchema = z.string().transform((text, context) => {
  const cents = priceCentsOf(text)
  if (cents !== undefined) return cents
  context.addIssue({
    code: 'custom',
    message: 'Give the price in dollars, like 18450 or 18450.50.',
  })
  return z.NEVER
})

const maybeEmailSchema = z.union([z.string().trim().pipe(z.literal('')), emailSchema], {
  error: 'Give a whole e-mail address, like name@firm.example.',
})

const numberSchema = textSchema(20).regex(
  /^[\p{L}\p{N}./ -]*$/u,
  'A job number has letters, digits, dashes, dots and slashes only.',
)

/** Every field the office types, all as text; an empty one is cleared. */
export const jobFieldsSchema = z.strictObject({
  number: numberSchema,
  title: lineSchema(120, { required: 'Give the job a title, like House, Lot 12.' }),
  siteAddress: lineSchema(200),
  accessNotes: textSchema(1000),
  siteContactName: lineSchema(80),
  siteContactPhone: phoneSchema,
  customerName: lineSchema(80),
  customerPhone: phoneSchema,
  customerEmail: maybeEmailSchema,
  covering: z.enum(coverings, 'Choose a covering.'),
  wantedBy: maybeDaySchema,
  price: priceSchema,
  priceSentOn: maybeDaySchema,
  acceptedOn: maybeDaySchema,
  completedOn: maybeDaySchema,
  notes: textSchema(4000),
  crewNotes: textSchema(2000),
})
export type JobFieldsInput = z.input<typeof jobFieldsSchema>
export type JobFields = z.output<typeof jobFieldsSchema>
export type JobFieldName = keyof JobFields

/** `id` is made on the device, so that sending twice makes one job. An empty number is given by the server. */
export const createJobSchema = jobFieldsSchema
  .partial()
  .required({ title: true, covering: true })
  .extend({ id: idSchema })
  .strict()

export const changeJobSchema = jobFieldsSchema.partial().extend({ version: versionSchema }).strict()
export type ChangeJob = z.output<typeof changeJobSchema>

/** Facts the office sets with one press; each is the day it happened. */
export const jobFactNames = ['priceSentOn', 'acceptedOn', 'completedOn'] as const
export type JobFactName = (typeof jobFactNames)[number]

export const setFactSchema = z.strictObject({ version: versionSchema, on: daySchema.nullable() })

/** How many cards a stage sends at a time. */
export const boardPageSize = 40

export const boardQuerySchema = z.strictObject({
  q: textSchema(80).default(''),
  stage: z.enum(jobStages, 'There is no such stage.').optional(),
  crew: idSchema.optional(),
  offset: z.coerce.number().int().min(0).max(1_000_000).default(0),
})
export type BoardQuery = z.output<typeof boardQuerySchema>
