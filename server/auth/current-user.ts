import type { Response } from 'express'
import type { Role } from '../../shared/auth/roles.ts'
import { AppError } from '../http/app-error.ts'

/** Who is asking, as read from the database for this very request. */
export type CurrentUser = { id: string; name: string; email: string; role: Role }

export function setCurrentUser(res: Response, user: CurrentUser): void {
  res.locals['user'] = user
}

export function maybeCurrentUser(res: Response): CurrentUser | null {
  return (res.locals['user'] as CurrentUser | undefined) ?? null
}

/** @throws AppError 401 when nobody is signed in. */
export function currentUser(res: Response): CurrentUser {
  const user = maybeCurrentUser(res)
  if (!user) throw new AppError('unauthenticated', 'Sign in to go on.')
  return user
}
