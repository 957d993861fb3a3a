import { describe, expect, test } from 'vitest'
import { type JobFacts, jobStageOf, type JobStage, jobStages } from '../../shared/jobs/job-stage.ts'
import { stageDrop } from '../../shared/jobs/stage-drop.ts'

// No outside source: the words of issue 4, "drag where a fact can be set by it (price sent, accepted,
// complete)", held against the one table that says which facts make a stage.

const today = '2026-12-02'
const nothingYet: JobFacts = {
  isPriceSent: false,
  isAccepted: false,
  hasPencilledBooking: false,
  hasFirmBooking: false,
  isWorked: false,
  isMarkedComplete: false,
}
/** A job that went the whole way to a stage, step by step. */
const factsAt: Record<JobStage, JobFacts> = {
  enquiry: nothingYet,
  priced: { ...nothingYet, isPriceSent: true },
  won: { ...nothingYet, isPriceSent: true, isAccepted: true },
  pencilled: { ...nothingYet, isPriceSent: true, isAccepted: true, hasPencilledBooking: true },
  firm: { ...nothingYet, isPriceSent: true, isAccepted: true, hasFirmBooking: true },
  'on-site': {
    ...nothingYet,
    isPriceSent: true,
    isAccepted: true,
    hasFirmBooking: true,
    isWorked: true,
  },
  complete: { ...nothingYet, isPriceSent: true, isAccepted: true, isMarkedComplete: true },
}
const flagOf = {
  priceSentOn: 'isPriceSent',
  acceptedOn: 'isAccepted',
  completedOn: 'isMarkedComplete',
} as const

const pairs = jobStages.flatMap((from) => jobStages.map((to) => [from, to] as const))

describe('a job dropped on a stage of the board', () => {
  test.each(pairs.filter(([from, to]) => from !== to && from !== 'complete'))(
    'from %s on %s sets the one fact that puts it there, or is refused with a way out',
    (from, to) => {
      const drop = stageDrop(from, to, today)
      if (drop === null || 'refused' in drop) {
        expect(drop?.refused).toMatch(/\.$/)
        return
      }
      const facts = { ...factsAt[from], [flagOf[drop.fact]]: drop.on !== null }
      expect(jobStageOf(facts)).toBe(to)
    },
  )

  test('is what it was where it is dropped on its own stage', () => {
    for (const stage of jobStages) expect(stageDrop(stage, stage, today)).toBeNull()
  })

  test('from complete is opened again, whatever it then is by its other facts', () => {
    for (const to of jobStages.filter((stage) => stage !== 'complete'))
      expect(stageDrop('complete', to, today)).toMatchObject({ fact: 'completedOn', on: null })
  })

  test('price sent, accepted and complete are set to the firm’s day', () => {
    const set = (from: JobStage, to: JobStage) => stageDrop(from, to, today)
    expect(set('enquiry', 'priced')).toMatchObject({ fact: 'priceSentOn', on: today })
    expect(set('priced', 'won')).toMatchObject({ fact: 'acceptedOn', on: today })
    for (const from of ['enquiry', 'firm', 'on-site'] as const)
      expect(set(from, 'complete')).toMatchObject({ fact: 'completedOn', on: today })
  })

  test('is never booked, begun or unbooked by a drop', () => {
    for (const from of ['enquiry', 'priced', 'won'] as const)
      for (const to of ['pencilled', 'firm', 'on-site'] as const)
        expect(stageDrop(from, to, today)).toHaveProperty('refused')
    for (const from of ['pencilled', 'firm', 'on-site'] as const)
      for (const to of ['enquiry', 'priced', 'won'] as const)
        expect(stageDrop(from, to, today)).toHaveProperty('refused')
  })
})
