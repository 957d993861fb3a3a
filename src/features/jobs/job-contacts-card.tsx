import { Mail, MapPin, Phone } from 'lucide-react'
import type { ReactNode } from 'react'
import type { JobView } from '../../../shared/jobs/job-views.ts'
import { Card } from '../../ui/card.tsx'
import { mapHref, telephoneHref } from './contact-links.ts'

const linkClass =
  'inline-flex min-h-11 items-center gap-2 font-semibold text-chalk underline [overflow-wrap:anywhere]'

function PhoneLink({ phone, name }: { phone: string | undefined; name: string }) {
  if (!phone) return null
  return (
    <a className={linkClass} href={telephoneHref(phone)} aria-label={`Ring ${name} on ${phone}`}>
      <Phone size={18} aria-hidden className="shrink-0" />
      {phone}
    </a>
  )
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <div>
      <h3 className="text-sm font-semibold text-ink-soft">{title}</h3>
      {children}
    </div>
  )
}

function None({ what }: { what: string }) {
  return <p className="text-ink-soft">{what}</p>
}

function Customer({ job }: { job: JobView }) {
  if (job.customerName === undefined) return null
  const { customerName, customerPhone, customerEmail } = job
  const isEmpty = !customerName && !customerPhone && !customerEmail
  return (
    <Part title="Customer">
      {isEmpty ? <None what="Nobody named yet" /> : null}
      {customerName ? <p>{customerName}</p> : null}
      <div className="flex flex-wrap gap-x-6">
        <PhoneLink phone={customerPhone} name={customerName || 'the customer'} />
        {customerEmail ? (
          <a className={linkClass} href={`mailto:${customerEmail}`}>
            <Mail size={18} aria-hidden className="shrink-0" />
            {customerEmail}
          </a>
        ) : null}
      </div>
    </Part>
  )
}

/** Where it is and whom to ring. */
export function JobContactsCard({ job }: { job: JobView }) {
  const hasContact = job.siteContactName !== '' || Boolean(job.siteContactPhone)
  return (
    <Card className="space-y-4">
      <h2 className="text-lg font-extrabold">Site and contacts</h2>
      <Part title="Address">
        {job.siteAddress ? (
          <a className={linkClass} href={mapHref(job.siteAddress)} target="_blank" rel="noreferrer">
            <MapPin size={18} aria-hidden className="shrink-0" />
            {job.siteAddress}
          </a>
        ) : (
          <None what="No address yet" />
        )}
      </Part>
      <Part title="Site contact">
        {hasContact ? null : <None what="Nobody named yet" />}
        {job.siteContactName ? <p>{job.siteContactName}</p> : null}
        <PhoneLink phone={job.siteContactPhone} name={job.siteContactName || 'the site contact'} />
      </Part>
      {job.accessNotes ? (
        <Part title="Getting in">
          <p className="whitespace-pre-line [overflow-wrap:anywhere]">{job.accessNotes}</p>
        </Part>
      ) : null}
      <Customer job={job} />
    </Card>
  )
}
