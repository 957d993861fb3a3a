import { z } from 'zod'
import { daySchema, idSchema, lineSchema, textSchema, versionSchema } from '../http/fields.ts'
import { priceCentsOf } from '../jobs/price-text.ts'

/** Dollars as typed, below nothing for work left out; empty while it is not priced. */
const variationPriceSchema = z.string().transform((text, context) => {
  const isBelow = /^\s*[-−]/.test(text)
  const cents = priceCentsOf(text.replace(/^\s*[-−]/, ''))
  if (cents !== undefined && !(isBelow && cents === null))
    return isBelow && cents !== null ? -cents : cents
  context.addIssue({
    code: 'custom',
    message: 'Give the price in dollars, like 450 or 450.50; with a minus for work left out.',
  })
  return z.NEVER
})

const reasonSchema = textSchema(500, { required: 'Say what the variation is and why.' })

/** `id` is made on the device, so that sending twice makes one. */
export const createVariationSchema = z.strictObject({
  id: idSchema,
  reason: reasonSchema,
  price: variationPriceSchema,
})
export type CreateVariation = z.output<typeof createVariationSchema>

export const changeVariationSchema = z
  .strictObject({
    version: versionSchema,
    reason: reasonSchema.optional(),
    price: variationPriceSchema.optional(),
    /** The day the builder was asked; null takes it back. */
    askedOn: daySchema.nullable().optional(),
    /** The builder's yes: its day and who gave it, both or neither. */
    agreed: z
      .strictObject({ on: daySchema, by: lineSchema(80, { required: 'Say who said yes.' }) })
      .nullable()
      .optional(),
    withdrawnOn: daySchema.nullable().optional(),
  })
  .strict()
export type ChangeVariation = z.output<typeof changeVariationSchema>

export const variationSchema = z.object({
  id: z.string(),
  /** 1, 2, 3 … within the job; spoken as V1, V2. */
  sequence: z.number(),
  reason: z.string(),
  priceCents: z.number().nullable(),
  askedOn: z.string().nullable(),
  agreedOn: z.string().nullable(),
  agreedBy: z.string(),
  withdrawnOn: z.string().nullable(),
  createdBy: z.string(),
  version: z.number(),
})
export type Variation = z.infer<typeof variationSchema>

export const jobVariationsSchema = z.object({
  /** The job's own price; null while there is none. */
  priceCents: z.number().nullable(),
  variations: z.array(variationSchema),
})
export type JobVariations = z.infer<typeof jobVariationsSchema>
