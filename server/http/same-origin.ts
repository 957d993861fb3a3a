import type { RequestHandler } from 'express'
import { uploadHeader } from '../../shared/http/upload.ts'
import { AppError } from './app-error.ts'

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses writes that another site makes a browser send. `Sec-Fetch-Site` says so itself; older browsers
 * send `Origin`, which must then be ours.
 */
export function refuseCrossSiteWrites(appUrl: string): RequestHandler {
  const ownOrigin = new URL(appUrl).origin
  return (req, _res, next) => {
    if (safeMethods.has(req.method)) return next()
    const site = req.get('sec-fetch-site')
    const origin = req.get('origin')
    const sameHost = origin === `${req.protocol}://${req.get('host') ?? ''}`
    const foreign =
      (site !== undefined && site !== 'same-origin' && site !== 'none') ||
      (origin !== undefined && origin !== ownOrigin && !sameHost)
    if (foreign) throw new AppError('forbidden', 'This came from another site and was refused.')
    next()
  }
}

/**
 * A body is JSON or nothing. What a plain form can send needs no leave of ours (Fetch standard, CORS-safelisted
 * content types), so such a body is refused rather than read as empty, unless it comes with a header that a
 * plain form cannot send.
 */
export const refuseOtherBodies: RequestHandler = (req, _res, next) => {
  const isEmpty = req.get('content-length') === '0'
  const isUpload = req.get(uploadHeader) !== undefined && req.is('multipart/form-data') !== false
  if (!isEmpty && !isUpload && req.is('application/json') === false)
    throw new AppError('invalid_input', 'A body is sent as JSON.')
  next()
}
