import { z } from 'zod'
import { idSchema, versionSchema } from '../http/fields.ts'
import type { PosedMember } from '../drawing/timber-pose.ts'
import type { MarkingCard } from '../marking/marking-card.ts'

const personNameSchema = z.object({ id: z.string(), name: z.string() })

/** A line to cut or to stand, or set-out work, on one day, with how far it is. */
export const dayTaskSchema = z.object({
  id: z.string(),
  bookingDayId: z.string(),
  day: z.string(),
  position: z.number(),
  packageKey: z.string(),
  packageTitle: z.string(),
  work: z.enum(['set-out', 'cut', 'stand']),
  cutLineMark: z.string().nullable(),
  memberMarks: z.array(z.string()),
  title: z.string(),
  quantity: z.number(),
  /** Sum of the ticks. */
  doneCount: z.number(),
  plannedMinutes: z.number(),
  assignedTo: personNameSchema.nullable(),
  firstPiece: z.object({ at: z.string(), by: z.string() }).nullable(),
  handRaisedAt: z.string().nullable(),
  version: z.number(),
})
export type DayTask = z.infer<typeof dayTaskSchema>

/** Which job, roof and day a task belongs to. */
const taskPlaceSchema = z.object({
  bookingDayId: z.string(),
  day: z.string(),
  jobNumber: z.string(),
  jobTitle: z.string(),
  siteAddress: z.string(),
  startAt: z.string(),
  revisionLetter: z.string().nullable(),
  platesMeasured: z.boolean(),
})

// Cards and members are made by our own pure code from a stored spec; they are passed on as they are.
const isObject = (value: unknown) => typeof value === 'object' && value !== null
const cardSchema = z.custom<MarkingCard>(isObject)
const memberSchema = z.custom<PosedMember>(isObject)

export const taskDetailSchema = z.object({
  /** The firm's day now: a task may be of another. */
  today: z.string(),
  task: dayTaskSchema,
  place: taskPlaceSchema,
  /** Pieces of this task and their hands: 'x3: 2 left, 1 right'; empty for set-out work. */
  shareWords: z.string(),
  units: z.enum(['mm', 'feet-inches']),
  card: cardSchema.nullable(),
  /** The piece the card describes, for its drawing. */
  member: memberSchema.nullable(),
})
export type TaskDetail = z.infer<typeof taskDetailSchema>

export const myTasksSchema = z.object({
  day: z.string(),
  today: z.string(),
  previousDay: z.string().nullable(),
  nextDay: z.string().nullable(),
  places: z.array(taskPlaceSchema.extend({ tasks: z.array(dayTaskSchema) })),
})
export type MyTasks = z.infer<typeof myTasksSchema>

export const changeTaskSchema = z
  .strictObject({
    version: versionSchema,
    assignedToId: idSchema.nullable().optional(),
    /** Place in the day's order, 0 first. */
    position: z.number().int().min(0).optional(),
    /** The first piece has been tried, or has to be tried again. */
    firstPieceTried: z.boolean().optional(),
  })
  .refine(
    (change) =>
      change.assignedToId !== undefined ||
      change.position !== undefined ||
      change.firstPieceTried !== undefined,
    'Say what to change.',
  )
export type ChangeTask = z.infer<typeof changeTaskSchema>

export const newTickSchema = z.strictObject({
  /** Made on the device, so that sending it twice counts once. */
  id: idSchema,
  delta: z.union([z.literal(1), z.literal(-1)], 'A tick is one piece up or one piece down.'),
})
export type NewTick = z.infer<typeof newTickSchema>

export const raiseHandSchema = z.strictObject({ raised: z.boolean() })

export const taskAnswerSchema = z.object({ task: dayTaskSchema })
