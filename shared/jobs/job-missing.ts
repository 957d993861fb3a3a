import type { Permission } from '../auth/permissions.ts'
import { type JobStage, stageReached } from './job-stage.ts'

export const jobMissingKinds = [
  'price',
  'site-address',
  'roof',
  'roof-not-issued',
  'site-contact',
  'booking',
  'plate-check',
  'completion',
] as const
export type JobMissing = (typeof jobMissingKinds)[number]

export const jobMissingWords: Record<JobMissing, string> = {
  price: 'No price',
  'site-address': 'No site address',
  roof: 'No roof issued',
  'roof-not-issued': 'Roof changes not issued',
  'site-contact': 'No site contact',
  booking: 'Not booked',
  'plate-check': 'Plates not measured',
  completion: 'Last booked day is past',
}

/** What the answer is worked out from. */
export type JobMissingFacts = {
  stage: JobStage
  hasPrice: boolean
  hasSiteAddress: boolean
  /** Both a name and a number to ring. */
  hasSiteContact: boolean
  hasIssuedRoof: boolean
  /** The roof draft was changed after the latest revision was issued. */
  hasUnissuedDraft: boolean
  hasStandingBooking: boolean
  /** Sides and diagonals recorded for the latest revision. */
  arePlatesMeasured: boolean
  /** Days are booked, and the last of them is before today. */
  isLastBookedDayPast: boolean
}

type Rule = {
  /** From this stage on it matters; a complete job misses nothing. */
  from: JobStage
  /** What a person must hold to be told of it. */
  permission: Permission
  isMissing: (facts: JobMissingFacts) => boolean
}

const rules: Record<JobMissing, Rule> = {
  price: { from: 'enquiry', permission: 'price:read', isMissing: (f) => !f.hasPrice },
  'site-address': { from: 'enquiry', permission: 'job:read', isMissing: (f) => !f.hasSiteAddress },
  roof: { from: 'enquiry', permission: 'roof:read', isMissing: (f) => !f.hasIssuedRoof },
  'roof-not-issued': {
    from: 'enquiry',
    permission: 'roof:write',
    isMissing: (f) => f.hasIssuedRoof && f.hasUnissuedDraft,
  },
  'site-contact': {
    from: 'won',
    permission: 'site-contact-phone:read',
    isMissing: (f) => !f.hasSiteContact,
  },
  booking: { from: 'won', permission: 'job:read', isMissing: (f) => !f.hasStandingBooking },
  'plate-check': {
    from: 'firm',
    permission: 'job:read',
    isMissing: (f) => f.hasIssuedRoof && !f.arePlatesMeasured,
  },
  completion: {
    from: 'firm',
    permission: 'job:write',
    isMissing: (f) => f.hasStandingBooking && f.isLastBookedDayPast,
  },
}

/** What a job still lacks for the stage it is at, in the order to see to it. */
export function jobMissingOf(
  facts: JobMissingFacts,
  may: (permission: Permission) => boolean,
): JobMissing[] {
  if (facts.stage === 'complete') return []
  return jobMissingKinds.filter((kind) => {
    const rule = rules[kind]
    return may(rule.permission) && stageReached(facts.stage, rule.from) && rule.isMissing(facts)
  })
}
