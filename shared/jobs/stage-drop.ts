import type { Day } from '../calendar/days.ts'
import type { JobFactName } from './job-schemas.ts'
import { jobStageNames, type JobStage } from './job-stage.ts'

/** What dropping a job on a stage of the board means: a fact set or taken back, or why it cannot be. */
export type StageDrop = { fact: JobFactName; on: Day | null; said: string } | { refused: string }

const setTo: Partial<Record<JobStage, { fact: JobFactName; said: string; from: JobStage[] }>> = {
  priced: { fact: 'priceSentOn', said: 'Price sent today', from: ['enquiry'] },
  won: { fact: 'acceptedOn', said: 'Accepted today', from: ['enquiry', 'priced'] },
}

const takenBack: Partial<Record<`${JobStage}>${JobStage}`, { fact: JobFactName; said: string }>> = {
  'priced>enquiry': { fact: 'priceSentOn', said: 'Price not sent after all' },
  'won>priced': { fact: 'acceptedOn', said: 'Not accepted after all' },
}

const booked: readonly JobStage[] = ['pencilled', 'firm', 'on-site']

/**
 * A stage follows from facts, so a job can be dropped where one fact puts it: price sent, accepted,
 * complete, and the same taken back. Null when it is dropped where it was.
 */
export function stageDrop(from: JobStage, to: JobStage, today: Day): StageDrop | null {
  if (from === to) return null
  if (to === 'complete') return { fact: 'completedOn', on: today, said: 'Marked complete' }
  if (from === 'complete') return { fact: 'completedOn', on: null, said: 'Reopened' }
  const set = setTo[to]
  if (set?.from.includes(from)) return { fact: set.fact, on: today, said: set.said }
  const back = takenBack[`${from}>${to}`]
  if (back) return { ...back, on: null }
  return { refused: whyNot(from, to) }
}

function whyNot(from: JobStage, to: JobStage): string {
  if (to === 'pencilled' || to === 'firm')
    return `Days in the calendar make a job ${jobStageNames[to].toLowerCase()}. Book it there.`
  if (to === 'on-site') return 'The first tick or day log on site puts a job there.'
  if (booked.includes(from))
    return 'It is booked. Take its days off in the calendar, then it is won again.'
  return 'Open the job and take back its price and its yes one by one.'
}
