import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { bookingDays, bookings } from '../../server/db/tables/booking-tables.ts'
import { visit } from './browser.ts'
import { demoSignIn, jobIdOf, serveDemo } from './demo.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(serveDemo)

test('with keys alone: days are found for a job, the first opening is taken, and taken back', async () => {
  const { browser, app } = served()
  const standing = () =>
    app.db
      .select({ day: bookingDays.day, cancelledAt: bookings.cancelledAt })
      .from(bookingDays)
      .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
      .where(eq(bookings.jobId, jobIdOf(app.db, 'QR-104')))
      .all()
      .filter((row) => row.cancelledAt === null)
  const office = await visit(browser, app.url, demoSignIn('marnie'))
  await office.goto('/calendar')
  const link = office.page.getByRole('link', { name: /^Find days for House with octagonal end/ })
  await link.press('Enter')
  const panel = office.page.getByRole('dialog', { name: 'Find days' })
  await panel.getByText('the earliest there is').waitFor()
  await panel.getByText('Scaffold or edge protection first').waitFor()
  expect(standing()).toEqual([])
  await panel
    .getByRole('button', { name: /^Pencil in/ })
    .first()
    .press('Enter')
  await panel.waitFor({ state: 'detached' })
  expect(standing().length).toBeGreaterThan(0)
  const taken = office.page.locator('li').filter({ hasText: 'Pencilled in:' })
  await taken.getByRole('button', { name: 'Undo' }).press('Enter')
  await office.page.getByText('Taken back: the calendar stands as before.').first().waitFor()
  expect(standing()).toEqual([])
  expect(office.complaints).toEqual([])
  await office.close()
})
