import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  type DayToPlan,
  nothingDone,
  type PlannedTask,
  planDays,
} from '../../shared/day-plan/day-plan.ts'
import {
  labourMinutes,
  minutesForWork,
  packageKeys,
  type PackageKey,
  type WorkPackage,
  type WorkStep,
} from '../../shared/labour/work-step.ts'

// No outside source: these are the rules of product.md, "From roof to days", as properties.

function cutAndStand(line: string, pieces: number, cutMinutes: number, standMinutes: number) {
  const memberMarks = Array.from({ length: pieces }, (_, i) => `${line}-${i + 1}`)
  const step = (work: 'cut' | 'stand', key: PackageKey, minutesEach: number): WorkStep => ({
    packageKey: key,
    work,
    cutLineMark: line,
    memberMarks,
    minutesEach,
    title: `${work} ${line}`,
  })
  return { cut: step('cut', 'cut-commons', cutMinutes), stand: step('stand', 'hips', standMinutes) }
}

const setOut = (packageKey: PackageKey, minutesEach: number): WorkStep => ({
  packageKey,
  work: 'set-out',
  cutLineMark: null,
  memberMarks: [],
  minutesEach,
  title: packageKey,
})

const aJob = fc
  .array(
    fc.record({
      pieces: fc.integer({ min: 1, max: 14 }),
      cutMinutes: fc.integer({ min: 1, max: 60 }),
      standMinutes: fc.integer({ min: 1, max: 60 }),
    }),
    { minLength: 1, maxLength: 6 },
  )
  .chain((lines) => fc.tuple(fc.constant(lines), fc.integer({ min: 0, max: 45 })))
  .map(([lines, setUpMinutes]): WorkPackage[] => {
    const made = lines.map((l, i) => cutAndStand(`L${i}`, l.pieces, l.cutMinutes, l.standMinutes))
    return [
      {
        key: 'set-out-plates',
        title: 'Set out',
        steps: [setOut('set-out-plates', 90)],
        setUpMinutes,
      },
      { key: 'cut-commons', title: 'Cut', steps: made.map((l) => l.cut), setUpMinutes },
      { key: 'hips', title: 'Stand', steps: made.map((l) => l.stand), setUpMinutes },
      { key: 'tails', title: 'Tails', steps: [setOut('tails', 120)], setUpMinutes },
    ]
  })

const someDays = fc
  .array(fc.integer({ min: 0, max: 1500 }), { maxLength: 8 })
  .map((minutes): DayToPlan[] =>
    minutes.map((crewMinutes, i) => ({ day: `2026-12-0${i + 1}`, crewMinutes })),
  )

const piecesIn = (tasks: readonly PlannedTask[]): string[] =>
  tasks.flatMap((t) =>
    t.memberMarks.length === 0
      ? [`${t.work} ${t.packageKey}`]
      : t.memberMarks.map((mark) => `${t.work} ${mark}`),
  )
const piecesOfJob = (packages: readonly WorkPackage[]): string[] =>
  packages.flatMap((p) =>
    p.steps.flatMap((s) =>
      s.memberMarks.length === 0
        ? [`${s.work} ${s.packageKey}`]
        : s.memberMarks.map((mark) => `${s.work} ${mark}`),
    ),
  )
const sum = (numbers: readonly number[]): number => numbers.reduce((a, b) => a + b, 0)

