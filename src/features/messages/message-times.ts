import { formatDay } from '../../../shared/calendar/days.ts'
import { localDayOf, localTimeOf } from '../../../shared/calendar/local-time.ts'
import type { Message } from '../../../shared/messages/message-schemas.ts'
import { kindWords } from '../../../shared/messages/message-words.ts'

/** 'Wed 2 Dec, 15:00' of the firm's clock. */
export function momentWords(iso: string, timeZone: string): string {
  const instant = new Date(iso)
  return `${formatDay(localDayOf(instant, timeZone))}, ${localTimeOf(instant, timeZone)}`
}

/** What it is about, before its text is written as well. */
export function messageTitle(message: Message): string {
  if (message.subject !== null) return message.subject
  const kind = kindWords[message.kind]
  return message.day === null ? kind : `${kind} for ${formatDay(message.day)}`
}
