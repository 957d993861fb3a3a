import type { ErrorRequestHandler } from 'express'
import type { Logger } from 'pino'
import type { ApiError } from '../../shared/http/api-error.ts'
import { AppError } from './app-error.ts'
import { requestIdOf } from './request-id.ts'

type BodyError = { type?: string; status?: number }

function asAppError(error: unknown): AppError {
  if (error instanceof AppError) return error
  const { type, status } = (error ?? {}) as BodyError
  if (type === 'entity.parse.failed')
    return new AppError('invalid_input', 'The request was not whole. Try again.')
  if (type === 'entity.too.large')
    return new AppError('invalid_input', 'That is too much to send at once.')
  if (status !== undefined && status >= 400 && status < 500)
    return new AppError('invalid_input', 'The request was not understood.')
  return new AppError(
    'internal',
    'Something went wrong on our side. Nothing was saved. Try again.',
    { cause: error },
  )
}

/** Turns whatever was thrown into an `ApiError` body. */
export function errorHandler(log: Logger): ErrorRequestHandler {
  return (error, _req, res, next) => {
    if (res.headersSent) {
      next(error)
      return
    }
    const appError = asAppError(error)
    const requestId = requestIdOf(res)
    if (appError.status >= 500)
      log.error({ requestId, err: appError.cause ?? appError }, 'request failed')
    const body: ApiError = {
      code: appError.code,
      message: appError.message,
      requestId,
      issues: appError.issues,
      ...(appError.detail === undefined ? {} : { detail: appError.detail }),
    }
    res.status(appError.status).json(body)
  }
}
