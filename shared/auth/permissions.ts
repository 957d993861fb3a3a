import type { Role } from './roles.ts'

/**
 * How far a permission reaches: everything; what the person's own crew is booked on (14 days back to
 * 28 ahead); days the person is rostered on, from the reminder until 7 days after; the person's own rows.
 */
export type Scope = 'all' | 'own-crew' | 'rostered' | 'own'

type Row = Record<Role, Scope | null>

const officeOnly: Row = { office: 'all', 'leading-hand': null, apprentice: null }
const officeAndCrewLead: Row = { office: 'all', 'leading-hand': 'own-crew', apprentice: null }
const onSite: Row = { office: 'all', 'leading-hand': 'own-crew', apprentice: 'rostered' }
const everyone: Row = { office: 'own', 'leading-hand': 'own', apprentice: 'own' }

/** Who may do what: the one table that routes and screens read. */
export const permissionTable = {
  'account:own': everyone,
  'board:read': officeAndCrewLead,
  'calendar:read': officeAndCrewLead,
  'job:read': officeAndCrewLead,
  'job:write': officeOnly,
  'roof:read': onSite,
  'roof:write': officeOnly,
  'plate-check:write': officeAndCrewLead,
  'booking:write': officeOnly,
  'crew:read': officeAndCrewLead,
  'crew:write': officeOnly,
  'person:read': officeOnly,
  'person:write': officeOnly,
  'firm:read': officeOnly,
  'firm:write': officeOnly,
  'day-sheet:read': onSite,
  'day-sheet:write': officeAndCrewLead,
  'task:read': { office: 'all', 'leading-hand': 'own-crew', apprentice: 'own' },
  'task:tick': { office: 'all', 'leading-hand': 'own-crew', apprentice: 'own' },
  'day-log:read': onSite,
  'day-log:write': officeAndCrewLead,
  'hours:read': officeOnly,
  'rain-off:ask': officeAndCrewLead,
  'rain-off:write': officeOnly,
  'notice:read': officeOnly,
  'notice:write': officeOnly,
  'milestone:write': officeOnly,
  'variation:write': officeOnly,
  'customer:read': officeOnly,
  'site-contact-phone:read': officeAndCrewLead,
  'price:read': officeOnly,
  'message:read': officeOnly,
  'message:write': officeOnly,
  'audit:read': officeOnly,
  'event:read': onSite,
} as const satisfies Record<string, Row>

export type Permission = keyof typeof permissionTable

/** The scope in which a role holds a permission; null when it does not hold it. */
export function permissionScope(role: Role, permission: Permission): Scope | null {
  return permissionTable[permission][role]
}

export function roleMay(role: Role, permission: Permission): boolean {
  return permissionScope(role, permission) !== null
}

/** Days a leading hand sees of own crew's work, counted from today. */
export const ownCrewWindow = { daysBack: 14, daysAhead: 28 } as const
/** Days after a rostered day that an apprentice still sees it. */
export const rosteredDaysAfter = 7
