import { type Day, formatDay } from '../calendar/days.ts'
import type { MilestoneKind } from '../milestones/milestone-kinds.ts'
import type { LeaveKind } from '../people/leave-kinds.ts'
import type { TicketKind } from '../people/ticket-kinds.ts'
import type { ClashMilestone } from './clash-facts.ts'
import type { ClashCode } from './clash-schemas.ts'

/** In a word or two, for a cell of the calendar. */
export const clashShortWords: Record<ClashCode, string> = {
  'crew-twice': 'Crew booked twice',
  'nobody-there': 'Nobody there',
  'apprentice-alone': 'Apprentice alone',
  'ticket-lapsed': 'Ticket not in order',
  'before-frames': 'Before frames',
  'before-edge-protection': 'Before edge protection',
  'before-timber': 'Before timber',
  'too-short': 'Too short',
  'no-roof': 'No roof issued yet',
  'roof-revised': 'Roof revised',
  'on-leave': 'Somebody away',
  'day-not-worked': 'Day not worked',
  'crew-twice-on-purpose': 'Two jobs, on purpose',
}

/** 'Ines', 'Ines and Bo', 'Ines, Bo and Rhys'. */
export function namesInWords(names: readonly string[]): string {
  const last = names[names.length - 1] ?? ''
  if (names.length < 2) return last
  return `${names.slice(0, -1).join(', ')} and ${last}`
}

export const ticketWords: Record<TicketKind, string> = {
  'working-at-heights': 'working at heights',
  'construction-induction': 'construction induction',
  'first-aid': 'first aid',
  'elevated-platform': 'elevated platform',
  'driver-licence': 'driver licence',
  'trade-licence': 'trade licence',
  other: 'another ticket',
}

export const awayWords: Record<LeaveKind, string> = {
  leave: 'On leave',
  sick: 'Off sick',
  'trade-school': 'At trade school',
  other: 'Away',
}

/** The milestones a first day waits for. */
export const neededFirst = {
  'frames-up': {
    code: 'before-frames',
    what: 'Frames',
    verb: 'are',
    bringer: 'whoever stands them',
  },
  'edge-protection-up': {
    code: 'before-edge-protection',
    what: 'Edge protection',
    verb: 'is',
    bringer: 'whoever puts it up',
  },
  'timber-on-site': { code: 'before-timber', what: 'Timber', verb: 'is', bringer: 'the yard' },
} as const satisfies Partial<
  Record<MilestoneKind, { code: ClashCode; what: string; verb: string; bringer: string }>
>
export type NeededFirst = keyof typeof neededFirst

const stateVerbs: Record<ClashMilestone['state'], string> = {
  guessed: 'guessed for',
  asked: 'asked for',
  promised: 'promised for',
  done: 'done on',
}

export function milestoneTooLate(
  kind: NeededFirst,
  { state, broughtBy }: ClashMilestone,
  day: Day,
): { text: string; wayOut: string } {
  const { what, verb, bringer } = neededFirst[kind]
  return {
    text: `${what} ${verb} ${stateVerbs[state]} ${formatDay(day)}, after the first day.`,
    wayOut: `Start on ${formatDay(day)} or later, or get an earlier day from ${broughtBy || bringer}.`,
  }
}

export function milestoneWithoutDay(
  kind: NeededFirst,
  { broughtBy }: ClashMilestone,
): { text: string; wayOut: string } {
  const { what, bringer } = neededFirst[kind]
  return {
    text: `${what}: no day yet.`,
    wayOut: `Ask ${broughtBy || bringer} for a day and set it on the job.`,
  }
}
