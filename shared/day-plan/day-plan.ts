import type { Day } from '../calendar/days.ts'
import { groupBy } from '../collections/group-by.ts'
import {
  stepPieces,
  type PackageKey,
  type WorkPackage,
  type WorkStep,
} from '../labour/work-step.ts'

/** A share of a step, as one day holds it. */
export type PlannedTask = Omit<WorkStep, 'minutesEach'> & {
  quantity: number
  plannedMinutes: number
}

/** A day to fill. A frozen one has been started: it keeps its tasks, and their pieces count as placed. */
export type DayToPlan = {
  day: Day
  crewMinutes: number
  frozen?:
    | {
        tasks: PlannedTask[]
        /** Marks in `done.cut` that are only cut on this day, to another revision: none stands before it. */
        cutThatDay?: readonly string[]
      }
    | undefined
}

/** What has been ticked already, in marks of the roof being planned. */
export type DonePieces = {
  cut: ReadonlySet<string>
  stood: ReadonlySet<string>
  setOut: ReadonlySet<PackageKey>
}

export const nothingDone: DonePieces = { cut: new Set(), stood: new Set(), setOut: new Set() }

export type PlannedDay = {
  day: Day
  tasks: PlannedTask[]
  plannedMinutes: number
  availableMinutes: number
}

export type DayPlan = {
  /** One for each day given, in its order. */
  days: PlannedDay[]
  /** What no day has room for. */
  leftover: PlannedTask[]
  /** Minutes of one person that no day has room for: the booking is too short. */
  shortMinutes: number
  /** Minutes there on days not started but not needed: the booking is too long once this makes a day. */
  spareMinutes: number
}

/** `minutes` are the piece's own and, with the first of a package, those of setting up for it. */
type Piece = { step: WorkStep; mark: string | null; minutes: number }

/** Minutes are sums of the firm's rates, which need not be whole. */
const minuteToleranceMin = 1e-6

/**
 * Fills the days in their order with the packages in theirs, piece by piece: a line that does not fit is
 * split, nothing overtakes, and no piece is stood before the day it is cut. A piece longer than a whole day
 * takes an empty one. The same input gives the same plan.
 *
 * `days` are ascending; two crews on one day are two entries.
 */
export function planDays(input: {
  packages: readonly WorkPackage[]
  days: readonly DayToPlan[]
  done?: DonePieces
}): DayPlan {
  const done = input.done ?? nothingDone
  const frozenPieces = placedOn(input.days)
  let queue = piecesOf(input.packages).filter((p) => !isIn(done, p) && !isIn(frozenPieces, p))
  const cutLater = new Set(input.days.flatMap((day) => day.frozen?.cutThatDay ?? []))
  const cutSoFar = new Set([...done.cut].filter((mark) => !cutLater.has(mark)))
  const days = input.days.map((day): PlannedDay => {
    const taken = day.frozen ? [] : takeDay(queue, day.crewMinutes, cutSoFar)
    queue = queue.slice(taken.length)
    const tasks = day.frozen?.tasks ?? tasksOf(taken)
    addCut(cutSoFar, tasks)
    for (const mark of day.frozen?.cutThatDay ?? []) cutSoFar.add(mark)
    return {
      day: day.day,
      tasks,
      plannedMinutes: minutesOf(tasks),
      availableMinutes: day.crewMinutes,
    }
  })
  const leftover = tasksOf(queue)
  const shortMinutes = minutesOf(leftover)
  return { days, leftover, shortMinutes, spareMinutes: spareOf(input.days, days, shortMinutes) }
}

function piecesOf(packages: readonly WorkPackage[]): Piece[] {
  return packages.flatMap(({ steps, setUpMinutes }) => {
    const pieces = steps.flatMap((step): Piece[] => {
      const marks = step.memberMarks.length === 0 ? [null] : step.memberMarks
      return marks.map((mark) => ({ step, mark, minutes: step.minutesEach }))
    })
    return pieces.map((piece, i) =>
      i === 0 ? { ...piece, minutes: piece.minutes + setUpMinutes } : piece,
    )
  })
}

function takeDay(
  queue: readonly Piece[],
  minutes: number,
  cutBefore: ReadonlySet<string>,
): Piece[] {
  if (minutes <= 0) return []
  const cut = new Set(cutBefore)
  let left = minutes
  let count = 0
  for (const piece of queue) {
    const fits = piece.minutes <= left + minuteToleranceMin || count === 0
    if (!fits || (piece.step.work === 'stand' && !cut.has(piece.mark ?? ''))) break
    if (piece.step.work === 'cut' && piece.mark !== null) cut.add(piece.mark)
    left -= piece.minutes
    count++
  }
  return queue.slice(0, count)
}

function tasksOf(pieces: readonly Piece[]): PlannedTask[] {
  const piecesByStep = groupBy(pieces, (piece) => piece.step)
  return [...piecesByStep].map(([step, own]) => {
    const { packageKey, work, cutLineMark, title } = step
    const memberMarks = own.flatMap(({ mark }) => mark ?? [])
    return {
      packageKey,
      work,
      cutLineMark,
      title,
      memberMarks,
      quantity: stepPieces({ memberMarks }),
      plannedMinutes: own.reduce((sum, piece) => sum + piece.minutes, 0),
    }
  })
}

function placedOn(days: readonly DayToPlan[]): DonePieces {
  const [cut, stood, setOut] = [new Set<string>(), new Set<string>(), new Set<PackageKey>()]
  for (const task of days.flatMap((day) => day.frozen?.tasks ?? [])) {
    if (task.work === 'set-out') setOut.add(task.packageKey)
    for (const mark of task.memberMarks) (task.work === 'cut' ? cut : stood).add(mark)
  }
  return { cut, stood, setOut }
}

function isIn(pieces: DonePieces, { step, mark }: Piece): boolean {
  if (mark === null) return pieces.setOut.has(step.packageKey)
  return (step.work === 'cut' ? pieces.cut : pieces.stood).has(mark)
}

function addCut(cut: Set<string>, tasks: readonly PlannedTask[]): void {
  for (const task of tasks) {
    if (task.work === 'cut') for (const mark of task.memberMarks) cut.add(mark)
  }
}

function minutesOf(tasks: readonly PlannedTask[]): number {
  return tasks.reduce((sum, task) => sum + task.plannedMinutes, 0)
}

function spareOf(
  given: readonly DayToPlan[],
  planned: readonly PlannedDay[],
  shortMinutes: number,
): number {
  if (shortMinutes > 0) return 0
  return planned.reduce(
    (sum, day, i) =>
      given[i]?.frozen ? sum : sum + Math.max(0, day.availableMinutes - day.plannedMinutes),
    0,
  )
}
