import fc from 'fast-check'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { sampleOf } from '../roof/support/sample.ts'
import {
  cutOnceByShape,
  nothingOnADayOff,
  packagesInOrder,
  placedOrShort,
  type SeenDay,
  type SeenFirm,
  type SeenJob,
  startedDaysKept,
  stoodAfterCut,
  ticksKept,
} from './plan-rules.ts'
import { aRandomFirm, firmToLay, type RandomFirm } from './random-firms-kit.ts'

const runs = { numRuns: sampleOf(12, 80) }
let firm: Awaited<ReturnType<typeof firmToLay>>
beforeAll(async () => {
  firm = await firmToLay()
})
afterAll(() => firm.close())

const faultsOf = (
  rules: readonly ((seen: SeenFirm, job: SeenJob) => string[])[],
  seen: SeenFirm,
  jobs: readonly SeenJob[],
) => jobs.flatMap((job) => rules.flatMap((rule) => rule(seen, job)))
const rules = [cutOnceByShape, nothingOnADayOff, packagesInOrder, stoodAfterCut]
const daysOf = (jobs: readonly SeenJob[]) => jobs.flatMap((job) => job.days)

describe('on random firms with real roofs', () => {
  test('planned minutes are all placed or counted short, in the order of packages, nothing on a day off and nothing stood before it is cut', () => {
    let [placed, short] = [0, 0]
    fc.assert(
      fc.property(aRandomFirm, (random) => {
        firm.lay(random)
        const jobs = firm.seenJobs().filter((job) => job.days.length > 0)
        expect(faultsOf([placedOrShort, ...rules], firm.seenFirm(random), jobs)).toEqual([])
        placed += daysOf(jobs).flatMap((day) => day.tasks).length
        short += jobs.filter((job) => job.shortMinutes > 0).length
      }),
      runs,
    )
    expect(placed).toBeGreaterThan(50)
    expect(short).toBeGreaterThan(0)
  }, 240_000)

  test('a rain-off keeps every tick, moves no day begun and leaves the plan whole', () => {
    let moved = 0
    const rain = fc.integer({ min: 1, max: 3 })
    fc.assert(
      fc.property(aRandomFirm, rain, (random, days) => {
        firm.lay(random)
        const before = daysOf(firm.seenJobs())
        if (!firm.rainOff(random.bookings[0]!.crew, days)) return
        const jobs = firm.seenJobs().filter((job) => job.days.length > 0)
        expect(ticksKept(before, daysOf(jobs))).toEqual([])
        expect(startedDaysKept(before, daysOf(jobs))).toEqual([])
        expect(faultsOf([placedOrShort, ...rules], firm.seenFirm(random), jobs)).toEqual([])
        moved++
      }),
      runs,
    )
    expect(moved).toBeGreaterThan(0)
  }, 240_000)

  test('a new revision keeps every tick and day begun, and what is cut already is not cut again', () => {
    let begun = 0
    fc.assert(
      fc.property(aRandomFirm, (random) => {
        firm.lay(random)
        const before = daysOf(firm.seenJobs())
        firm.reviseAll()
        const jobs = firm.seenJobs().filter((job) => job.days.length > 0)
        expect(ticksKept(before, daysOf(jobs))).toEqual([])
        expect(startedDaysKept(before, daysOf(jobs))).toEqual([])
        expect(faultsOf(rules, firm.seenFirm(random), jobs)).toEqual([])
        if (daysOf(jobs).some(isBegun)) begun++
      }),
      runs,
    )
    expect(begun).toBeGreaterThan(0)
  }, 240_000)
})

const isBegun = (day: SeenDay) => day.tasks.some((task) => task.tickIds.length > 0)

