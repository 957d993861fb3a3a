import type { Day } from '../../shared/calendar/days.ts'
import { carryOver } from '../../shared/day-plan/carry-over.ts'
import {
  type DayPlan,
  type DayToPlan,
  type DonePieces,
  type PlannedTask,
  planDays,
} from '../../shared/day-plan/day-plan.ts'
import type { LabourRates } from '../../shared/labour/labour-rates.ts'
import { workPackagesOf } from '../../shared/labour/work-packages.ts'
import { minutesForWork, packageKeys, type PackageKey } from '../../shared/labour/work-step.ts'
import type { FrameSpec } from '../../shared/roof/roof-types.ts'
import type { CrewHours } from './crew-hours.ts'
import type { JobDay, JobTask } from './job-plan-store.ts'

export type JobPlanInput = {
  days: readonly JobDay[]
  tasks: readonly JobTask[]
  /** What days not started are cut to; null before the first revision. */
  revisionId: string | null
  specs: ReadonlyMap<string, FrameSpec>
  rates: LabourRates
  hours: CrewHours
  today: Day
}

export type JobPlan = {
  plan: DayPlan
  /** The days that were planned or kept, in the plan's order. */
  days: { row: JobDay; started: boolean }[]
  /** Marks cut to an older revision that this one has no place for. */
  cutButUnused: { revisionId: string; marks: string[] }[]
}

/** Started: it has a tick, be it one taken back, or a log. */
export function startedDayIds(days: readonly JobDay[], tasks: readonly JobTask[]): Set<string> {
  const logged = days.filter((d) => d.logged).map((d) => d.id)
  return new Set([...logged, ...tasks.filter((t) => t.tickCount > 0).map((t) => t.bookingDayId)])
}

/**
 * Plans what is left of a job over its standing days from today on. Days past keep what was ticked; started
 * days keep all they hold.
 */
export function planJob(input: JobPlanInput): JobPlan {
  const { days, tasks, revisionId, specs, rates, hours, today } = input
  const spec = revisionId === null ? undefined : specs.get(revisionId)
  const started = startedDayIds(days, tasks)
  const ahead = days
    .filter((row) => !row.cancelled && row.day >= today)
    .map((row) => ({ row, started: started.has(row.id) }))
  const keptIds = new Set(ahead.filter((d) => d.started).map((d) => d.row.id))
  const cutButUnused: JobPlan['cutButUnused'] = []
  const done = emptyDone()
  /** Marks of this revision that a started day, cut to an older one, still has to cut. */
  const cutOn = new Map<string, string[]>()
  const revisionOf = new Map(days.map((row) => [row.id, row.revisionId]))
  for (const [id, there] of spec ? specs : []) {
    const ofRevision = tasks.filter((t) => revisionOf.get(t.bookingDayId) === id)
    const ticked = donePieces(ofRevision, (t) => t.tickSum)
    if (id === revisionId || !spec) {
      merge(done, ticked)
      continue
    }
    const onKept = ofRevision.filter((t) => keptIds.has(t.bookingDayId))
    const thereNow = carryOver(there, spec, ticked)
    if (thereNow.cutButUnused.length > 0)
      cutButUnused.push({ revisionId: id, marks: thereNow.cutButUnused })
    // A started day goes on as it is, so its pieces are spoken for, ticked or not.
    merge(ticked, heldPieces(onKept))
    const spokenFor = carryOver(there, spec, ticked).done
    const lastKept = ahead.filter((d) => onKept.some((t) => t.bookingDayId === d.row.id)).at(-1)
    if (lastKept) {
      const fresh = [...spokenFor.cut].filter((mark) => !thereNow.done.cut.has(mark))
      cutOn.set(lastKept.row.id, [...(cutOn.get(lastKept.row.id) ?? []), ...fresh])
    }
    merge(done, spokenFor)
  }
  const toPlan = ahead.map(({ row, started: isStarted }): DayToPlan => {
    const { minutes, thereIds } = hours.on(row.crewId, row.day)
    const crewMinutes = minutesForWork(rates, { minutes, people: thereIds.length })
    if (!isStarted) return { day: row.day, crewMinutes }
    const own = row.revisionId === revisionId ? tasks.filter((t) => t.bookingDayId === row.id) : []
    return {
      day: row.day,
      crewMinutes,
      frozen: { tasks: own.flatMap(asPlanned), cutThatDay: cutOn.get(row.id) },
    }
  })
  const packages = spec ? workPackagesOf(spec, rates) : []
  return { plan: planDays({ packages, days: toPlan, done }), days: ahead, cutButUnused }
}

type MutableDone = { cut: Set<string>; stood: Set<string>; setOut: Set<PackageKey> }

function emptyDone(): MutableDone {
  return { cut: new Set(), stood: new Set(), setOut: new Set() }
}

function isPackageKey(key: string): key is PackageKey {
  return (packageKeys as readonly string[]).includes(key)
}

/** The first so many pieces of each task; a piece that stands has been cut. */
export function donePieces(
  tasks: readonly JobTask[],
  piecesOf: (task: JobTask) => number,
): MutableDone {
  const done = emptyDone()
  for (const task of tasks) {
    const pieces = Math.max(0, Math.min(task.quantity, piecesOf(task)))
    const marks = task.memberMarks.slice(0, pieces)
    if (task.work === 'set-out' && pieces > 0 && isPackageKey(task.packageKey))
      done.setOut.add(task.packageKey)
    for (const mark of marks) {
      if (task.work === 'stand') done.stood.add(mark)
      done.cut.add(mark)
    }
  }
  return done
}

/** What tasks hold, done or not: a piece to be stood is not cut by that. */
function heldPieces(tasks: readonly JobTask[]): MutableDone {
  const held = emptyDone()
  for (const task of tasks) {
    if (task.work === 'set-out' && isPackageKey(task.packageKey)) held.setOut.add(task.packageKey)
    for (const mark of task.memberMarks) (task.work === 'stand' ? held.stood : held.cut).add(mark)
  }
  return held
}

function merge(into: MutableDone, from: DonePieces): void {
  for (const mark of from.cut) into.cut.add(mark)
  for (const mark of from.stood) into.stood.add(mark)
  for (const key of from.setOut) into.setOut.add(key)
}

function asPlanned(task: JobTask): PlannedTask[] {
  const { packageKey, work, cutLineMark, memberMarks, title, quantity, plannedMinutes } = task
  if (!isPackageKey(packageKey)) return []
  return [{ packageKey, work, cutLineMark, memberMarks, title, quantity, plannedMinutes }]
}
