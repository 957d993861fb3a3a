import { createTestApp } from './harness.ts'

export const missingId = '00000000-0000-4000-8000-000000000000'

/** Office, and two crews: a leading hand with an apprentice, and a leading hand alone. */
export async function twoCrewFirm() {
  const app = await createTestApp()
  const office = app.addPerson('office', 'Orla Brandt')
  const lead = app.addPerson('leading-hand', 'Tamsin Rook')
  const apprentice = app.addPerson('apprentice', 'Wil Osei')
  const otherLead = app.addPerson('leading-hand', 'Bex Arden')
  const adze = app.addCrew('Adze crew', [lead.id, apprentice.id])
  const bevel = app.addCrew('Bevel crew', [otherLead.id])
  const agent = await app.agentFor(office.email)
  return { app, office, lead, apprentice, otherLead, adze, bevel, agent }
}
