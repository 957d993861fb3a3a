import type { z } from 'zod'
import { type Day, dayPlus, formatDay } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { workedDaysFrom } from '../../shared/calendar/working-days.ts'
import type { ClashFacts, ClashMilestone } from '../../shared/clashes/clash-facts.ts'
import { milestoneWithoutDay } from '../../shared/clashes/clash-words.ts'
import { peopleClashes } from '../../shared/clashes/people-clashes.ts'
import type { OpeningsQuery, openingsSchema } from '../../shared/find-days/find-days-schemas.ts'
import { milestoneNames, milestoneStateNames } from '../../shared/milestones/milestone-rules.ts'
import { findOpenings, type Opening } from '../../shared/planning/find-days.ts'
import { openingWords } from '../../shared/planning/opening-words.ts'
import { readActiveCrews } from '../bookings/calendar-service.ts'
import { readCrewHours } from '../bookings/crew-hours.ts'
import { readNeededMilestones } from '../clashes/clash-store.ts'
import type { Db } from '../db/client.ts'
import { readFirm } from '../firm/firm-store.ts'
import { AppError, notFound } from '../http/app-error.ts'
import type { Clock } from '../lib/clock.ts'
import { readCrewFacts } from '../people/crew-facts.ts'
import { readJobToPlace, readStanding } from './find-days-store.ts'
import { readWorkFit } from './work-fit.ts'

const horizonDays = 120
/** Room behind it for what gives way. */
const roomDays = 60

type Found = z.input<typeof openingsSchema>

/** What the first day waits for: one with a later day moves it on, one without a day is said. */
function waitsOf(
  milestones: readonly ClashMilestone[],
  asked: Day,
): { earliest: Day; waits: Found['waits'] } {
  const open = milestones.filter((one) => one.state !== 'done')
  const dated = open.flatMap((one) =>
    one.day === null || one.day <= asked ? [] : [{ ...one, day: one.day }],
  )
  return {
    earliest: dated.map((one) => one.day).reduce((a, b) => (b > a ? b : a), asked),
    waits: [
      ...dated.map(({ kind, state, day }) => ({
        text: `${milestoneNames[kind]}: ${milestoneStateNames[state].toLowerCase()}, ${formatDay(day)}.`,
        isDated: true,
      })),
      ...open
        .filter((one) => one.day === null)
        .flatMap((one) =>
          one.kind === 'frames-up' ||
          one.kind === 'edge-protection-up' ||
          one.kind === 'timber-on-site'
            ? [{ text: milestoneWithoutDay(one.kind, one).text, isDated: false }]
            : [],
        ),
    ],
  }
}

export function createFindDaysService({ db, clock }: { db: Db; clock: Clock }) {
  return {
    /** Before the query is looked at: a GET of what is not there is 404. @throws AppError 404. */
    requireJob(jobId: string): void {
      if (!readJobToPlace(db, jobId)) throw notFound('That job')
    },

    /** The three best openings for a job. @throws AppError 404, 409 when the job is complete. */
    find(jobId: string, query: OpeningsQuery): Found {
      const found = readJobToPlace(db, jobId)
      if (!found) throw notFound('That job')
      const { completedOn, ...job } = found
      if (completedOn !== null)
        throw new AppError('conflict', `${job.number} is marked complete. Reopen it first.`)
      const firm = readFirm(db)
      const today = localDayOf(clock.now(), firm.timeZone)
      const next = workedDaysFrom(firm, dayPlus(today, 1), 1)[0] ?? dayPlus(today, 1)
      const asked = query.from === undefined ? next : query.from < today ? today : query.from
      const milestones = readNeededMilestones(db, { jobId }).get(jobId) ?? []
      const { earliest, waits } = waitsOf(milestones, asked)
      const span = { from: today, to: dayPlus(earliest, horizonDays + roomDays) }
      const crews = readActiveCrews(db)
      const { standing, rowOf } = readStanding(db, earliest, jobId)
      const fit = readWorkFit(db, { jobId, firm, today, hours: readCrewHours(db, span, firm) })
      const dayCount = query.days ?? (fit ? null : 1)
      const people = peopleOn(readCrewFacts(db, span, firm), { firm, today, crews })
      const openings = findOpenings({
        calendar: firm,
        earliest,
        horizonDays,
        crews,
        bookings: standing,
        isBlocked: (crewId, day) => people(crewId, day).some((one) => one.weight === 'clash'),
        isEnough: (crewId, days) =>
          dayCount === null ? (fit?.isEnough(crewId, days) ?? true) : days.length >= dayCount,
      })
      const jobOf = (id: string): string => {
        const row = rowOf(id)
        return row ? `${row.job.number} ${row.job.title}` : 'Another booking'
      }
      const shown = (opening: Opening): Found['openings'] => {
        const crew = crews.find((one) => one.id === opening.crewId)
        if (!crew) return []
        const why = openingWords(opening, openings, { wantedBy: job.wantedBy, jobOf })
        const { days, passedOver } = opening
        const cautions = days.flatMap((day) =>
          people(crew.id, day).map((clash) => ({ ...clash, day })),
        )
        return [{ crew, days, passedOver, why, moves: movesOf(opening, rowOf), cautions }]
      }
      return {
        job,
        workMinutes: fit ? Math.ceil(fit.leftMinutes) : null,
        dayCount,
        earliest,
        latest: dayPlus(earliest, horizonDays - 1),
        waits,
        openings: openings.flatMap(shown),
      }
    },
  }
}

type Row = NonNullable<ReturnType<ReturnType<typeof readStanding>['rowOf']>>

function movesOf(opening: Opening, rowOf: (id: string) => Row | undefined) {
  return opening.moves.flatMap(({ bookingId, daysBefore, daysAfter }) => {
    const row = rowOf(bookingId)
    return row ? [{ bookingId, version: row.version, job: row.job, daysBefore, daysAfter }] : []
  })
}

/** What is amiss with who is there, looked up once a crew and day. */
function peopleOn(
  facts: ClashFacts['crews'],
  input: {
    firm: ClashFacts['calendar']
    today: Day
    crews: readonly { id: string; name: string }[]
  },
) {
  const all: ClashFacts = {
    today: input.today,
    calendar: input.firm,
    crews: facts,
    bookings: [],
    reader: 'office',
  }
  const known = new Map<string, ReturnType<typeof peopleClashes>>()
  return (crewId: string, day: Day) => {
    const key = `${crewId} ${day}`
    const crew = input.crews.find((one) => one.id === crewId) ?? { id: crewId, name: 'The crew' }
    const found = known.get(key) ?? peopleClashes(all, crew, day)
    known.set(key, found)
    return found
  }
}
