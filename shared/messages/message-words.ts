export const messageKinds = [
  'crew-reminder',
  'change-notice',
  'password-reset',
  'invitation',
] as const
export type MessageKind = (typeof messageKinds)[number]

export const messageStates = [
  'waiting',
  'sending',
  'sent',
  'maybe-twice',
  'failed',
  'dropped',
] as const
export type MessageState = (typeof messageStates)[number]

export const kindWords: Record<MessageKind, string> = {
  'crew-reminder': 'Reminder',
  'change-notice': 'Change notice',
  'password-reset': 'Password reset',
  invitation: 'Invitation',
}

/** Why a mail was dropped; stored beside it. */
export const mailTooLate = 'Work had started before it could be sent.'
export const mailNotNeeded = 'There was nothing left to say by the time it was due.'

const stateWordsOf: Record<MessageState, string> = {
  waiting: 'Waiting',
  sending: 'Sending',
  sent: 'Sent',
  'maybe-twice': 'Sent, maybe twice',
  failed: 'Failed',
  dropped: 'Not sent',
}

/** For filters. */
export function stateWords(state: MessageState): string {
  return stateWordsOf[state]
}

/** For one message: a dropped one says why. */
export function messageStateWords(state: MessageState, lastError: string | null): string {
  if (state !== 'dropped') return stateWordsOf[state]
  return lastError === mailNotNeeded ? 'Not sent: not needed any more' : 'Not sent: too late'
}
