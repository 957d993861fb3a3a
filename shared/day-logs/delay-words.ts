import type { DelayReason } from './delay-reasons.ts'

export const delayReasonNames: Record<DelayReason, string> = {
  weather: 'Weather',
  'plates-not-ready': 'Plates or frames not ready',
  'edge-protection': 'Scaffold or edge protection not up',
  'timber-late': 'Timber late',
  'timber-wrong': 'Timber wrong or short',
  'other-trade': 'Another trade in the way',
  plant: 'Crane or plant',
  'plan-changed': 'Plan changed',
  access: 'No access to the site',
  other: 'Something else',
}
