import { z } from 'zod'
import { emailSchema } from '../http/fields.ts'
import { roleSchema } from './roles.ts'

export const passwordMinLength = 10

export const newPasswordSchema = z
  .string()
  .min(passwordMinLength, `Use at least ${passwordMinLength} characters.`)
  .max(200, 'Keep this to 200 characters.')

export const signInSchema = z.strictObject({
  email: emailSchema,
  password: z.string().min(1, 'Type your password.').max(200, 'Keep this to 200 characters.'),
})

export const askResetSchema = z.strictObject({ email: emailSchema })

export const useResetSchema = z.strictObject({
  token: z.string().min(20, 'That link is not complete.').max(200, 'That link is not complete.'),
  password: newPasswordSchema,
})

export const changePasswordSchema = z.strictObject({
  current: z.string().min(1, 'Type the password you have now.').max(200),
  next: newPasswordSchema,
})

/** What a signed-in screen needs to know about who is using it. */
export const sessionSchema = z.object({
  user: z
    .object({ id: z.string(), name: z.string(), email: z.string(), role: roleSchema })
    .nullable(),
  firm: z.object({
    name: z.string(),
    timeZone: z.string(),
    lengthUnits: z.enum(['mm', 'feet-inches']),
    /** The firm's calendar day now. */
    today: z.string(),
  }),
})
export type Session = z.infer<typeof sessionSchema>

export const doneSchema = z.object({ done: z.literal(true) })
