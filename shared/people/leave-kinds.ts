/** Why a person is away. */
export const leaveKinds = ['leave', 'sick', 'trade-school', 'other'] as const
export type LeaveKind = (typeof leaveKinds)[number]
