import { isoWeekday } from '../../shared/calendar/days.ts'
import type { LabourRates } from '../../shared/labour/labour-rates.ts'
import { workPackagesOf } from '../../shared/labour/work-packages.ts'
import { packageKeys } from '../../shared/labour/work-step.ts'
import { memberShapeKey } from '../../shared/day-plan/member-shape.ts'
import type { FrameSpec } from '../../shared/roof/roof-types.ts'

// What a plan has to keep to, each as a function that names the faults of one. No outside source: these are
// the words of the trade's working order, of issue 4 and of product.md ("From roof to days", "Revisions").

export type SeenTask = {
  id: string
  dayId: string
  packageKey: string
  work: string
  memberMarks: string[]
  plannedMinutes: number
  assignedToId: string | null
  /** Pieces done, and the ticks they are the sum of. */
  ticked: number
  tickIds: string[]
}

export type SeenDay = {
  id: string
  bookingId: string
  crewId: string
  day: string
  revisionId: string | null
  tasks: SeenTask[]
}

/** One job's days, in the order its crews come to them. */
export type SeenJob = {
  days: SeenDay[]
  shortMinutes: number
  revisionId: string
  specs: ReadonlyMap<string, FrameSpec>
}

/** The firm as it was drawn, read without the code under test. */
export type SeenFirm = {
  today: string
  workingWeekdays: number[]
  daysOff: string[]
  rates: LabourRates
  /** Who is there of a crew on a day, and the minutes there are for the work. */
  crewOn(crewId: string, day: string): { personIds: string[]; minutes: number }
}

const isStarted = (day: SeenDay) => day.tasks.some((task) => task.tickIds.length > 0)
const pieceOf = (task: Pick<SeenTask, 'work' | 'packageKey'>, mark: string | null) =>
  mark === null ? `set-out ${task.packageKey}` : `${task.work} ${mark}`
const piecesOf = (task: SeenTask): string[] =>
  task.memberMarks.length === 0
    ? [pieceOf(task, null)]
    : task.memberMarks.map((mark) => pieceOf(task, mark))
/** The first so many are done, and what stands has been cut. */
const donePieces = (task: SeenTask): string[] =>
  piecesOf(task)
    .slice(0, Math.max(0, task.ticked))
    .flatMap((piece) =>
      piece.startsWith('stand ') ? [piece, piece.replace('stand', 'cut')] : piece,
    )

/** Days the plan fills, and days begun that still hold what they held. */
const ahead = (firm: SeenFirm, job: SeenJob) => job.days.filter((day) => day.day >= firm.today)
const planned = (firm: SeenFirm, job: SeenJob) => ahead(firm, job).filter((day) => !isStarted(day))
const begun = (firm: SeenFirm, job: SeenJob) => ahead(firm, job).filter(isStarted)

function minutesByPiece(spec: FrameSpec, rates: LabourRates): Map<string, number> {
  const minutes = new Map<string, number>()
  for (const { steps, setUpMinutes } of workPackagesOf(spec, rates)) {
    const pieces = steps.flatMap((step) => {
      const marks = step.memberMarks.length === 0 ? [null] : step.memberMarks
      return marks.map((mark) => ({ piece: pieceOf(step, mark), minutes: step.minutesEach }))
    })
    for (const [i, own] of pieces.entries())
      minutes.set(own.piece, own.minutes + (i === 0 ? setUpMinutes : 0))
  }
  return minutes
}

/** Whole minutes are stored: half a minute a task either way, and what is short is rounded up. */
const roundingMin = (tasks: number) => 0.5 * tasks + 1

/**
 * Every piece of the newest roof is done, or held by a day begun, or planned on one day, or its minutes are
 * counted as short. For a job all of whose work is to one revision.
 */
export function placedOrShort(firm: SeenFirm, job: SeenJob): string[] {
  const spec = job.specs.get(job.revisionId)
  if (!spec) return ['no frame spec']
  const minutes = minutesByPiece(spec, firm.rates)
  const tasks = planned(firm, job).flatMap((day) => day.tasks)
  const held = new Set([
    ...job.days.flatMap((day) => day.tasks.flatMap(donePieces)),
    ...begun(firm, job).flatMap((day) => day.tasks.flatMap(piecesOf)),
  ])
  const faults: string[] = []
  const there = new Set(held)
  for (const piece of tasks.flatMap(piecesOf)) {
    if (!minutes.has(piece)) faults.push(`${piece} is no piece of this roof`)
    if (there.has(piece)) faults.push(`${piece} is planned twice, or again after it was done`)
    there.add(piece)
  }
  const sum = (pieces: readonly string[]) =>
    pieces.reduce((total, piece) => total + (minutes.get(piece) ?? 0), 0)
  for (const task of tasks) {
    if (Math.abs(task.plannedMinutes - sum(piecesOf(task))) > roundingMin(0))
      faults.push(`${task.plannedMinutes} min are down for ${piecesOf(task).join(', ')}`)
  }
  const missing = sum([...minutes.keys()].filter((piece) => !there.has(piece)))
  if (Math.abs(missing - job.shortMinutes) > roundingMin(0))
    faults.push(`${missing} min are on no day, ${job.shortMinutes} are counted short`)
  return faults
}

function shapesOf({ specs }: SeenJob) {
  const byRevision = new Map(
    [...specs].map(([id, { members }]) => [
      id,
      new Map(members.map((member) => [member.mark, memberShapeKey(member)])),
    ]),
  )
  return {
    /** Of a piece cut or stood to a revision. */
    of: (revisionId: string | null, piece: string): string =>
      byRevision.get(revisionId ?? '')?.get(piece.replace(/^(cut|stand) /, '')) ?? 'none',
    all: (revisionId: string): string[] => [...(byRevision.get(revisionId)?.values() ?? [])],
  }
}

