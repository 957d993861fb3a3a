import type { Express, Request, RequestHandler, Response } from 'express'
import type { z } from 'zod'
import type { Permission } from '../../shared/auth/permissions.ts'
import { requirePermission } from './require-permission.ts'

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete'
/** What a route asks of the caller; 'public' must be said aloud. */
export type Access = Permission | 'public'
export type RouteRecord = { method: Method; path: string; access: Access }

type Handler = (req: Request, res: Response) => void | Promise<void>

/**
 * Registers routes and remembers them, so that a test can walk every one as every role.
 * A route cannot be added without naming its access.
 */
export type Api = {
  readonly routes: readonly RouteRecord[]
  route(
    method: Method,
    path: string,
    access: Access,
    ...handlers: [...RequestHandler[], Handler]
  ): void
}

export function createApi(app: Express): Api {
  const routes: RouteRecord[] = []
  return {
    routes,
    route(method, path, access, ...handlers) {
      routes.push({ method, path, access })
      const guards = access === 'public' ? [] : [requirePermission(access)]
      app[method](path, ...guards, ...handlers)
    },
  }
}

/** Sends what the response schema lets through; a mismatch is our bug and becomes a 500. */
export function send<Schema extends z.ZodType>(
  res: Response,
  schema: Schema,
  value: z.input<Schema>,
  status = 200,
): void {
  res.status(status).json(schema.parse(value))
}
