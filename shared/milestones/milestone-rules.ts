import type { Day } from '../calendar/days.ts'
import type { MilestoneKind, MilestoneState } from './milestone-kinds.ts'
import type { Milestone } from './milestone-schemas.ts'

export const milestoneNames: Record<MilestoneKind, string> = {
  'frames-up': 'Frames up',
  'edge-protection-up': 'Edge protection up',
  'timber-on-site': 'Timber on site',
  'frame-inspection': 'Frame inspection',
  'fascia-and-gutter': 'Fascia and gutter',
  'roof-cover': 'Roof cover',
}

export const milestoneStateNames: Record<MilestoneState, string> = {
  guessed: 'Guessed',
  asked: 'Asked for',
  promised: 'Promised',
  done: 'Done',
}

/** A milestone of a job nobody has said anything of. */
export function blankMilestone(kind: MilestoneKind): Milestone {
  return { kind, day: null, state: 'guessed', broughtBy: '', note: '', version: 0 }
}

/** Whether anything has been said: a guess without a day, a bringer or a word is none. */
export function isMilestoneKept(milestone: Omit<Milestone, 'kind' | 'version'>): boolean {
  const { day, state, broughtBy, note } = milestone
  return day !== null || state !== 'guessed' || broughtBy !== '' || note !== ''
}

/**
 * What pressing a state makes of a milestone. Done is done on a day that has come: one still ahead, or
 * none, becomes today. A promise or a guess keeps the day it has.
 */
export function pressedState(
  milestone: Pick<Milestone, 'day'>,
  state: MilestoneState,
  today: Day,
): { state: MilestoneState; day: Day | null } {
  const { day } = milestone
  if (state !== 'done') return { state, day }
  return { state, day: day === null || day > today ? today : day }
}
