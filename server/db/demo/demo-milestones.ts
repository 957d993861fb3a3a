import type { Day } from '../../../shared/calendar/days.ts'
import type { MilestoneKind, MilestoneState } from '../../../shared/milestones/milestone-kinds.ts'
import { newId } from '../../lib/ids.ts'
import type { Db } from '../client.ts'
import { milestones } from '../tables/milestone-tables.ts'

/** Days are counted in working days from the booking's first; null: no day yet. */
export type DemoMilestone = {
  kind: MilestoneKind
  fromFirstDay: number | null
  state: MilestoneState
  broughtBy: string
}

const yard = 'Marrow Creek Timber'
const scaffolder = 'Tern Scaffolding'

/** Of a job that is being worked on: all it waited for came. */
const allThere: DemoMilestone[] = [
  { kind: 'frames-up', fromFirstDay: -3, state: 'done', broughtBy: 'The builder' },
  { kind: 'edge-protection-up', fromFirstDay: -2, state: 'done', broughtBy: scaffolder },
  { kind: 'timber-on-site', fromFirstDay: -1, state: 'done', broughtBy: yard },
]

const byJob: Record<string, DemoMilestone[]> = {
  // The yard promises a day later than the pencilled first one: the clash to be found in the demo.
  'QR-106': [
    { kind: 'edge-protection-up', fromFirstDay: -1, state: 'asked', broughtBy: scaffolder },
    { kind: 'timber-on-site', fromFirstDay: 1, state: 'promised', broughtBy: yard },
  ],
  'QR-107': [
    { kind: 'frames-up', fromFirstDay: -2, state: 'promised', broughtBy: 'The builder' },
    { kind: 'edge-protection-up', fromFirstDay: -1, state: 'promised', broughtBy: scaffolder },
    { kind: 'timber-on-site', fromFirstDay: 0, state: 'promised', broughtBy: yard },
  ],
  'QR-108': allThere,
  'QR-109': allThere,
  'QR-110': [
    ...allThere,
    { kind: 'frame-inspection', fromFirstDay: 4, state: 'done', broughtBy: 'The certifier' },
  ],
  'QR-111': [
    { kind: 'frames-up', fromFirstDay: -2, state: 'guessed', broughtBy: 'The builder' },
    { kind: 'edge-protection-up', fromFirstDay: null, state: 'asked', broughtBy: scaffolder },
    { kind: 'timber-on-site', fromFirstDay: -1, state: 'asked', broughtBy: yard },
    { kind: 'fascia-and-gutter', fromFirstDay: 5, state: 'guessed', broughtBy: 'The plumber' },
  ],
}

/** What a booked job of the demo waits for; `dayOf` counts working days from the booking's first. */
export function insertDemoMilestones(
  db: Db,
  job: { id: string; number: string },
  at: { dayOf: (workingDays: number) => Day; today: Day; now: Date },
): void {
  for (const { kind, fromFirstDay, state, broughtBy } of byJob[job.number] ?? []) {
    const day = fromFirstDay === null ? null : at.dayOf(fromFirstDay)
    const isStillToCome = day !== null && day > at.today
    db.insert(milestones)
      .values({
        id: newId(),
        jobId: job.id,
        kind,
        day,
        // Nothing is done on a day still to come.
        state: state === 'done' && isStillToCome ? 'promised' : state,
        broughtBy,
        updatedAt: at.now,
      })
      .run()
  }
}
