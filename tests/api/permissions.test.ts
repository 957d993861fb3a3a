import { expect, test } from 'vitest'
import { roleMay } from '../../shared/auth/permissions.ts'
import { roles } from '../../shared/auth/roles.ts'
import { createTestApp } from './harness.ts'

const missingId = '00000000-0000-4000-8000-000000000000'

function filled(path: string): string {
  return path.replaceAll(/:[A-Za-z]+/g, missingId)
}

test('every route answers 401 signed out unless it is public, 403 to a role without its permission', async () => {
  const app = await createTestApp()
  const anonymous = await app.agentFor()
  const faults: string[] = []
  for (const { method, path, access } of app.api.routes) {
    if (access === 'public') continue
    const answer = await anonymous[method](filled(path))
    if (answer.status !== 401) faults.push(`signed out: ${method} ${path} gave ${answer.status}`)
  }
  for (const role of roles) {
    const agent = await app.agentFor(app.addPerson(role, `Walker ${role}`).email)
    for (const { method, path, access } of app.api.routes) {
      // Signing out would end the walk; the event stream never ends by itself.
      const skipped = path === '/api/events' || (method === 'delete' && path === '/api/session')
      if (access === 'public' || skipped) continue
      const answer = await agent[method](filled(path)).send(method === 'get' ? undefined : {})
      const refused = answer.status === 403
      if (answer.status === 401) faults.push(`${role}: ${method} ${path} was signed out`)
      if (answer.status >= 500) faults.push(`${role}: ${method} ${path} gave ${answer.status}`)
      if (refused === roleMay(role, access))
        faults.push(`${role}: ${method} ${path} gave ${answer.status}`)
    }
  }
  expect(faults).toEqual([])
  expect(app.api.routes.length).toBeGreaterThan(15)
})

test('an id that is nobody’s and an id that is no id at all answer alike: 404', async () => {
  const app = await createTestApp()
  const office = app.addPerson('office', 'Orla Brandt')
  const agent = await app.agentFor(office.email)
  const faults: string[] = []
  for (const { method, path } of app.api.routes) {
    if (!path.includes(':')) continue
    for (const id of [missingId, 'no-id', '%27--', 'x'.repeat(2000)]) {
      const answer = await agent[method](path.replaceAll(/:[A-Za-z]+/g, id))
      // A write may find fault with its empty body first.
      const isRefused = answer.status === 404 || (method !== 'get' && answer.status === 400)
      if (!isRefused) faults.push(`${method} ${path} with ${id} gave ${answer.status}`)
    }
  }
  expect(faults).toEqual([])
})
