import type { z } from 'zod'
import { type ApiError, apiErrorSchema } from '../../shared/http/api-error.ts'
import { photoField, uploadHeader } from '../../shared/http/upload.ts'

/** What the server answered when it was not success; `issues` go to their fields. */
export class ApiFailure extends Error {
  readonly error: ApiError
  readonly status: number

  constructor(error: ApiError, status: number) {
    super(error.message)
    this.error = error
    this.status = status
  }

  /** The message for one field, or undefined. */
  issueAt(path: string): string | undefined {
    return this.error.issues.find((issue) => issue.path === path)?.message
  }
}

const unreachable: ApiError = {
  code: 'internal',
  message: 'No answer from the server. Check the signal and try again.',
  requestId: 'none',
  issues: [],
}

type Options = { signal?: AbortSignal }

/** A picture travels as a form, everything else as JSON. */
function bodyOf(body: unknown): { headers: Record<string, string>; body?: BodyInit } {
  if (body === undefined) return { headers: {} }
  if (body instanceof FormData) return { headers: { [uploadHeader]: '1' }, body }
  return { headers: { 'Content-Type': 'application/json' }, body: JSON.stringify(body) }
}

function photoForm(photo: File): FormData {
  const form = new FormData()
  form.set(photoField, photo)
  return form
}

async function call<Schema extends z.ZodType>(
  method: string,
  path: string,
  schema: Schema,
  body: unknown,
  options: Options,
): Promise<z.output<Schema>> {
  let response: Response
  try {
    response = await fetch(path, {
      method,
      credentials: 'same-origin',
      ...bodyOf(body),
      ...(options.signal ? { signal: options.signal } : {}),
    })
  } catch (cause) {
    if (cause instanceof DOMException && cause.name === 'AbortError') throw cause
    throw new ApiFailure(unreachable, 0)
  }
  const json: unknown = await response.json().catch(() => null)
  if (response.ok) return schema.parse(json)
  const parsed = apiErrorSchema.safeParse(json)
  throw new ApiFailure(parsed.success ? parsed.data : unreachable, response.status)
}

export const api = {
  get: <S extends z.ZodType>(path: string, schema: S, options: Options = {}) =>
    call('GET', path, schema, undefined, options),
  post: <S extends z.ZodType>(path: string, schema: S, body: unknown = {}) =>
    call('POST', path, schema, body, {}),
  put: <S extends z.ZodType>(path: string, schema: S, body: unknown = {}) =>
    call('PUT', path, schema, body, {}),
  putPhoto: <S extends z.ZodType>(path: string, schema: S, photo: File) =>
    call('PUT', path, schema, photoForm(photo), {}),
  patch: <S extends z.ZodType>(path: string, schema: S, body: unknown = {}) =>
    call('PATCH', path, schema, body, {}),
  delete: <S extends z.ZodType>(path: string, schema: S) =>
    call('DELETE', path, schema, undefined, {}),
}
