import { type Day, daysBetween, formatDay } from '../calendar/days.ts'
import { finishOf, type Opening } from './find-days.ts'

const dayCount = (count: number): string => (count === 1 ? '1 day' : `${count} days`)

function wantedWords(finish: Day, wantedBy: Day | null): string {
  if (wantedBy === null) return ''
  const spare = daysBetween(finish, wantedBy)
  if (spare === 0) return 'That is the day it is wanted.'
  if (spare > 0) return `That is ${dayCount(spare)} before it is wanted.`
  return `That is ${dayCount(-spare)} after it is wanted.`
}

/** 'Fri 4 Dec' or 'Fri 4 Dec to Mon 7 Dec'. */
export function spanWords(days: readonly Day[]): string {
  const [first, last] = [days[0], days[days.length - 1]]
  if (first === undefined || last === undefined) return 'no day'
  return first === last ? formatDay(first) : `${formatDay(first)} to ${formatDay(last)}`
}

function movesWords({ moves }: Opening, jobOf: (bookingId: string) => string): string {
  if (moves.length === 0) return 'Nobody else moves.'
  return moves
    .map(
      ({ bookingId, daysBefore, daysAfter }) =>
        `${jobOf(bookingId)}, only pencilled, gives way: ${spanWords(daysAfter)} instead of ${spanWords(daysBefore)}.`,
    )
    .join(' ')
}

/** Why an opening is one of the best: its finish, whether it is in time, who moves, what it passes over. */
export function openingWords(
  opening: Opening,
  all: readonly Opening[],
  input: { wantedBy: Day | null; jobOf: (bookingId: string) => string },
): string {
  const isFirst = all[0] === opening
  const isFirstUnmoved = all.find((one) => one.moves.length === 0) === opening
  const best = isFirst ? ', the earliest there is' : ''
  const unmoved = !isFirst && isFirstUnmoved ? ', the earliest that moves nobody' : ''
  const passed = opening.passedOver.map(formatDay).join(', ')
  return [
    `Done ${formatDay(finishOf(opening))}${best}${unmoved}.`,
    wantedWords(finishOf(opening), input.wantedBy),
    movesWords(opening, input.jobOf),
    passed ? `Passes over ${passed}, when the crew cannot work.` : '',
  ]
    .filter(Boolean)
    .join(' ')
}
