import { type Day, dayPlus } from '../calendar/days.ts'

export type CrewMove = { crewId: string | null; from: Day }
export type CrewMembership = { crewId: string; startsOn: Day; endsOn: Day | null }

/**
 * The moves which, made one after the other from `from` on, give the memberships as they were: what undoing
 * a move takes. `from` and the days between two memberships are said too, as being in no crew.
 */
export function movesGiving(memberships: readonly CrewMembership[], from: Day): CrewMove[] {
  const ahead = memberships
    .filter((row) => row.endsOn === null || row.endsOn >= from)
    .sort((a, b) => (a.startsOn < b.startsOn ? -1 : 1))
  const moves: CrewMove[] = []
  let next = from
  for (const { crewId, startsOn, endsOn } of ahead) {
    const start = startsOn > from ? startsOn : from
    if (start > next) moves.push({ crewId: null, from: next })
    moves.push({ crewId, from: start })
    if (endsOn === null) return moves
    next = dayPlus(endsOn, 1)
  }
  return [...moves, { crewId: null, from: next }]
}