describe('a day plan of any job over any days', () => {
  test('places every piece once or reports it left over, in the order crews work', () => {
    fc.assert(
      fc.property(aJob, someDays, (packages, days) => {
        const plan = planDays({ packages, days })
        const placed = piecesIn([...plan.days.flatMap((d) => d.tasks), ...plan.leftover])
        expect(placed).toEqual(piecesOfJob(packages))
      }),
    )
  })

  test('accounts for every minute of the work', () => {
    fc.assert(
      fc.property(aJob, someDays, (packages, days) => {
        const plan = planDays({ packages, days })
        const planned = sum(plan.days.map((d) => d.plannedMinutes))
        expect(planned + plan.shortMinutes).toBeCloseTo(labourMinutes(packages), 6)
      }),
    )
  })

  test('never fills a day beyond its hours, but for one piece longer than the day', () => {
    fc.assert(
      fc.property(aJob, someDays, (packages, days) => {
        for (const day of planDays({ packages, days }).days) {
          const onlyPiece = sum(day.tasks.map((t) => t.quantity)) === 1
          expect(day.plannedMinutes <= day.availableMinutes || onlyPiece).toBe(true)
          if (day.availableMinutes === 0) expect(day.tasks).toEqual([])
        }
      }),
    )
  })

  test('never stands a piece before the day it is cut, whatever day has been started', () => {
    fc.assert(
      fc.property(aJob, someDays, fc.integer({ min: 0, max: 7 }), (packages, days, started) => {
        // A day started out of turn, as when tomorrow's cutting is ticked today.
        const before = planDays({ packages, days })
        const frozen = days.map((day, i) =>
          i === started ? { ...day, frozen: { tasks: before.days[i]?.tasks ?? [] } } : day,
        )
        const cut = new Set<string>()
        for (const day of planDays({ packages, days: frozen }).days) {
          for (const task of day.tasks) {
            if (task.work === 'cut') task.memberMarks.forEach((mark) => cut.add(mark))
          }
          for (const task of day.tasks) {
            if (task.work === 'stand')
              expect(task.memberMarks.filter((m) => !cut.has(m))).toEqual([])
          }
        }
      }),
    )
  })

  test('is the same plan for the same input', () => {
    fc.assert(
      fc.property(aJob, someDays, (packages, days) => {
        const again = planDays({ packages: structuredClone(packages), days: structuredClone(days) })
        expect(JSON.stringify(planDays({ packages, days }))).toBe(JSON.stringify(again))
      }),
    )
  })

  test('leaves a started day as it is and plans its pieces nowhere else', () => {
    fc.assert(
      fc.property(aJob, someDays, fc.integer({ min: 1, max: 900 }), (packages, days, fewer) => {
        const before = planDays({ packages, days })
        const first = before.days[0]
        if (!first) return
        const shorter = days.map((day, i) => ({
          ...day,
          crewMinutes: Math.max(0, day.crewMinutes - fewer),
          ...(i === 0 ? { frozen: { tasks: first.tasks } } : {}),
        }))
        const after = planDays({ packages, days: shorter })
        expect(after.days[0]?.tasks).toEqual(first.tasks)
        const all = piecesIn([...after.days.flatMap((d) => d.tasks), ...after.leftover])
        expect([...all].sort()).toEqual([...piecesOfJob(packages)].sort())
      }),
    )
  })

  test('never plans a ticked piece again', () => {
    fc.assert(
      fc.property(aJob, someDays, fc.nat(), (packages, days, seed) => {
        const cutMarks = packages.flatMap((p) =>
          p.steps.filter((s) => s.work === 'cut').flatMap((s) => s.memberMarks),
        )
        const ticked = cutMarks.filter((_, i) => (seed + i) % 3 === 0)
        const plan = planDays({ packages, days, done: { ...nothingDone, cut: new Set(ticked) } })
        const all = piecesIn([...plan.days.flatMap((d) => d.tasks), ...plan.leftover])
        expect(all.filter((piece) => ticked.some((mark) => piece === `cut ${mark}`))).toEqual([])
        expect(all).toHaveLength(piecesOfJob(packages).length - ticked.length)
      }),
    )
  })
})

const { cut, stand } = cutAndStand('C1', 10, 30, 10)
const smallJob: WorkPackage[] = [
  { key: 'cut-commons', title: 'Cut', steps: [cut], setUpMinutes: 0 },
  { key: 'hips', title: 'Stand', steps: [stand], setUpMinutes: 0 },
]

test('a line that does not fit is split over two days by pieces', () => {
  const plan = planDays({
    packages: smallJob,
    days: [
      { day: '2026-12-03', crewMinutes: 200 },
      { day: '2026-12-04', crewMinutes: 480 },
    ],
  })
  expect(plan.days.map((d) => d.tasks.map((t) => [t.work, t.quantity, t.plannedMinutes]))).toEqual([
    [['cut', 6, 180]],
    [
      ['cut', 4, 120],
      ['stand', 10, 100],
    ],
  ])
})

