import type { z } from 'zod'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import type {
  PreviewQuery,
  rainOffPreviewSchema,
  RainOffPreview,
} from '../../shared/rain-offs/rain-off-schemas.ts'
import { readCrew } from '../bookings/booking-store.ts'
import type { DbOrTx } from '../db/client.ts'
import { readFirm } from '../firm/firm-store.ts'
import { notFound } from '../http/app-error.ts'
import { readOtherCrews, readTouchedMilestones } from './crew-to-move.ts'
import { checkCrewAndDay } from './make-rain-off.ts'
import { newClashes } from './new-clashes.ts'
import { type PlannedRainOff, planRainOff } from './plan-rain-off.ts'

type OtherDay = { crew: string; day: string }

function crewsWithDays(rows: readonly OtherDay[]): { crew: string; days: string[] }[] {
  return [...groupBy(rows, (row) => row.crew)].map(([crew, own]) => ({
    crew,
    days: own.map((row) => row.day),
  }))
}

/** What a rain-off would move, whom it touches, and what it would knock into; nothing is changed. */
export function previewRainOff(
  db: DbOrTx,
  query: PreviewQuery,
  now: Date,
): z.input<typeof rainOffPreviewSchema> {
  const firm = readFirm(db)
  const today = localDayOf(now, firm.timeZone)
  const asked = {
    crewId: query.crew,
    fromDay: query.day,
    workingDays: query.days,
    useFreeDays: query.free === 'use',
  }
  checkCrewAndDay(db, asked, today)
  const crew = readCrew(db, asked.crewId)
  if (!crew) throw notFound('That crew')
  const plan = planRainOff(db, asked, { firm, today })
  const jobIds = plan.moves.flatMap((move) => plan.rowOf(move.bookingId)?.job.id ?? [])
  const milestones = readTouchedMilestones(db, jobIds)
  const others = readOtherCrews(db, { jobIds, crewId: crew.id, fromDay: asked.fromDay })
  const clashes = newClashes(db, { plan, firm, today })
  return {
    crew,
    lostDays: plan.lostDays,
    moves: plan.moves.flatMap((move): RainOffPreview['moves'] => {
      const row = plan.rowOf(move.bookingId)
      if (!row) return []
      const { version, state, job, customerName, wantedBy } = row
      return [
        {
          ...move,
          version,
          state,
          job,
          customerName,
          wantedBy,
          milestones: milestones.get(job.id) ?? [],
          otherCrews: crewsWithDays(others.get(job.id) ?? []),
          clashes: clashes.get(move.bookingId) ?? [],
        },
      ]
    }),
    stays: staysOf(plan),
  }
}

function staysOf(plan: PlannedRainOff): RainOffPreview['stays'] {
  return plan.stays.map(({ bookingId, day }) => ({
    bookingId,
    job: plan.rowOf(bookingId)?.job.number ?? '',
    day,
  }))
}
