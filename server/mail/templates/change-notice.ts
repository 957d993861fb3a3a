import type { DayMail } from '../day-mail.ts'
import { closingBlock, dayBlocks } from './day-blocks.ts'
import { type MailBlock, type MailDocument, subjectLine } from './mail-document.ts'

export type ChangedDay = {
  mail: DayMail
  changes: string[]
  /** Not told of before. */
  isNew: boolean
  /** Its reminder has gone: what is cut that day was told too. */
  isReminded: boolean
}

const reminderBrings =
  'What is cut on which day can still shift. The reminder on the working day before says what holds.'

function dayList(days: readonly ChangedDay[]): string {
  const words = days.map(({ mail }) => mail.dayWords)
  const last = words.pop() ?? ''
  return words.length === 0 ? last : `${words.join(', ')} and ${last}`
}

function subjectOf(days: readonly ChangedDay[]): string {
  const [first] = days
  const what = days.every((day) => day.isNew) ? 'New' : 'Change'
  if (!first || days.length > 1) {
    const words = `${what}: ${dayList(days)}`
    return words.length <= 90
      ? words
      : `${what}: ${days.length} days from ${first?.mail.dayWords ?? ''}`
  }
  const { mail, changes } = first
  if (mail.bookings.length === 0) return `Change: ${mail.dayWords} is off`
  const [only] = changes
  return changes.length === 1 && only && only.length <= 70
    ? `${what} for ${mail.dayWords}: ${only}`
    : `${what} for ${mail.dayWords}`
}

function openingOf(days: readonly ChangedDay[], name: string): string {
  const [first] = days
  if (days.every((day) => day.isNew)) return `Hello ${name}, these days are now set for you.`
  return days.length === 1
    ? `Hello ${name}, ${first?.mail.dayWords ?? ''} has changed since the last mail.`
    : `Hello ${name}, ${days.length} of your days have changed since the last mail.`
}

function whatIsDifferent(days: readonly ChangedDay[]): MailBlock[] {
  if (days.length === 1) return [{ kind: 'list', items: days[0]?.changes ?? [] }]
  return days.flatMap(({ mail, changes }): MailBlock[] => [
    { kind: 'subheading', text: mail.dayWords },
    { kind: 'list', items: changes },
  ])
}

function asItStands({ mail, isNew, isReminded }: ChangedDay): MailBlock[] {
  if (mail.bookings.length === 0)
    return [{ kind: 'paragraph', text: `You have nothing else on for ${mail.dayWords}.` }]
  const text = isNew
    ? `${mail.dayWords} as it stands now.`
    : `${mail.dayWords} as it stands now; it takes the place of the mail before.`
  return [
    { kind: 'paragraph', text },
    ...dayBlocks(mail),
    ...(isReminded ? [] : [{ kind: 'paragraph' as const, text: reminderBrings }]),
  ]
}

/**
 * One mail for all of a person's days that changed: the net change first, then each day as it stands now,
 * with its numbers, so that the earlier mails can be forgotten.
 */
export function changeNoticeMail(days: readonly ChangedDay[]): MailDocument {
  const [first] = days
  if (!first) throw new Error('A notice needs a day.')
  return {
    subject: subjectLine(subjectOf(days)),
    blocks: [
      { kind: 'paragraph', text: openingOf(days, first.mail.personName) },
      { kind: 'heading', text: 'What is different' },
      ...whatIsDifferent(days),
      ...days.flatMap(asItStands),
      closingBlock(first.mail),
    ],
  }
}
