import type { BookingStep } from './booking-steps.ts'

export type BookingHistory = { done: readonly BookingStep[]; undone: readonly BookingStep[] }

const longest = 100

const without = (steps: readonly BookingStep[], id: string) => steps.filter((s) => s.id !== id)

/** What was done and taken back in this sitting; it tells whoever listens. */
export function createBookingHistory() {
  let now: BookingHistory = { done: [], undone: [] }
  const versions = new Map<string, number>()
  const listeners = new Set<() => void>()
  const set = (next: BookingHistory) => {
    now = next
    for (const listener of listeners) listener()
  }
  return {
    read: (): BookingHistory => now,
    subscribe(listener: () => void): () => void {
      listeners.add(listener)
      return () => void listeners.delete(listener)
    },
    did(step: BookingStep) {
      set({ done: [...without(now.done, step.id), step].slice(-longest), undone: [] })
    },
    wentBack(step: BookingStep) {
      set({ done: without(now.done, step.id), undone: [...without(now.undone, step.id), step] })
    },
    wentOn(step: BookingStep) {
      set({ done: [...without(now.done, step.id), step], undone: without(now.undone, step.id) })
    },
    /** It cannot be gone back to, or on to, any more. */
    forget(id: string) {
      set({ done: without(now.done, id), undone: without(now.undone, id) })
    },
    /** The version that a booking has had since a change made here; the one given when none was. */
    versionOf: (part: { id: string; version: number }): number =>
      Math.max(part.version, versions.get(part.id) ?? 0),
    sawVersion(id: string, version: number) {
      versions.set(id, version)
    },
  }
}

export type BookingHistoryStore = ReturnType<typeof createBookingHistory>
