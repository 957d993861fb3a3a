import { type MailDocument, subjectLine } from './mail-document.ts'

export type AccountMailInput = {
  personName: string
  firmName: string
  /** Null in the copy that is kept. */
  url: string | null
  hours: number
}

function daysOrHours(hours: number): string {
  if (hours % 24 === 0) return hours === 24 ? 'one day' : `${hours / 24} days`
  return hours === 1 ? 'one hour' : `${hours} hours`
}

export function passwordResetMail(input: AccountMailInput): MailDocument {
  return {
    subject: 'Set a new password for Ridgehand',
    blocks: [
      { kind: 'paragraph', text: `Hello ${input.personName},` },
      {
        kind: 'paragraph',
        text: `Somebody asked for a new password for your account at ${input.firmName}. If it was you, open this link and type a new one.`,
      },
      { kind: 'link', label: 'Set a new password', url: input.url },
      {
        kind: 'paragraph',
        text: `The link works once, for ${daysOrHours(input.hours)}. If it was not you, do nothing: your password stays as it is.`,
      },
    ],
  }
}

export function invitationMail(input: AccountMailInput): MailDocument {
  return {
    subject: subjectLine(`Your account at ${input.firmName}`),
    blocks: [
      { kind: 'paragraph', text: `Hello ${input.personName},` },
      {
        kind: 'paragraph',
        text: `${input.firmName} has made an account for you on Ridgehand, where you see which roof you are on and what there is to cut. Open this link and choose a password.`,
      },
      { kind: 'link', label: 'Choose a password', url: input.url },
      {
        kind: 'paragraph',
        text: `The link works once, for ${daysOrHours(input.hours)}. After that, use "Forgotten the password?" on the sign-in screen, or ask the office.`,
      },
    ],
  }
}
