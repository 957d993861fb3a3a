import { and, asc, eq, isNull } from 'drizzle-orm'
import { permissionScope } from '../../shared/auth/permissions.ts'
import type { Day } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { CrewRef, DayRoof, DaySheets } from '../../shared/day-sheets/day-sheet-schemas.ts'
import type { MyTasks, TaskDetail } from '../../shared/day-sheets/task-schemas.ts'
import { posedMemberOf } from '../../shared/drawing/timber-pose.ts'
import { markingCardOf } from '../../shared/marking/marking-card.ts'
import type { MarkingOptions } from '../../shared/marking/marking-figures.ts'
import { shareWords } from '../../shared/marking/role-words.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { plateChecks, roofRevisions } from '../db/tables/job-tables.ts'
import { crews } from '../db/tables/people-tables.ts'
import type { Firm } from '../firm/firm-store.ts'
import { notFound } from '../http/app-error.ts'
import { bookingDayVisible } from '../lib/visibility.ts'
import { crewIdsOf } from '../people/roster.ts'
import type { ReadIssuedRoofs } from '../revisions/issued-roofs.ts'
import { neighbouringDays, readDaySheets } from './day-sheet-store.ts'
import { daySheetView } from './day-sheet-view.ts'
import {
  asDayTask,
  type FoundTask,
  findTask,
  ownTaskDays,
  ownTasks,
  type Viewer,
} from './task-store.ts'

/** Where sheets are read from. */
export type SheetSource = { db: DbOrTx; readRoofs: ReadIssuedRoofs }

/** Crews whose sheets this person may open on a day: all for the office, else those worked with. */
function crewsFor(db: DbOrTx, viewer: Viewer, day: Day): CrewRef[] {
  const all = db
    .select({ id: crews.id, name: crews.name, letter: crews.letter, colour: crews.colour })
    .from(crews)
    .where(eq(crews.active, true))
    .orderBy(asc(crews.letter), asc(crews.name))
    .all()
  if (permissionScope(viewer.user.role, 'day-sheet:read') === 'all') return all
  const own = new Set(crewIdsOf(db, viewer.user.id, day))
  return all.filter((crew) => own.has(crew.id))
}

/** Without a crew: the first one with something on that day, or the first there is. */
export function daySheetsFor(
  { db, readRoofs }: SheetSource,
  viewer: Viewer,
  query: { day?: Day | undefined; crewId?: string | undefined },
): DaySheets {
  const today = localDayOf(viewer.now, viewer.firm.timeZone)
  const day = query.day ?? today
  const choices = crewsFor(db, viewer, day)
  if (query.crewId !== undefined && !choices.some((crew) => crew.id === query.crewId))
    throw notFound('That crew')
  const visible = bookingDayVisible(viewer.user, 'day-sheet:read', viewer.firm, viewer.now)
  const sheetsOf = (crewId: string) => readDaySheets(db, { crewId, day }, readRoofs, visible)
  const wanted = choices.filter((crew) => query.crewId === undefined || crew.id === query.crewId)
  let crew = wanted[0] ?? null
  let sheets = crew ? sheetsOf(crew.id) : []
  for (const other of wanted.slice(1)) {
    if (sheets.length > 0) break
    const found = sheetsOf(other.id)
    if (found.length > 0) [crew, sheets] = [other, found]
  }
  const near = crew ? neighbouringDays(db, { crewId: crew.id, day }, visible) : null
  return {
    day,
    today,
    crew,
    crews: choices,
    previousDay: near?.previousDay ?? null,
    nextDay: near?.nextDay ?? null,
    sheets: sheets.map((sheet) => daySheetView(sheet, viewer.user.role)),
  }
}

function markingOptions(
  firm: Firm,
  settings: { roundMm: number; roundDeg: number; sawMaxTiltDeg: number },
): Required<MarkingOptions> {
  const { roundMm, roundDeg, sawMaxTiltDeg } = settings
  return { units: firm.lengthUnits, roundMm, roundDeg, sawMaxTiltDeg }
}

