import type { ApiErrorCode } from '../../shared/http/api-error.ts'

const statuses: Record<ApiErrorCode, number> = {
  invalid_input: 400,
  unauthenticated: 401,
  forbidden: 403,
  not_found: 404,
  conflict: 409,
  too_many: 429,
  internal: 500,
}

export type FieldIssue = { path: string; message: string }

/** An answer other than success, in words that may be shown; the cause is logged, never sent. */
export class AppError extends Error {
  readonly status: number
  readonly code: ApiErrorCode
  readonly issues: FieldIssue[]
  readonly detail: unknown

  constructor(
    code: ApiErrorCode,
    message: string,
    options: { issues?: FieldIssue[]; detail?: unknown; cause?: unknown } = {},
  ) {
    super(message, { cause: options.cause })
    this.code = code
    this.status = statuses[code]
    this.issues = options.issues ?? []
    this.detail = options.detail
  }
}

export function notFound(what = 'That'): AppError {
  return new AppError('not_found', `${what} is not here, or not yours to see.`)
}

export function staleVersion(current: unknown): AppError {
  return new AppError(
    'conflict',
    'Somebody else changed this since you opened it. Look at what is there now, then make your change again.',
    { detail: { current } },
  )
}

/** For fields whose fault only the server can see. */
export function invalidField(path: string, message: string): AppError {
  return new AppError('invalid_input', message, { issues: [{ path, message }] })
}
