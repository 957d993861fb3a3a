import { z } from 'zod'
import { daySchema } from '../../shared/http/fields.ts'

/** A notice stored by an older version names one day. */
const noticePayloadSchema = z
  .object({ day: daySchema, days: z.array(daySchema).optional() })
  .transform(({ day, days }) => days ?? [day])

/** The days a change notice tells of, from its row in the outbox. */
export function noticeDays(payload: unknown): string[] {
  return noticePayloadSchema.parse(payload)
}