/** The roof that a booking day is cut to. */
export function dayRoofFor(
  { db, readRoofs }: SheetSource,
  viewer: Viewer,
  bookingDayId: string,
): DayRoof {
  const found = db
    .select({ revisionId: bookingDays.revisionId })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(
      and(
        eq(bookingDays.id, bookingDayId),
        isNull(bookings.cancelledAt),
        bookingDayVisible(viewer.user, 'roof:read', viewer.firm, viewer.now),
      ),
    )
    .get()
  const id = found?.revisionId ?? ''
  const revision = readRoofs(db, [id]).get(id)
  if (!revision) throw notFound('That roof')
  const { jobId, letter, roof, spec, settings } = revision
  return { jobId, letter, roof, spec, marking: markingOptions(viewer.firm, settings) }
}

function placeOf(
  db: DbOrTx,
  firm: Firm,
  row: FoundTask,
  revision: { letter: string } | undefined,
): TaskDetail['place'] {
  const { booking, job, revisionId } = row
  const measured = revisionId
    ? db
        .select({ id: plateChecks.id })
        .from(plateChecks)
        .where(eq(plateChecks.revisionId, revisionId))
        .limit(1)
        .get()
    : undefined
  return {
    bookingDayId: row.task.bookingDayId,
    day: row.day,
    jobNumber: job.number,
    jobTitle: job.title,
    siteAddress: job.siteAddress,
    startAt: booking.startAt ?? firm.startAt,
    revisionLetter: revision?.letter ?? null,
    platesMeasured: measured !== undefined,
  }
}

/** A task with the marking card of its line and the member that the card describes. */
export function taskDetailFor(
  { db, readRoofs }: SheetSource,
  viewer: Viewer,
  taskId: string,
): TaskDetail {
  const row = findTask(db, viewer, 'task:read', taskId)
  if (!row) throw notFound('That task')
  const revision = row.revisionId ? readRoofs(db, [row.revisionId]).get(row.revisionId) : undefined
  const mark = row.task.cutLineMark
  const hasLine = revision?.spec.cutLines.some((line) => line.mark === mark) ?? false
  const card =
    revision && mark !== null && hasLine
      ? markingCardOf(
          revision.spec,
          mark,
          markingOptions(viewer.firm, revision.settings),
          row.task.memberMarks,
        )
      : null
  const member = revision ? posedMemberOf(revision.spec, card?.drawnMark) : null
  return {
    today: localDayOf(viewer.now, viewer.firm.timeZone),
    task: asDayTask(row),
    place: placeOf(db, viewer.firm, row, revision),
    shareWords: card ? shareWords(revision?.spec.members ?? [], row.task.memberMarks) : '',
    units: viewer.firm.lengthUnits,
    card,
    member,
  }
}

/** What a person has been handed for a day, by site. */
export function myTasksFor(db: DbOrTx, viewer: Viewer, wantedDay: Day | undefined): MyTasks {
  const today = localDayOf(viewer.now, viewer.firm.timeZone)
  const day = wantedDay ?? today
  const places = new Map<string, MyTasks['places'][number]>()
  for (const row of ownTasks(db, viewer, day)) {
    const id = row.task.bookingDayId
    const place = places.get(id) ?? {
      ...placeOf(db, viewer.firm, row, letterOf(db, row.revisionId)),
      tasks: [],
    }
    place.tasks.push(asDayTask(row))
    places.set(id, place)
  }
  const near = ownTaskDays(db, viewer, day)
  return {
    day,
    today,
    previousDay: near?.previousDay ?? null,
    nextDay: near?.nextDay ?? null,
    places: [...places.values()],
  }
}

function letterOf(db: DbOrTx, revisionId: string | null): { letter: string } | undefined {
  if (!revisionId) return undefined
  return db
    .select({ letter: roofRevisions.letter })
    .from(roofRevisions)
    .where(eq(roofRevisions.id, revisionId))
    .get()
}
