import { z } from 'zod'
import { messageKinds, messageStates } from './message-words.ts'

export const messagesPageSize = 50

/** Filters of the list; all of them in the address. */
export const listMessagesSchema = z.strictObject({
  q: z.string().trim().max(100, 'Keep the search to 100 characters.').optional(),
  state: z.enum(messageStates, 'There is no such state.').optional(),
  kind: z.enum(messageKinds, 'There is no such kind of message.').optional(),
  /** `nextCursor` of the page before. */
  cursor: z
    .string()
    .regex(/^\d{1,15}\.[0-9a-f-]{36}$/, 'That page is not there.')
    .optional(),
})
export type ListMessages = z.infer<typeof listMessagesSchema>

export const messageSchema = z.object({
  id: z.string(),
  kind: z.enum(messageKinds),
  state: z.enum(messageStates),
  toName: z.string(),
  toEmail: z.string(),
  /** Null until it is written, which is when it is sent. */
  subject: z.string().nullable(),
  /** The day it is about, for reminders and change notices. */
  day: z.string().nullable(),
  attempts: z.number(),
  lastError: z.string().nullable(),
  createdAt: z.iso.datetime(),
  sentAt: z.iso.datetime().nullable(),
  /** When it is tried next; null when it is not waiting. */
  nextTryAt: z.iso.datetime().nullable(),
})
export type Message = z.infer<typeof messageSchema>

export const messageListSchema = z.object({
  messages: z.array(messageSchema),
  nextCursor: z.string().nullable(),
  /** True while mail goes to the local fake only. */
  fakeMail: z.boolean(),
})
export type MessageList = z.infer<typeof messageListSchema>

export const messageDetailSchema = messageSchema.extend({
  text: z.string().nullable(),
  html: z.string().nullable(),
  /** It may be put back in line. */
  mayRetry: z.boolean(),
  /** For the phone's own messages; null without a phone, or when the mail holds a secret link. */
  textIt: z.object({ phone: z.string(), words: z.string() }).nullable(),
  fakeMail: z.boolean(),
})
export type MessageDetail = z.infer<typeof messageDetailSchema>

export const retryMessageSchema = z.strictObject({})
