import { MapPin, Phone } from 'lucide-react'
import type { ReactNode } from 'react'
import type { DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import { formatQuarters } from '../../../shared/labour/format-hours.ts'
import { Badge } from '../../ui/badge.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div className="grid grid-cols-[4.75rem_minmax(0,1fr)] gap-2 py-0.5">
      <dt className="text-base">{name}</dt>
      <dd className="min-w-0 text-base [overflow-wrap:anywhere]">{children}</dd>
    </div>
  )
}

const keyClass = `${buttonClass('plain', 'site')} min-w-0 flex-1 px-3 sm:flex-none sm:px-5`

/** The two keys of the way there: the map and the site's phone. */
function WayKeys({ job }: { job: DaySheet['job'] }) {
  const phone = job.siteContactPhone ?? ''
  if (!job.mapUrl && !phone) return null
  return (
    <div className="my-2 flex flex-wrap gap-2 print:hidden">
      {job.mapUrl ? (
        <a href={job.mapUrl} target="_blank" rel="noreferrer" className={keyClass}>
          <MapPin size={22} aria-hidden />
          Map
        </a>
      ) : null}
      {phone ? (
        <a href={`tel:${phone.replaceAll(/[^\d+]/g, '')}`} className={keyClass}>
          <Phone size={22} aria-hidden />
          <span className="sr-only">Ring the site, </span>
          <span className="whitespace-nowrap">{phone}</span>
        </a>
      ) : null}
    </div>
  )
}

function contactWords({ siteContactName, siteContactPhone = '' }: DaySheet['job']): ReactNode {
  if (siteContactName === '' && siteContactPhone === '') return 'None given.'
  return (
    <>
      {siteContactName || 'Site phone'}
      <span className="hidden print:inline"> {siteContactPhone}</span>
    </>
  )
}

function Roster({ roster }: { roster: DaySheet['roster'] }) {
  if (roster.length === 0) return <>Nobody is in this crew that day. Ask the office.</>
  return (
    <ul className="flex list-none flex-wrap gap-x-4 gap-y-1 p-0">
      {roster.map((person) => (
        <li key={person.id} className={person.onLeave ? 'line-through' : 'font-semibold'}>
          {person.name}
          {person.onLeave ? <Badge kind="ochre">on leave</Badge> : null}
        </li>
      ))}
    </ul>
  )
}

/** Start, where, who, what to bring: what is asked before the first cup of tea is cold. */
export function DayFacts({ sheet }: { sheet: DaySheet }) {
  const { job } = sheet
  return (
    <Card aria-label="Start, site and crew" className="px-3 py-2 sm:p-4">
      <p className="flex flex-wrap items-baseline gap-x-3">
        <span className="numeral text-[2rem]">
          <span className="sr-only">Start </span>
          {sheet.startAt}
        </span>
        <span className="min-w-0 font-semibold [overflow-wrap:anywhere]">
          {job.siteAddress || 'No address yet. Ask the office.'}
        </span>
      </p>
      <WayKeys job={job} />
      <dl>
        {job.accessNotes ? <Fact name="Access">{job.accessNotes}</Fact> : null}
        <Fact name="On site">{contactWords(job)}</Fact>
        <Fact name="Who">
          <Roster roster={sheet.roster} />
        </Fact>
        {sheet.gear ? <Fact name="Gear">{sheet.gear}</Fact> : null}
        {job.crewNotes ? <Fact name="Notes">{job.crewNotes}</Fact> : null}
        <Fact name="Work">
          {formatQuarters(sheet.minutesPlanned)} planned, {formatQuarters(sheet.minutesThere)} there
          {sheet.log ? `, ${formatQuarters(sheet.log.minutes)} logged` : ''}
          {sheet.log && sheet.log.lostMinutes > 0
            ? `, ${formatQuarters(sheet.log.lostMinutes)} of them lost`
            : ''}
        </Fact>
      </dl>
    </Card>
  )
}
