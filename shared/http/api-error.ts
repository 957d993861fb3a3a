import { z } from 'zod'

export const apiErrorCodes = [
  'invalid_input',
  'unauthenticated',
  'forbidden',
  'not_found',
  'conflict',
  'too_many',
  'internal',
] as const

export const apiErrorSchema = z.object({
  code: z.enum(apiErrorCodes),
  /** Safe to show; says what to do. */
  message: z.string(),
  /** Also in the log line. */
  requestId: z.string(),
  issues: z.array(z.object({ path: z.string(), message: z.string() })),
  /** For a conflict: what the server has now, or why it was refused. */
  detail: z.unknown().optional(),
})

export type ApiError = z.infer<typeof apiErrorSchema>
export type ApiErrorCode = (typeof apiErrorCodes)[number]
