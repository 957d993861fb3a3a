import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { bookingDays, bookings } from '../../server/db/tables/booking-tables.ts'
import { phone, visit } from './browser.ts'
import { bookingIdOf, demoSignIn, jobIdOf, serveDemo } from './demo.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(serveDemo)

test('a leading hand asks from Today, the office sees it at once, looks, moves the crew on, and takes it back', async () => {
  const { browser, app } = served()
  const daysOf = (number: string) =>
    app.db
      .select({ day: bookingDays.day })
      .from(bookingDays)
      .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
      .where(eq(bookings.jobId, jobIdOf(app.db, number)))
      .all()
      .map((row) => row.day)
      .sort()
  const [office, lead] = await Promise.all([
    visit(browser, app.url, demoSignIn('marnie')),
    visit(browser, app.url, demoSignIn('corin'), { viewport: phone, touch: true }),
  ])
  await Promise.all([office.goto('/calendar'), lead.goto('/today?day=2026-12-03')])
  await lead.page.getByRole('link', { name: 'Ask for a rain-off' }).click()
  await lead.page.getByLabel('What it is like').fill('Plates under water')
  await lead.page.getByRole('button', { name: 'Ask the office' }).click()
  await lead.page.getByText('Rain-off asked for Thu 3 Dec, 1 working day.').waitFor()

  const asked = office.page.getByRole('listitem').filter({ hasText: 'Corin Hale asks' })
  await asked.getByText('Plates under water').waitFor()
  const before = daysOf('QR-107')
  expect(before).toContain('2026-12-03')
  await asked.getByRole('link', { name: 'Look and answer' }).press('Enter')
  const panel = office.page.getByRole('dialog', { name: 'Rain-off' })
  const surgery = panel.getByRole('listitem').filter({ hasText: 'QR-107 Surgery' })
  await surgery.getByText('Fri 4 Dec').waitFor()
  // Shown, not moved; and the words for work at height stand beside it.
  expect(daysOf('QR-107')).toEqual(before)
  await panel.getByText('Scaffold or edge protection first').waitFor()
  await panel.getByRole('button', { name: /^Move \d+ booking/ }).press('Enter')
  await panel.waitFor({ state: 'detached' })
  expect(daysOf('QR-107')).not.toContain('2026-12-03')
  await lead.page.getByText('Marnie Quill has moved the crew on from Thu 3 Dec.').waitFor()

  // Somebody changes a moved booking: undone only once that is settled, and it says which one.
  const id = bookingIdOf(app.db, 'QR-107')
  const versionIs = (version: number) =>
    app.db.update(bookings).set({ version }).where(eq(bookings.id, id)).run()
  const moved = app.db.select().from(bookings).where(eq(bookings.id, id)).get()?.version ?? 0
  versionIs(moved + 1)
  const undo = office.page.getByRole('button', { name: 'Undo the rain-off' })
  await undo.press('Enter')
  await office.page.getByText('QR-107 has been changed since').first().waitFor()
  versionIs(moved)
  await undo.press('Enter')
  await undo.waitFor({ state: 'detached' })
  expect(daysOf('QR-107')).toEqual(before)
  expect(lead.complaints).toEqual([])
  // The browser reports the refusal (409) by itself.
  expect(office.complaints.filter((line) => !line.includes('409'))).toEqual([])
  await lead.close()
  await office.close()
})
