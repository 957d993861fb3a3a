import { eq } from 'drizzle-orm'
import { type Day, dayPlus } from '../../../shared/calendar/days.ts'
import type { LeaveKind } from '../../../shared/people/leave-kinds.ts'
import type { TicketKind } from '../../../shared/people/ticket-kinds.ts'
import { newId } from '../../lib/ids.ts'
import type { DbOrTx } from '../client.ts'
import { crewLoans, crewMembers, leave, people, tickets } from '../tables/people-tables.ts'
import { type DemoPerson, demoPeople } from './demo-people.ts'

/** Days are counted from today. */
type DemoLeave = {
  key: string
  kind: LeaveKind
  from: number
  to: number
  weekdays: number[] | null
  reason: string
}

const demoLeave: DemoLeave[] = [
  {
    key: 'odette',
    kind: 'trade-school',
    from: -60,
    to: 240,
    weekdays: [3],
    reason: 'Second year, day release',
  },
  { key: 'bram', kind: 'leave', from: 22, to: 26, weekdays: null, reason: 'Sister’s wedding' },
  { key: 'sef', kind: 'leave', from: 35, to: 46, weekdays: null, reason: '' },
]

const demoLoan = { key: 'bram', crew: 'B', note: 'Two apprentices for the long ridge' }
const demoMove = { key: 'bram', from: 'B', daysAgo: 90, cameDaysAgo: 320 }
const demoHours = { key: 'nell', weekHours: [8, 8, 8, 8, 5, 0, 0] }

type DemoTicket = { kind: TicketKind; name: string; expiresIn: number | null }

const longGood = 500
/** Whose working at heights is soon to be done again. */
const lapsesSoon = { key: 'jun', expiresIn: 20 }

function ticketsFor(person: DemoPerson, place: number): DemoTicket[] {
  const heightsIn = person.key === lapsesSoon.key ? lapsesSoon.expiresIn : longGood + 40 * place
  const onSite: DemoTicket[] = [
    { kind: 'working-at-heights', name: '', expiresIn: heightsIn },
    { kind: 'construction-induction', name: '', expiresIn: null },
  ]
  const firstAid: DemoTicket = { kind: 'first-aid', name: '', expiresIn: 300 + 11 * place }
  if (person.role === 'office') return [firstAid]
  if (person.role === 'apprentice') return onSite
  return [
    ...onSite,
    firstAid,
    { kind: 'trade-licence', name: 'Carpentry', expiresIn: 700 + 25 * place },
    { kind: 'elevated-platform', name: 'Boom over 11 m', expiresIn: 900 + 25 * place },
  ]
}

/** Numbers of no issuer. */
const numberOf = (place: number, i: number): string => `DEMO ${1000 + 10 * place + i}`

type Seeding = {
  /** Of people by key and of crews by letter. */
  ids: ReadonlyMap<string, string>
  today: Day
  /** A working day that somebody is lent on. */
  loanDay: Day
}

function seedTickets(tx: DbOrTx, { ids, today }: Seeding): void {
  for (const [place, person] of demoPeople.entries()) {
    const personId = ids.get(person.key) ?? ''
    for (const [i, { expiresIn, ...ticket }] of ticketsFor(person, place).entries()) {
      const expiresOn = expiresIn === null ? null : dayPlus(today, expiresIn)
      const row = { id: newId(), personId, number: numberOf(place, i), expiresOn, ...ticket }
      tx.insert(tickets).values(row).run()
    }
  }
}

function seedMove(tx: DbOrTx, { ids, today }: Seeding): void {
  const personId = ids.get(demoMove.key) ?? ''
  const startsOn = dayPlus(today, -demoMove.daysAgo)
  tx.update(crewMembers).set({ startsOn }).where(eq(crewMembers.personId, personId)).run()
  tx.insert(crewMembers)
    .values({
      id: newId(),
      personId,
      crewId: ids.get(demoMove.from) ?? '',
      startsOn: dayPlus(today, -demoMove.cameDaysAgo),
      endsOn: dayPlus(startsOn, -1),
    })
    .run()
}

/** What the demo's people hold, their hours, when they are away, who came from where and who is lent. */
export function seedDemoTime(tx: DbOrTx, seeding: Seeding): void {
  const { ids, today, loanDay } = seeding
  seedTickets(tx, seeding)
  seedMove(tx, seeding)
  tx.update(people)
    .set({ weekHours: demoHours.weekHours })
    .where(eq(people.id, ids.get(demoHours.key) ?? ''))
    .run()
  for (const { key, from, to, ...away } of demoLeave) {
    const span = { startsOn: dayPlus(today, from), endsOn: dayPlus(today, to) }
    tx.insert(leave)
      .values({ id: newId(), personId: ids.get(key) ?? '', ...span, ...away })
      .run()
  }
  const lent = { personId: ids.get(demoLoan.key) ?? '', crewId: ids.get(demoLoan.crew) ?? '' }
  tx.insert(crewLoans)
    .values({ id: newId(), ...lent, day: loanDay, note: demoLoan.note })
    .run()
}
