import { expect, test } from 'vitest'
import { type Permission, roleMay } from '../../shared/auth/permissions.ts'
import { jobMissingOf, type JobMissingFacts } from '../../shared/jobs/job-missing.ts'

// Common practice in an office that books crews, no outside source.

const office = (permission: Permission) => roleMay('office', permission)
const leadingHand = (permission: Permission) => roleMay('leading-hand', permission)

const bare: JobMissingFacts = {
  stage: 'enquiry',
  hasPrice: false,
  hasSiteAddress: false,
  hasSiteContact: false,
  hasIssuedRoof: false,
  hasUnissuedDraft: false,
  hasStandingBooking: false,
  arePlatesMeasured: false,
  isLastBookedDayPast: false,
}

test('a fresh enquiry lacks its price, its site and its roof, and nothing that comes later', () => {
  expect(jobMissingOf(bare, office)).toEqual(['price', 'site-address', 'roof'])
})

test('a won job lacks somebody to ring on site and a booking', () => {
  const facts = { ...bare, stage: 'won', hasPrice: true, hasSiteAddress: true } as const
  expect(jobMissingOf(facts, office)).toEqual(['roof', 'site-contact', 'booking'])
})

test('a firm job with an issued roof waits for the plates to be measured', () => {
  const facts = {
    ...bare,
    stage: 'firm',
    hasPrice: true,
    hasSiteAddress: true,
    hasSiteContact: true,
    hasIssuedRoof: true,
    hasStandingBooking: true,
  } as const
  expect(jobMissingOf(facts, office)).toEqual(['plate-check'])
  expect(jobMissingOf({ ...facts, arePlatesMeasured: true }, office)).toEqual([])
})

test('roof changes typed after the last revision are pointed out to who can issue them', () => {
  const facts = { ...bare, hasIssuedRoof: true, hasUnissuedDraft: true }
  expect(jobMissingOf(facts, office)).toContain('roof-not-issued')
  expect(jobMissingOf(facts, leadingHand)).not.toContain('roof-not-issued')
})

test('a job whose booked days are over asks to be marked complete', () => {
  const facts = { ...bare, stage: 'on-site', hasStandingBooking: true } as const
  expect(jobMissingOf({ ...facts, isLastBookedDayPast: true }, office)).toContain('completion')
  expect(jobMissingOf(facts, office)).not.toContain('completion')
})

test('a leading hand is never told of the price', () => {
  expect(jobMissingOf(bare, leadingHand)).not.toContain('price')
})

test('a complete job lacks nothing', () => {
  expect(jobMissingOf({ ...bare, stage: 'complete' }, office)).toEqual([])
})
