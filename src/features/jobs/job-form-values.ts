import type { JobFieldName, JobFieldsInput } from '../../../shared/jobs/job-schemas.ts'
import type { JobView } from '../../../shared/jobs/job-views.ts'
import { priceInputText } from '../../../shared/jobs/price-text.ts'

/** The labels, also for a difference between two versions. */
export const jobFieldLabels: Record<JobFieldName, string> = {
  title: 'Title',
  number: 'Job number',
  covering: 'Covering',
  wantedBy: 'Wanted by',
  siteAddress: 'Site address',
  accessNotes: 'Getting in',
  siteContactName: 'Site contact',
  siteContactPhone: 'Site contact phone',
  customerName: 'Customer',
  customerPhone: 'Customer phone',
  customerEmail: 'Customer e-mail',
  price: 'Price in dollars',
  priceSentOn: 'Price sent on',
  acceptedOn: 'Accepted on',
  completedOn: 'Completed on',
  notes: 'Office notes',
  crewNotes: 'Notes for the crew',
}

export const jobFieldNames = Object.keys(jobFieldLabels) as JobFieldName[]

export const emptyJobForm: JobFieldsInput = {
  title: '',
  number: '',
  covering: 'tiles',
  wantedBy: '',
  siteAddress: '',
  accessNotes: '',
  siteContactName: '',
  siteContactPhone: '',
  customerName: '',
  customerPhone: '',
  customerEmail: '',
  price: '',
  priceSentOn: '',
  acceptedOn: '',
  completedOn: '',
  notes: '',
  crewNotes: '',
}

export function jobFormOf(job: JobView): JobFieldsInput {
  return {
    title: job.title,
    number: job.number,
    covering: job.covering,
    wantedBy: job.wantedBy ?? '',
    siteAddress: job.siteAddress,
    accessNotes: job.accessNotes,
    siteContactName: job.siteContactName,
    siteContactPhone: job.siteContactPhone ?? '',
    customerName: job.customerName ?? '',
    customerPhone: job.customerPhone ?? '',
    customerEmail: job.customerEmail ?? '',
    price: priceInputText(job.priceCents ?? null),
    priceSentOn: job.priceSentOn ?? '',
    acceptedOn: job.acceptedOn ?? '',
    completedOn: job.completedOn ?? '',
    notes: job.notes ?? '',
    crewNotes: job.crewNotes,
  }
}

/** Only what differs from what the typing began with. */
export function changedFields(
  values: JobFieldsInput,
  base: JobFieldsInput,
): Partial<JobFieldsInput> {
  return Object.fromEntries(
    jobFieldNames.filter((name) => values[name] !== base[name]).map((name) => [name, values[name]]),
  )
}
