import { randomUUID } from 'node:crypto'
import type { RequestHandler, Response } from 'express'

export function requestId(): RequestHandler {
  return (_req, res, next) => {
    const id = randomUUID()
    res.locals['requestId'] = id
    res.setHeader('X-Request-Id', id)
    next()
  }
}

export function requestIdOf(res: Response): string {
  const id: unknown = res.locals['requestId']
  return typeof id === 'string' ? id : 'none'
}
