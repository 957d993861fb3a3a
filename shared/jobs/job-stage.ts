/** Where a job stands, in the order it goes through them. */
export const jobStages = [
  'enquiry',
  'priced',
  'won',
  'pencilled',
  'firm',
  'on-site',
  'complete',
] as const
export type JobStage = (typeof jobStages)[number]

export const jobStageNames: Record<JobStage, string> = {
  enquiry: 'Enquiry',
  priced: 'Priced',
  won: 'Won',
  pencilled: 'Pencilled',
  firm: 'Firm',
  'on-site': 'On site',
  complete: 'Complete',
}

/** What is known of a job; nobody sets a stage. */
export type JobFacts = {
  isPriceSent: boolean
  isAccepted: boolean
  /** A standing booking in pencil. */
  hasPencilledBooking: boolean
  /** A standing booking that is firm. */
  hasFirmBooking: boolean
  /** A booked day has a tick or a log. */
  isWorked: boolean
  isMarkedComplete: boolean
}

/**
 * The one table: a job is at the first of these whose fact holds, and an enquiry when none does.
 * The board's query is built from it too.
 */
export const stageTable: readonly { stage: JobStage; fact: keyof JobFacts }[] = [
  { stage: 'complete', fact: 'isMarkedComplete' },
  { stage: 'on-site', fact: 'isWorked' },
  { stage: 'firm', fact: 'hasFirmBooking' },
  { stage: 'pencilled', fact: 'hasPencilledBooking' },
  { stage: 'won', fact: 'isAccepted' },
  { stage: 'priced', fact: 'isPriceSent' },
]

export const firstStage: JobStage = 'enquiry'

export function jobStageOf(facts: JobFacts): JobStage {
  return stageTable.find(({ fact }) => facts[fact])?.stage ?? firstStage
}

/** Whether `stage` is `reference` or further along. */
export function stageReached(stage: JobStage, reference: JobStage): boolean {
  return jobStages.indexOf(stage) >= jobStages.indexOf(reference)
}
