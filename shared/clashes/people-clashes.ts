import { type Day, formatDay } from '../calendar/days.ts'
import { type LeaveKind, leaveKinds } from '../people/leave-kinds.ts'
import type { ClashFacts } from './clash-facts.ts'
import type { Clash } from './clash-schemas.ts'
import { awayWords, namesInWords, ticketWords } from './clash-words.ts'
import { isTradesperson, type LapsedTicket, lapsedTickets } from './ticket-rules.ts'

export type DayClash = Omit<Clash, 'day'>

type CrewDay = ReturnType<ClashFacts['crews']['on']>
type Crew = { id: string; name: string }

function nobodyThere(crew: Crew, { there }: CrewDay): DayClash[] {
  if (there.length > 0) return []
  return [
    {
      code: 'nobody-there',
      weight: 'clash',
      text: `Nobody of ${crew.name} is there that day.`,
      wayOut: 'Put people in the crew for that day or give the day to another crew.',
    },
  ]
}

function apprenticeAlone({ crews }: ClashFacts, { there }: CrewDay, day: Day): DayClash[] {
  const apprentices = there.filter((person) => person.role === 'apprentice')
  if (apprentices.length === 0) return []
  if (there.some((person) => isTradesperson(person, crews.ticketsOf(person.id), day))) return []
  const verb = apprentices.length === 1 ? 'is' : 'are'
  return [
    {
      code: 'apprentice-alone',
      weight: 'clash',
      text: `${namesInWords(apprentices.map((p) => p.name))} ${verb} there without a tradesperson.`,
      wayOut: 'Lend the crew a leading hand or a licensed tradesperson for the day.',
    },
  ]
}

type Lapsed = { name: string; ticket: LapsedTicket }

function lapsedWords({ name, ticket }: Lapsed, reader: ClashFacts['reader']): string {
  const what = `${name}: ${ticketWords[ticket.kind]}`
  // Dates of tickets are between the person and the office.
  return reader === 'office' ? `${what} lapsed ${formatDay(ticket.expiresOn)}.` : `${what} lapsed.`
}

function ticketClashes({ crews, reader }: ClashFacts, { there }: CrewDay, day: Day): DayClash[] {
  const lapsed = there.flatMap(({ id, name }): Lapsed[] =>
    lapsedTickets(crews.ticketsOf(id), day).map((ticket) => ({ name, ticket })),
  )
  const none = there.filter(
    ({ id }) => !crews.ticketsOf(id).some((ticket) => ticket.kind === 'working-at-heights'),
  )
  const asClash = (weight: Clash['weight'], of: readonly Lapsed[]): DayClash[] =>
    of.length === 0
      ? []
      : [
          {
            code: 'ticket-lapsed',
            weight,
            text: of.map((one) => lapsedWords(one, reader)).join(' '),
            wayOut: 'Enter the renewed ticket on People, or keep them off what it is for that day.',
          },
        ]
  return [
    ...asClash(
      'clash',
      lapsed.filter(({ ticket }) => ticket.isNeeded),
    ),
    ...asClash(
      'caution',
      lapsed.filter(({ ticket }) => !ticket.isNeeded),
    ),
    ...(none.length === 0
      ? []
      : [
          {
            code: 'ticket-lapsed' as const,
            weight: 'caution' as const,
            text: `No working at heights ticket kept for ${namesInWords(none.map((p) => p.name))}.`,
            wayOut: 'Enter the ticket on People, or book the course before that day.',
          },
        ]),
  ]
}

function awayText(away: CrewDay['away'], reader: ClashFacts['reader']): string {
  if (reader === 'crew') return `Away: ${away.map((p) => p.name).join(', ')}.`
  const ofKind = (kind: LeaveKind): string => {
    const names = away.filter((person) => person.kind === kind).map((person) => person.name)
    return names.length === 0 ? '' : `${awayWords[kind]}: ${names.join(', ')}.`
  }
  return leaveKinds.map(ofKind).filter(Boolean).join(' ')
}

function peopleAway({ reader }: ClashFacts, { there, away }: CrewDay): DayClash[] {
  // With nobody there that is said already.
  if (away.length === 0 || there.length === 0) return []
  return [
    {
      code: 'on-leave',
      weight: 'caution',
      text: awayText(away, reader),
      wayOut: 'The hours are counted without them. Add a person or a day.',
    },
  ]
}

/** What is amiss with who is there on a day of a crew. */
export function peopleClashes(facts: ClashFacts, crew: Crew, day: Day): DayClash[] {
  const crewDay = facts.crews.on(crew.id, day)
  return [
    ...nobodyThere(crew, crewDay),
    ...apprenticeAlone(facts, crewDay, day),
    ...ticketClashes(facts, crewDay, day),
    ...peopleAway(facts, crewDay),
  ]
}