/** One firm whose plan is good, to be bent: one of a crew of two is away, over three days before Christmas. */
const plainFirm: RandomFirm = {
  crewOf: [0, 1, 1, 1, 1, 0],
  weekHours: [null, null, null, null, null, null],
  leave: [{ person: 5, startsOn: '2026-12-16', days: 4, weekdays: null }],
  loans: [],
  closed: ['2026-12-22'],
  keepsHolidays: true,
  workingWeekdays: [1, 2, 3, 4, 5],
  startUpMinutes: 0,
  packageMinutes: 25,
  bookings: [{ job: 0, crew: 0, startsOn: '2026-12-16', workingDays: 3 }],
  ticks: [{ task: 1, pieces: 1 }],
  given: [],
}

describe('a plan bent a little is seen', () => {
  const bent = (bend: (job: SeenJob) => void) => {
    firm.lay(plainFirm)
    const job = structuredClone(firm.seenJobs()[0]!)
    const seen = firm.seenFirm(plainFirm)
    expect(faultsOf([placedOrShort, ...rules], seen, [job])).toEqual([])
    const before = structuredClone(job.days)
    bend(job)
    return { seen, job, before }
  }
  const [thursday, friday] = [1, 2]
  const cutting = (job: SeenJob) =>
    job.days.slice(1).flatMap((day) => day.tasks.filter((task) => task.work === 'cut'))[0]!

  test('a piece dropped from a day', () => {
    const { seen, job } = bent((b) => void cutting(b).memberMarks.pop())
    expect(placedOrShort(seen, job)).not.toEqual([])
    expect(cutOnceByShape(seen, job)).not.toEqual([])
  })

  test('a piece planned on two days', () => {
    const { seen, job } = bent((b) => b.days[friday]!.tasks.push({ ...cutting(b) }))
    expect(placedOrShort(seen, job)).not.toEqual([])
    expect(cutOnceByShape(seen, job)).not.toEqual([])
  })

  test('minutes lost from what is counted short, or from a task', () => {
    const uncounted = bent((b) => void (b.shortMinutes += 30))
    expect(placedOrShort(uncounted.seen, uncounted.job)).not.toEqual([])
    const unplanned = bent((b) => void (cutting(b).plannedMinutes -= 5))
    expect(placedOrShort(unplanned.seen, unplanned.job)).not.toEqual([])
  })

  test('a day on a Saturday, on a closed day, on Christmas Day', () => {
    for (const day of ['2026-12-19', '2026-12-22', '2026-12-25']) {
      const { seen, job } = bent((b) => void (b.days[thursday]!.day = day))
      expect(nothingOnADayOff(seen, job)).not.toEqual([])
    }
  })

  test('a day fuller than the crew that is there, and a task of someone away', () => {
    const full = bent((b) => void (b.days[thursday]!.tasks[0]!.plannedMinutes += 6 * 480))
    expect(nothingOnADayOff(full.seen, full.job)).not.toEqual([])
    const { seen, job } = bent((b) => void (cutting(b).assignedToId = 'someone away'))
    expect(nothingOnADayOff(seen, job)).not.toEqual([])
  })

  test('packages out of order', () => {
    const { seen, job } = bent(
      (b) =>
        void ([b.days[thursday]!.tasks, b.days[friday]!.tasks] = [
          b.days[friday]!.tasks,
          b.days[thursday]!.tasks,
        ]),
    )
    expect(packagesInOrder(seen, job)).not.toEqual([])
  })

  test('a rafter stood before it is cut', () => {
    const { seen, job } = bent((b) => {
      const own = cutting(b)
      b.days[thursday]!.tasks.unshift({ ...own, work: 'stand' })
    })
    expect(stoodAfterCut(seen, job)).not.toEqual([])
  })

  test('a day begun that moves, and a tick that is lost', () => {
    const { job, before } = bent((b) => {
      b.days[0]!.day = '2026-12-17'
      b.days[0]!.tasks.find((task) => task.ticked > 0)!.tickIds = []
    })
    expect(startedDaysKept(before, job.days)).not.toEqual([])
    expect(ticksKept(before, job.days)).not.toEqual([])
  })
})