test('a booking too short says by how much', () => {
  const plan = planDays({ packages: smallJob, days: [{ day: '2026-12-03', crewMinutes: 240 }] })
  expect(plan.shortMinutes).toBe(160)
  expect(plan.spareMinutes).toBe(0)
  expect(plan.leftover.map((t) => [t.work, t.quantity])).toEqual([
    ['cut', 2],
    ['stand', 10],
  ])
})

test('a booking too long says how much is left', () => {
  const plan = planDays({
    packages: smallJob,
    days: [
      { day: '2026-12-03', crewMinutes: 480 },
      { day: '2026-12-04', crewMinutes: 480 },
    ],
  })
  expect(plan.shortMinutes).toBe(0)
  expect(plan.spareMinutes).toBe(560)
  expect(plan.days[1]?.tasks).toEqual([])
})

test('the keys of packages stand in the order crews work', () => {
  expect(packageKeys[0]).toBe('set-out-plates')
  expect(packageKeys.indexOf('first-pair')).toBeLessThan(packageKeys.indexOf('cut-commons'))
  expect(packageKeys.indexOf('ridge')).toBeLessThan(packageKeys.indexOf('hips'))
  expect(packageKeys.at(-1)).toBe('tails')
})

test('setting up for a package takes its minutes once, on the day its first piece is taken', () => {
  const [cutting, standing] = smallJob as [WorkPackage, WorkPackage]
  const packages = [
    { ...cutting, setUpMinutes: 20 },
    { ...standing, setUpMinutes: 40 },
  ]
  // By hand: 20 + 10 × 30 of cutting and 40 + 10 × 10 of standing make 460.
  const plan = planDays({
    packages,
    days: [
      { day: '2026-12-07', crewMinutes: 170 },
      { day: '2026-12-08', crewMinutes: 290 },
      { day: '2026-12-09', crewMinutes: 60 },
    ],
  })
  expect(plan.days.map((day) => day.plannedMinutes)).toEqual([170, 290, 0])
  expect(plan.days[0]?.tasks[0]).toMatchObject({ quantity: 5, plannedMinutes: 170 })
  expect(plan.days[1]?.tasks.map((task) => task.plannedMinutes)).toEqual([150, 140])
  expect(labourMinutes(packages)).toBe(460)
})

test('what each person starts the day with is not there for the roof, and never makes less than nothing', () => {
  expect(minutesForWork({ startUpMinutes: 0 }, { minutes: 960, people: 2 })).toBe(960)
  expect(minutesForWork({ startUpMinutes: 20 }, { minutes: 960, people: 2 })).toBe(920)
  expect(minutesForWork({ startUpMinutes: 60 }, { minutes: 30, people: 1 })).toBe(0)
})

test('what a day already begun still has to cut, to an older roof, is not stood on a day before it', () => {
  const { cut, stand } = cutAndStand('L0', 2, 30, 30)
  const packages: WorkPackage[] = [
    { key: 'cut-commons', title: 'Cut', steps: [cut], setUpMinutes: 0 },
    { key: 'hips', title: 'Stand', steps: [stand], setUpMinutes: 0 },
  ]
  const spokenFor = { ...nothingDone, cut: new Set(['L0-1', 'L0-2']) }
  const tuesday = { day: '2026-12-08', crewMinutes: 480 }
  const begun = {
    day: '2026-12-09',
    crewMinutes: 480,
    frozen: { tasks: [], cutThatDay: ['L0-1', 'L0-2'] },
  }
  const thursday = { day: '2026-12-10', crewMinutes: 480 }
  const { days } = planDays({ packages, days: [tuesday, begun, thursday], done: spokenFor })
  expect(days.map((day) => day.tasks.map((task) => [task.work, task.quantity]))).toEqual([
    [],
    [],
    [['stand', 2]],
  ])
})
