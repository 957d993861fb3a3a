import type { Request } from 'express'
import type { z } from 'zod'
import { idSchema } from '../../shared/http/fields.ts'
import { notFound } from './app-error.ts'

/**
 * A part of the path. One that cannot name a row names none: the same 404 as for a missing one.
 *
 * @throws AppError 404.
 */
export function pathPart<Schema extends z.ZodType>(
  req: Request,
  name: string,
  schema: Schema,
  what?: string,
): z.output<Schema> {
  const parsed = schema.safeParse(req.params[name])
  if (!parsed.success) throw notFound(what)
  return parsed.data
}

/** An id in the path. @throws AppError 404 when it is no id. */
export function pathId(req: Request, name: string, what?: string): string {
  return pathPart(req, name, idSchema, what)
}
