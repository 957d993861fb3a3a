import { and, eq, gte, lte } from 'drizzle-orm'
import type { z } from 'zod'
import type { Day } from '../../shared/calendar/days.ts'
import { isAwayOn } from '../../shared/people/leave-days.ts'
import type { addLoanSchema, Loan } from '../../shared/people/people-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { DbOrTx } from '../db/client.ts'
import { crewLoans, crews, leave } from '../db/tables/people-tables.ts'
import { invalidField, notFound } from '../http/app-error.ts'
import { newId } from '../lib/ids.ts'
import {
  changePeople,
  firmToday,
  type PeopleDeps,
  requireCrew,
  requirePersonRow,
} from './people-change.ts'
import { crewIdsOf } from './roster.ts'

type LoanInput = z.output<typeof addLoanSchema>

/** Why a person cannot be lent that day, at its field; nothing when it can be. */
function refuseLoan(tx: DbOrTx, personId: string, { crewId, day }: LoanInput): void {
  const person = requirePersonRow(tx, personId)
  if (!person.active) throw invalidField('personId', `${person.name} has no access any more.`)
  const lent = tx
    .select({ crew: crews.name })
    .from(crewLoans)
    .innerJoin(crews, eq(crews.id, crewLoans.crewId))
    .where(and(eq(crewLoans.personId, personId), eq(crewLoans.day, day)))
    .get()
  if (lent) throw invalidField('day', `${person.name} is with ${lent.crew} that day already.`)
  if (crewIdsOf(tx, personId, day).includes(crewId))
    throw invalidField('crewId', `That is the own crew of ${person.name} that day.`)
  if (leavesOn(tx, personId, day).length > 0)
    throw invalidField('day', `${person.name} is away that day. Pick another day.`)
}

function leavesOn(tx: DbOrTx, personId: string, day: Day) {
  return tx
    .select()
    .from(leave)
    .where(and(eq(leave.personId, personId), lte(leave.startsOn, day), gte(leave.endsOn, day)))
    .all()
    .filter((span) => isAwayOn(span, day))
}

/** For one day the person works with another crew than the own one. */
export function addLoan(
  deps: PeopleDeps,
  user: CurrentUser,
  personId: string,
  input: LoanInput,
): Loan {
  const loan = { id: newId(), ...input }
  changePeople(deps, user, { action: 'lent for a day', entityId: personId }, (tx) => {
    requireCrew(tx, input.crewId)
    if (input.day < firmToday(deps))
      throw invalidField('day', 'Lend from today on: days past stay as they were.')
    refuseLoan(tx, personId, input)
    tx.insert(crewLoans)
      .values({ ...loan, personId })
      .run()
  })
  return loan
}

/** The person is back with the own crew that day. Days past stay as they were. */
export function dropLoan(
  deps: PeopleDeps,
  user: CurrentUser,
  personId: string,
  loanId: string,
): void {
  changePeople(deps, user, { action: 'lending taken back', entityId: personId }, (tx) => {
    const gone = tx
      .delete(crewLoans)
      .where(
        and(
          eq(crewLoans.id, loanId),
          eq(crewLoans.personId, personId),
          gte(crewLoans.day, firmToday(deps)),
        ),
      )
      .run()
    if (gone.changes === 0) throw notFound('That day')
  })
}
