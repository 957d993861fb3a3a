import type { DayMail } from '../day-mail.ts'
import { closingBlock, dayBlocks } from './day-blocks.ts'
import { type MailDocument, subjectLine } from './mail-document.ts'

/** 'Thu 4 Dec, 07:00: 12 Kiln Road, Marrow Creek'. */
export function reminderMail(mail: DayMail): MailDocument {
  const [first, ...others] = mail.bookings
  if (!first) throw new Error('A reminder needs a booking.')
  const more = others.length === 0 ? '' : ` and ${others.length} more`
  const place = first.told.site || first.told.jobTitle
  return {
    subject: subjectLine(`${mail.dayWords}, ${first.told.startAt}: ${place}${more}`),
    blocks: [
      {
        kind: 'paragraph',
        text: `Hello ${mail.personName}, this is what is on for ${mail.dayWords}.`,
      },
      ...dayBlocks(mail),
      closingBlock(mail),
    ],
  }
}
