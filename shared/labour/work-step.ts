/** Packages in the order crews work; a day plan never jumps ahead. */
export const packageKeys = [
  'set-out-plates',
  'first-pair',
  'cut-commons',
  'ridge',
  'crown-ends',
  'hips',
  'remaining-commons',
  'creepers',
  'purlins',
  'tails',
] as const
export type PackageKey = (typeof packageKeys)[number]

export type Work = 'set-out' | 'cut' | 'stand'

/** One line of the cut list to cut or to stand, or one piece of set-out work. */
export type WorkStep = {
  packageKey: PackageKey
  work: Work
  /** Null for set-out work. */
  cutLineMark: string | null
  /** The pieces, in the order they are best taken; empty for set-out work, which counts as one piece. */
  memberMarks: string[]
  /** Minutes of one person for one piece. */
  minutesEach: number
  title: string
}

export type WorkPackage = {
  key: PackageKey
  title: string
  steps: WorkStep[]
  /** Setting up for it, once; goes with its first piece. */
  setUpMinutes: number
}

/** Pieces of a step: its members, or one for set-out work. */
export function stepPieces(step: Pick<WorkStep, 'memberMarks'>): number {
  return Math.max(1, step.memberMarks.length)
}

/** Minutes of one person for all of it. */
export function labourMinutes(packages: readonly WorkPackage[]): number {
  return packages.reduce(
    (sum, { steps, setUpMinutes }) =>
      sum +
      setUpMinutes +
      steps.reduce((own, step) => own + step.minutesEach * stepPieces(step), 0),
    0,
  )
}

/** Minutes of a day that are there for the roof: the crew's, less what each person starts the day with. */
export function minutesForWork(
  rates: { startUpMinutes: number },
  day: { minutes: number; people: number },
): number {
  return Math.max(0, day.minutes - rates.startUpMinutes * day.people)
}
