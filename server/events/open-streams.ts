import type { Response } from 'express'

/** Tabs and devices of one person; more than anybody works with. */
const mostStreams = 12

/** The open streams of each person; one more than the most takes the place of the oldest. */
export function createOpenStreams() {
  const byPerson = new Map<string, Set<Response>>()
  return {
    add(personId: string, stream: Response): void {
      const open = byPerson.get(personId) ?? new Set()
      byPerson.set(personId, open.add(stream))
      const [oldest] = open
      if (open.size > mostStreams && oldest) {
        open.delete(oldest)
        // Said, so that the browser does not come straight back and push out the next.
        oldest.end('event: superseded\ndata: {}\n\n')
      }
    },
    remove(personId: string, stream: Response): void {
      const open = byPerson.get(personId)
      open?.delete(stream)
      if (open?.size === 0) byPerson.delete(personId)
    },
  }
}