const counted = (shapes: readonly string[]): Map<string, number> => {
  const byShape = new Map<string, number>()
  for (const shape of shapes) byShape.set(shape, (byShape.get(shape) ?? 0) + 1)
  return byShape
}

/**
 * Pieces cut to any revision serve alike pieces of the newest: of each shape as many are planned to be cut
 * as the roof has, less those there; fewer only where minutes are short.
 */
export function cutOnceByShape(firm: SeenFirm, job: SeenJob): string[] {
  const shapes = shapesOf(job)
  const isBegun = new Set(begun(firm, job))
  const had = new Map<string, string>()
  for (const day of job.days) {
    const held = isBegun.has(day) ? day.tasks.flatMap(piecesOf) : []
    for (const piece of [...day.tasks.flatMap(donePieces), ...held])
      if (piece.startsWith('cut '))
        had.set(`${day.revisionId} ${piece}`, shapes.of(day.revisionId, piece))
  }
  const there = counted([...had.values()])
  const toCut = counted(
    planned(firm, job)
      .flatMap((day) => day.tasks.flatMap(piecesOf))
      .filter((piece) => piece.startsWith('cut '))
      .map((piece) => shapes.of(job.revisionId, piece)),
  )
  return [...counted(shapes.all(job.revisionId))].flatMap(([shape, count]) => {
    const open = Math.max(0, count - (there.get(shape) ?? 0))
    const cut = toCut.get(shape) ?? 0
    const fits = job.shortMinutes > 0 ? cut <= open : cut === open
    return fits ? [] : [`${cut} are planned to be cut, ${open} are needed, of ${shape}`]
  })
}

/** No day booked, no task and no hand on a day that is not worked; no day fuller than the crew that is there. */
export function nothingOnADayOff(firm: SeenFirm, job: SeenJob): string[] {
  const faults = job.days.flatMap(({ day }) =>
    firm.daysOff.includes(day) || !firm.workingWeekdays.includes(isoWeekday(day))
      ? [`${day} is booked and is a day off`]
      : [],
  )
  for (const { crewId, day, tasks } of planned(firm, job)) {
    const { personIds, minutes } = firm.crewOn(crewId, day)
    const filled = tasks.reduce((sum, task) => sum + task.plannedMinutes, 0)
    const isOnePiece = tasks.flatMap(piecesOf).length === 1
    if (minutes <= 0 && tasks.length > 0) faults.push(`${day} has work and nobody there`)
    if (filled > minutes + roundingMin(tasks.length) && !isOnePiece)
      faults.push(`${day} holds ${filled} min, ${minutes} are there`)
    for (const { assignedToId } of tasks)
      if (assignedToId !== null && !personIds.includes(assignedToId))
        faults.push(`${day} gives a task to someone who is away`)
  }
  return faults
}

/** From day to day and down each day, packages come in the order crews work. */
export function packagesInOrder(firm: SeenFirm, job: SeenJob): string[] {
  const keys = planned(firm, job).flatMap((day) => day.tasks.map((task) => task.packageKey))
  return keys.flatMap((key, i) => {
    const before = keys[i - 1]
    const at = (name: string) => (packageKeys as readonly string[]).indexOf(name)
    return before !== undefined && at(key) < at(before) ? [`${key} comes after ${before}`] : []
  })
}

/**
 * What is planned to stand is cut earlier that day, on a day before, or is there already; a piece cut to an
 * older revision serves one alike piece.
 */
export function stoodAfterCut(firm: SeenFirm, job: SeenJob): string[] {
  const shapes = shapesOf(job)
  const cut = new Set<string>()
  const older = new Map<string, string>()
  const take = (day: SeenDay, pieces: readonly string[]) => {
    for (const piece of pieces) {
      if (day.revisionId === job.revisionId) cut.add(piece)
      else if (piece.startsWith('cut '))
        older.set(`${day.revisionId} ${piece}`, shapes.of(day.revisionId, piece))
    }
  }
  for (const day of job.days) take(day, day.tasks.flatMap(donePieces))
  const faults: string[] = []
  for (const day of ahead(firm, job)) {
    for (const piece of day.tasks.flatMap(piecesOf)) {
      take(day, [piece])
      if (isStarted(day) || !piece.startsWith('stand ')) continue
      if (cut.has(piece.replace('stand', 'cut'))) continue
      const alike = [...older].find(([, shape]) => shape === shapes.of(day.revisionId, piece))
      if (alike) older.delete(alike[0])
      else faults.push(`${piece} on ${day.day}, before it is cut`)
    }
  }
  return faults
}

/** A day begun keeps its date, its revision, its tasks and their minutes. */
export function startedDaysKept(before: readonly SeenDay[], after: readonly SeenDay[]): string[] {
  const now = new Map(after.map((day) => [day.id, JSON.stringify(day)]))
  return before
    .filter(isStarted)
    .flatMap((day) => (now.get(day.id) === JSON.stringify(day) ? [] : [`${day.day} was changed`]))
}

/** Every tick is still there, for the same pieces of the same revision. */
export function ticksKept(before: readonly SeenDay[], after: readonly SeenDay[]): string[] {
  const ticksOf = (days: readonly SeenDay[]) =>
    days.flatMap((day) =>
      day.tasks.flatMap((task) =>
        task.tickIds.map((id) => {
          const done = donePieces(task).join()
          return [id, `${day.revisionId ?? ''} ${task.work} ${done}`] as const
        }),
      ),
    )
  const now = new Map(ticksOf(after))
  return ticksOf(before).flatMap(([id, words]) => (now.get(id) === words ? [] : [`lost: ${words}`]))
}
