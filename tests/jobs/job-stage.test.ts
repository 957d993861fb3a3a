import { expect, test } from 'vitest'
import {
  type JobFacts,
  jobStageOf,
  jobStages,
  stageReached,
  stageTable,
} from '../../shared/jobs/job-stage.ts'

// Source of the order: the stage sentence of the product's own description; no outside source.

const nothingYet: JobFacts = {
  isPriceSent: false,
  isAccepted: false,
  hasPencilledBooking: false,
  hasFirmBooking: false,
  isWorked: false,
  isMarkedComplete: false,
}

test('a job nobody has priced is an enquiry', () => {
  expect(jobStageOf(nothingYet)).toBe('enquiry')
})

test.each([
  [{ isPriceSent: true }, 'priced'],
  [{ isAccepted: true }, 'won'],
  [{ hasPencilledBooking: true }, 'pencilled'],
  [{ hasFirmBooking: true }, 'firm'],
  [{ isWorked: true }, 'on-site'],
  [{ isMarkedComplete: true }, 'complete'],
] as const)('one fact alone, %o, puts a job at %s', (fact, stage) => {
  expect(jobStageOf({ ...nothingYet, ...fact })).toBe(stage)
})

test('with some days firm and some in pencil the job is firm', () => {
  const facts = { ...nothingYet, isAccepted: true, hasPencilledBooking: true, hasFirmBooking: true }
  expect(jobStageOf(facts)).toBe('firm')
})

test('a job booked before the price is accepted stands where its booking stands', () => {
  expect(jobStageOf({ ...nothingYet, isPriceSent: true, hasPencilledBooking: true })).toBe(
    'pencilled',
  )
})

test('any further fact never takes a job back a stage', () => {
  const names = stageTable.map(({ fact }) => fact)
  for (let bits = 0; bits < 2 ** names.length; bits++) {
    const facts = { ...nothingYet }
    names.forEach((name, i) => (facts[name] = (bits & (1 << i)) !== 0))
    const before = jobStageOf(facts)
    for (const name of names) {
      expect(stageReached(jobStageOf({ ...facts, [name]: true }), before)).toBe(true)
    }
  }
})

test('every stage but the first is reached by exactly one fact', () => {
  expect(stageTable.map(({ stage }) => stage).reverse()).toEqual(jobStages.slice(1))
})
