import type { z } from 'zod'
import { AppError } from './app-error.ts'

/** The only door for what comes from outside: a body, a query, a path. */
export function parseInput<Schema extends z.ZodType>(
  schema: Schema,
  value: unknown,
): z.output<Schema> {
  const parsed = schema.safeParse(value ?? {})
  if (parsed.success) return parsed.data
  const issues = parsed.error.issues.map((issue) => ({
    path: issue.path.join('.') || (issue.code === 'unrecognized_keys' ? issue.keys.join(', ') : ''),
    message: issue.message,
  }))
  throw new AppError('invalid_input', 'Some fields need another look.', { issues })
}
