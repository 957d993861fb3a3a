import type { z } from 'zod'
import { type Permission, roleMay } from '../../shared/auth/permissions.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { type JobMissing, jobMissingOf } from '../../shared/jobs/job-missing.ts'
import type { JobStage } from '../../shared/jobs/job-stage.ts'
import type { JobBooking, jobSchema, JobCard } from '../../shared/jobs/job-views.ts'
import type { Viewer } from './job-board-store.ts'
import type { BookingRow, Related } from './job-related.ts'
import type { JobRow } from './job-store.ts'

type JobAnswer = z.input<typeof jobSchema>

function hasUnissuedDraft(related: Related): boolean {
  const issuedAt = related.revisions[0]?.issuedAt
  const { draftUpdatedAt } = related
  return draftUpdatedAt !== null && (issuedAt === undefined || draftUpdatedAt > issuedAt)
}

function missingOf(viewer: Viewer, stage: JobStage, job: JobRow, related: Related): JobMissing[] {
  const today = localDayOf(viewer.now, viewer.firm.timeZone)
  const { lastBookedDay } = related
  return jobMissingOf(
    {
      stage,
      hasPrice: job.priceCents !== null,
      hasSiteAddress: job.siteAddress !== '',
      hasSiteContact: job.siteContactName !== '' && job.siteContactPhone !== '',
      hasIssuedRoof: related.revisions.length > 0,
      hasUnissuedDraft: hasUnissuedDraft(related),
      hasStandingBooking: lastBookedDay !== null,
      arePlatesMeasured: related.arePlatesMeasured,
      isLastBookedDayPast: lastBookedDay !== null && lastBookedDay < today,
    },
    (permission) => roleMay(viewer.user.role, permission),
  )
}

function bookingAnswer({ id, state, startsOn, endsOn, dayCount, crew }: BookingRow): JobBooking {
  return { id, state, startsOn, endsOn, dayCount, crew }
}

function nextBooking(bookings: BookingRow[]): JobBooking | null {
  const ahead = bookings.filter((booking) => booking.nextDay !== null)
  ahead.sort((a, b) => (a.nextDay ?? '').localeCompare(b.nextDay ?? ''))
  return ahead[0] ? bookingAnswer(ahead[0]) : null
}

export function jobCard(viewer: Viewer, stage: JobStage, job: JobRow, related: Related): JobCard {
  const latest = related.revisions[0]
  const mayWriteRoof = roleMay(viewer.user.role, 'roof:write')
  return {
    id: job.id,
    number: job.number,
    title: job.title,
    siteAddress: job.siteAddress,
    version: job.version,
    stage,
    ...(roleMay(viewer.user.role, 'price:read')
      ? {
          priceCents: job.priceCents,
          facts: {
            priceSentOn: job.priceSentOn,
            acceptedOn: job.acceptedOn,
            completedOn: job.completedOn,
          },
        }
      : {}),
    wantedBy: job.wantedBy,
    glyph: latest?.glyph ?? null,
    latestLetter: latest?.letter ?? null,
    ...(mayWriteRoof ? { hasDraft: hasUnissuedDraft(related) } : {}),
    nextBooking: nextBooking(related.bookings),
    missing: missingOf(viewer, stage, job, related),
  }
}

/** Fields that need a permission of their own; without it the keys are not there. */
function guardedFields(may: (permission: Permission) => boolean, job: JobRow, related: Related) {
  return {
    ...(may('site-contact-phone:read') ? { siteContactPhone: job.siteContactPhone } : {}),
    ...(may('customer:read')
      ? {
          customerName: job.customerName,
          customerPhone: job.customerPhone,
          customerEmail: job.customerEmail,
        }
      : {}),
    ...(may('price:read')
      ? { priceCents: job.priceCents, priceSentOn: job.priceSentOn, acceptedOn: job.acceptedOn }
      : {}),
    ...(may('job:write') ? { notes: job.notes } : {}),
    ...(may('roof:write')
      ? {
          draft: related.draftUpdatedAt
            ? {
                updatedAt: related.draftUpdatedAt.toISOString(),
                isIssued: !hasUnissuedDraft(related),
              }
            : null,
        }
      : {}),
  }
}

export function jobAnswer(
  viewer: Viewer,
  stage: JobStage,
  job: JobRow,
  related: Related,
): JobAnswer {
  return {
    id: job.id,
    version: job.version,
    number: job.number,
    title: job.title,
    stage,
    missing: missingOf(viewer, stage, job, related),
    siteAddress: job.siteAddress,
    accessNotes: job.accessNotes,
    siteContactName: job.siteContactName,
    covering: job.covering,
    wantedBy: job.wantedBy,
    completedOn: job.completedOn,
    crewNotes: job.crewNotes,
    ...guardedFields((permission) => roleMay(viewer.user.role, permission), job, related),
    revisions: related.revisions.map(({ letter, issuedAt, glyph }) => ({
      letter,
      issuedAt: issuedAt.toISOString(),
      glyph,
    })),
    arePlatesMeasured: related.arePlatesMeasured,
    bookings: related.bookings.map(bookingAnswer),
    updatedAt: job.updatedAt.toISOString(),
  }
}
