import { z } from 'zod'

export const roles = ['office', 'leading-hand', 'apprentice'] as const
export type Role = (typeof roles)[number]
export const roleSchema = z.enum(roles)

export const roleNames: Record<Role, string> = {
  office: 'Office',
  'leading-hand': 'Leading hand',
  apprentice: 'Apprentice',
}
