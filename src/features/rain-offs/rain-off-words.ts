import { daysBetween, formatDay } from '../../../shared/calendar/days.ts'
import type { MilestoneKind, MilestoneState } from '../../../shared/milestones/milestone-kinds.ts'
import { milestoneNames } from '../../../shared/milestones/milestone-rules.ts'
import type { PreviewMove, RainOffPreview } from '../../../shared/rain-offs/rain-off-schemas.ts'

export const countWords = (count: number, one: string, many = `${one}s`): string =>
  `${count} ${count === 1 ? one : many}`

export const workingDaysWords = (count: number): string => countWords(count, 'working day')

const mostNamed = 4
/** A day stays on one line. */
const unbroken = (day: string): string => formatDay(day).replaceAll(' ', '\u00a0')

/** 'Thu 3 Dec, Fri 4 Dec'; a long run by its ends and its number. */
export function daysWords(days: readonly string[]): string {
  const [first, last] = [days[0], days[days.length - 1]]
  if (first === undefined || last === undefined) return 'no day'
  if (days.length <= mostNamed) return days.map(unbroken).join(', ')
  return `${unbroken(first)} to ${unbroken(last)}, ${days.length} days`
}

const stateWords: Record<MilestoneState, string> = {
  guessed: 'guessed for',
  asked: 'asked for',
  promised: 'promised for',
  done: 'done on',
}

/** 'Timber on site: promised for Thu 3 Dec by Marrow Creek Timber'. */
export function milestoneWords(milestone: PreviewMove['milestones'][number]): string {
  const by = milestone.broughtBy ? ` by ${milestone.broughtBy}` : ''
  const when = `${stateWords[milestone.state]} ${formatDay(milestone.day)}`
  return `${milestoneNames[milestone.kind]}: ${when}${by}`
}

const afterFrame: readonly MilestoneKind[] = ['frame-inspection', 'fascia-and-gutter', 'roof-cover']

/** Whether what follows the frame would now come before it is done, and did not before. */
export function isOvertaken(move: PreviewMove, { kind, day }: PreviewMove['milestones'][number]) {
  const [before = '', after = ''] = [move.daysBefore, move.daysAfter].map((days) => days.at(-1))
  return afterFrame.includes(kind) && day > before && day <= after
}

/** Null while it is done by the day it is wanted, or would have been late all the same. */
export function lateWords({ wantedBy, daysAfter }: PreviewMove): string | null {
  const last = daysAfter[daysAfter.length - 1]
  if (wantedBy === null || last === undefined || last <= wantedBy) return null
  const late = countWords(daysBetween(wantedBy, last), 'day')
  return `Wanted by ${formatDay(wantedBy)}; its last day would be ${formatDay(last)}, ${late} later.`
}

/** '3 bookings move; 2 customers with firm days to be told; 1 delivery or trade touched.' */
export function summaryWords({ moves }: RainOffPreview): string {
  const customers = new Set(
    moves.filter((m) => m.state === 'firm').map((m) => m.customerName || m.job.number),
  ).size
  const deliveries = moves.reduce((sum, move) => sum + move.milestones.length, 0)
  const parts = [
    `${countWords(moves.length, 'booking moves', 'bookings move')}`,
    customers > 0 ? `${countWords(customers, 'customer')} with firm days to be told` : '',
    deliveries > 0
      ? `${countWords(deliveries, 'delivery or trade', 'deliveries and trades')} touched`
      : '',
  ]
  return `${parts.filter(Boolean).join('; ')}.`
}

/** Whether the crew was booked on any of the days lost. */
export function isBookedOnLost({ moves, stays, lostDays }: RainOffPreview): boolean {
  const booked = [...moves.flatMap((move) => move.daysBefore), ...stays.map((stay) => stay.day)]
  return booked.some((day) => lostDays.includes(day))
}
