import type { MemberRole } from '../roof/roof-types.ts'

/** Where a default figure comes from, in words for beside it. */
export type LabourSource = 'textbook' | 'practice' | 'none-added'

export const labourSourceWords: Record<LabourSource, string> = {
  textbook: 'textbook',
  practice: 'no source',
  'none-added': 'none added',
}

/** Long form, once a group. */
export const labourSourceNotes: Record<LabourSource, string> = {
  textbook:
    'Held to the textbook: together these come to 9.3–14.8 h for each m³ of a hip roof’s timber, 7.8–12.7 h of gable rafters (an estimating textbook, figure 13.55; excerpt seen, title not; converted from hours per 1000 board feet).',
  practice: 'Common practice, no source: correct them from your own days.',
  'none-added':
    'None added: the textbook’s hours are of whole jobs, setting up counted in. Put minutes here once your own days show them.',
}

const ownWork: readonly MemberRole[] = ['underpurlin', 'collar-tie', 'fascia', 'barge']

/** Rafters and lines are held to the textbook's hours per m³; purlins, ties, fascia and barges are not in it. */
export function pieceSource(role: MemberRole): LabourSource {
  return ownWork.includes(role) ? 'practice' : 'textbook'
}
