import { and, eq } from 'drizzle-orm'
import { z } from 'zod'
import { emailSchema, lineSchema } from '../../shared/http/fields.ts'
import { invitationHours, issuePasswordToken } from '../auth/password-links.ts'
import type { Db } from '../db/client.ts'
import { people } from '../db/tables/people-tables.ts'
import { writeAudit } from '../lib/audit.ts'
import { newId } from '../lib/ids.ts'

const whoSchema = z.object({
  email: emailSchema,
  name: lineSchema(80, { required: 'Give a name.' }),
})

function readWho(input: { email: string; name: string }): z.infer<typeof whoSchema> {
  const parsed = whoSchema.safeParse(input)
  if (parsed.success) return parsed.data
  throw new Error(parsed.error.issues.map((issue) => issue.message).join('\n'))
}

/**
 * Makes the first office account of a new installation and gives the token of its password link.
 *
 * @throws Error in plain words: an address or a name that cannot be, or an office account already there,
 * which makes all others.
 */
export function makeFirstAccount(
  db: Db,
  input: { email: string; name: string; now: Date },
): string {
  const { email, name } = readWho(input)
  return db.transaction((tx) => {
    const office = tx
      .select({ id: people.id })
      .from(people)
      .where(and(eq(people.role, 'office'), eq(people.active, true)))
      .get()
    if (office)
      throw new Error('There is an office account already; it makes all others under People.')
    const id = newId()
    tx.insert(people)
      .values({ id, email, name, role: 'office', passwordHash: null, createdAt: input.now })
      .run()
    writeAudit(tx, {
      at: input.now,
      personId: null,
      action: 'first account',
      entity: 'person',
      entityId: id,
    })
    return issuePasswordToken(tx, id, input.now, invitationHours)
  })
}
