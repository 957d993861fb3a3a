import { and, eq } from 'drizzle-orm'
import type { z } from 'zod'
import type { addLeaveSchema } from '../../shared/people/leave-schemas.ts'
import type { Person } from '../../shared/people/people-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import { leave } from '../db/tables/people-tables.ts'
import { notFound } from '../http/app-error.ts'
import { newId } from '../lib/ids.ts'
import { changePeople, type PeopleDeps, personView, requirePersonRow } from './people-change.ts'

export function addLeave(
  deps: PeopleDeps,
  user: CurrentUser,
  personId: string,
  input: z.output<typeof addLeaveSchema>,
): Person {
  changePeople(deps, user, { action: 'leave added', entityId: personId }, (tx) => {
    requirePersonRow(tx, personId)
    tx.insert(leave)
      .values({ id: newId(), personId, ...input })
      .run()
  })
  return personView(deps, personId)
}

export function dropLeave(
  deps: PeopleDeps,
  user: CurrentUser,
  personId: string,
  leaveId: string,
): Person {
  changePeople(deps, user, { action: 'leave taken back', entityId: personId }, (tx) => {
    const gone = tx
      .delete(leave)
      .where(and(eq(leave.id, leaveId), eq(leave.personId, personId)))
      .run()
    if (gone.changes === 0) throw notFound('That leave')
  })
  return personView(deps, personId)
}
