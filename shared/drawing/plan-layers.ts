import type { MemberRole } from '../roof/roof-types.ts'

/** What of the plan can be shown or put away by itself. */
export type PlanLayer = 'rafters' | 'underpurlins' | 'collar-ties' | 'eaves'

export const planLayerWords: Record<PlanLayer, string> = {
  rafters: 'Rafters',
  underpurlins: 'Underpurlins',
  'collar-ties': 'Collar ties',
  eaves: 'Fascia and barges',
}

export const planLayers: readonly PlanLayer[] = ['rafters', 'underpurlins', 'collar-ties', 'eaves']

/** Ridges, hips and valleys carry the roof's shape and always show. */
export function planLayerOf(role: MemberRole): PlanLayer | null {
  switch (role) {
    case 'underpurlin':
      return 'underpurlins'
    case 'collar-tie':
      return 'collar-ties'
    case 'fascia':
    case 'barge':
      return 'eaves'
    case 'ridge':
    case 'hip':
    case 'broken-hip':
    case 'valley':
      return null
    default:
      return 'rafters'
  }
}

/** The layers a roof has, where there is more than the frame itself to tell apart. */
export function planLayersIn(members: readonly { role: MemberRole }[]): PlanLayer[] {
  const found = new Set(members.map((member) => planLayerOf(member.role)))
  const present = planLayers.filter((layer) => found.has(layer))
  return present.some((layer) => layer !== 'rafters') ? present : []
}

/** Whether a timber shows; a picked one and those due do whatever is put away. */
export function isOnPlan(
  member: { mark: string; role: MemberRole },
  hiddenLayers: ReadonlySet<PlanLayer>,
  firstMarks: ReadonlySet<string>,
): boolean {
  const layer = planLayerOf(member.role)
  return layer === null || !hiddenLayers.has(layer) || firstMarks.has(member.mark)
}
