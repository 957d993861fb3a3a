import { MapPin, Phone } from 'lucide-react'
import type { ReactNode } from 'react'
import type { DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import { Badge } from '../../ui/badge.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { hoursWords } from './day-words.ts'

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div className="border-t border-rule py-2 first:border-t-0 sm:grid sm:grid-cols-[8rem_1fr] sm:gap-3">
      <dt className="text-base font-semibold text-ink-soft">{name}</dt>
      <dd className="min-w-0 [overflow-wrap:anywhere]">{children}</dd>
    </div>
  )
}

function Where({ job }: { job: DaySheet['job'] }) {
  if (job.siteAddress === '') return <>No address yet. Ask the office.</>
  return (
    <>
      {job.siteAddress}
      {job.mapUrl ? (
        <a
          href={job.mapUrl}
          target="_blank"
          rel="noreferrer"
          className={`${buttonClass('plain', 'site')} mt-2 w-full sm:w-auto print:hidden`}
        >
          <MapPin size={22} aria-hidden />
          Map
        </a>
      ) : null}
    </>
  )
}

function Contact({ job }: { job: DaySheet['job'] }) {
  const phone = job.siteContactPhone ?? ''
  if (job.siteContactName === '' && phone === '') return <>None given.</>
  return (
    <>
      {job.siteContactName || 'Site phone'}
      {phone ? (
        <a
          href={`tel:${phone.replaceAll(/[^\d+]/g, '')}`}
          className={`${buttonClass('plain', 'site')} mt-2 w-full sm:ml-3 sm:mt-0 sm:w-auto print:ml-2 print:inline print:border-0 print:p-0`}
        >
          <Phone size={22} aria-hidden className="print:hidden" />
          {phone}
        </a>
      ) : null}
    </>
  )
}

function Roster({ roster }: { roster: DaySheet['roster'] }) {
  if (roster.length === 0) return <>Nobody is in this crew that day. Ask the office.</>
  return (
    <ul className="flex list-none flex-wrap gap-x-4 gap-y-1 p-0">
      {roster.map((person) => (
        <li key={person.id} className={person.onLeave ? 'text-ink-soft' : 'font-semibold'}>
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
    <Card aria-label="Start, site and crew">
      <dl>
        <Fact name="Start">
          <span className="numeral text-[2rem]">{sheet.startAt}</span>
        </Fact>
        <Fact name="Where">
          <Where job={job} />
        </Fact>
        {job.accessNotes ? <Fact name="Access">{job.accessNotes}</Fact> : null}
        <Fact name="On site">
          <Contact job={job} />
        </Fact>
        <Fact name="Who">
          <Roster roster={sheet.roster} />
        </Fact>
        {sheet.gear ? <Fact name="Gear">{sheet.gear}</Fact> : null}
        {job.crewNotes ? <Fact name="Notes">{job.crewNotes}</Fact> : null}
        <Fact name="Work">
          {hoursWords(sheet.minutesPlanned)} planned, {hoursWords(sheet.minutesThere)} there
        </Fact>
      </dl>
    </Card>
  )
}
