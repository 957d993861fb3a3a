/** What a job waits for, in the order a site comes to it. */
export const milestoneKinds = [
  'frames-up',
  'edge-protection-up',
  'timber-on-site',
  'frame-inspection',
  'fascia-and-gutter',
  'roof-cover',
] as const
export type MilestoneKind = (typeof milestoneKinds)[number]

/** Guessed by the office; asked of whoever brings it; promised by them; done. */
export const milestoneStates = ['guessed', 'asked', 'promised', 'done'] as const
export type MilestoneState = (typeof milestoneStates)[number]
