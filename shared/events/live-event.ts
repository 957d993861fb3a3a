import { z } from 'zod'

/** Says only which kind of thing changed, never what: each screen refetches with its own rights. */
export const liveEventSchema = z.object({
  topic: z.enum(['jobs', 'roof', 'calendar', 'day-sheet', 'messages', 'people', 'firm']),
})
export type LiveEvent = z.infer<typeof liveEventSchema>
