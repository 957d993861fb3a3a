import type { DayMail } from '../day-mail.ts'
import { closingBlock, dayBlocks } from './day-blocks.ts'
import { type MailBlock, type MailDocument, subjectLine } from './mail-document.ts'

function subjectOf(mail: DayMail, changes: string[]): string {
  if (mail.bookings.length === 0) return `Change: ${mail.dayWords} is off`
  const [only] = changes
  return changes.length === 1 && only && only.length <= 70
    ? `Change for ${mail.dayWords}: ${only}`
    : `Change for ${mail.dayWords}`
}

/** The net change first, then the whole day as it stands now, so that the earlier mail can be forgotten. */
export function changeNoticeMail(mail: DayMail, changes: string[]): MailDocument {
  const now: MailBlock[] =
    mail.bookings.length === 0
      ? [{ kind: 'paragraph', text: `You have nothing else on for ${mail.dayWords}.` }]
      : [
          {
            kind: 'paragraph',
            text: `${mail.dayWords} as it stands now; it takes the place of the mail before.`,
          },
          ...dayBlocks(mail),
        ]
  return {
    subject: subjectLine(subjectOf(mail, changes)),
    blocks: [
      {
        kind: 'paragraph',
        text: `Hello ${mail.personName}, ${mail.dayWords} has changed since the last mail.`,
      },
      { kind: 'subheading', text: 'What is different' },
      { kind: 'list', items: changes },
      ...now,
      closingBlock(mail),
    ],
  }
}
