import type { Crew } from '../../../shared/people/people-schemas.ts'

export function crewName(crews: readonly Crew[], id: string | null): string {
  return crews.find((crew) => crew.id === id)?.name ?? 'no crew'
}
