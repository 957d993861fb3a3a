const minuteMs = 60_000
const longestMinutes = 60

/** Tries before a mail is given up: some fifteen hours, so that a server down all night costs no reminder. */
export const mostAttempts = 21

/** Wait after the nth failed try (1, 2 …): 1, 2, 4 … minutes, at most an hour. */
export function backOffMs(attempts: number): number {
  return Math.min(2 ** (attempts - 1), longestMinutes) * minuteMs
}
