/** Time as an argument: the real one here, a set one in tests. No route sets it. */
export type Clock = { now(): Date }

export const systemClock: Clock = { now: () => new Date() }
