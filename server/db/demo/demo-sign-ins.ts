import { eq } from 'drizzle-orm'
import { roleNames } from '../../../shared/auth/roles.ts'
import type { Db } from '../client.ts'
import { people } from '../tables/people-tables.ts'
import { demoEmail, demoPassword, demoPeople } from './demo-people.ts'

/** Whether the demo firm's office is in this database. */
export function hasDemo(db: Db): boolean {
  const [first] = demoPeople
  if (!first) return false
  return (
    db
      .select({ id: people.id })
      .from(people)
      .where(eq(people.email, demoEmail(first)))
      .get() !== undefined
  )
}

/** Who can be signed in as, to print at the start. */
export function demoSignIns(): string {
  const lines = demoPeople.map((person) => {
    const crew = person.crew ? `, crew ${person.crew}` : ''
    return `  ${demoEmail(person).padEnd(28)} ${roleNames[person.role]}${crew}`
  })
  return [`Demo sign-ins, password ${demoPassword}:`, ...lines].join('\n')
}
