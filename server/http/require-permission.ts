import type { RequestHandler } from 'express'
import { type Permission, roleMay } from '../../shared/auth/permissions.ts'
import { currentUser } from '../auth/current-user.ts'
import { AppError } from './app-error.ts'

/** 401 signed out, 403 when the role does not hold the permission in any scope. */
export function requirePermission(permission: Permission): RequestHandler {
  return (_req, res, next) => {
    if (!roleMay(currentUser(res).role, permission)) {
      throw new AppError('forbidden', 'Your role does not open this. Ask the office.')
    }
    next()
  }
}
