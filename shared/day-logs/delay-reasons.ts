/** Why hours were lost on a day. */
export const delayReasons = [
  'weather',
  'plates-not-ready',
  'edge-protection',
  'timber-late',
  'timber-wrong',
  'other-trade',
  'plant',
  'plan-changed',
  'access',
  'other',
] as const
export type DelayReason = (typeof delayReasons)[number]
