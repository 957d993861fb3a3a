import { expect, test } from 'vitest'
import { visit } from './browser.ts'
import { demoSignIn, jobIdOf, serveDemo } from './demo.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(serveDemo)

test('with keys alone: a crew is booked, twice on one day only with a reason, and the booking is cancelled and brought back', async () => {
  const { browser, app } = served()
  const office = await visit(browser, app.url, demoSignIn('marnie'))
  const { page } = office
  await office.goto(`/calendar/book?job=${jobIdOf(app.db, 'QR-104')}&day=2026-12-03`)
  await page.getByLabel('Crew', { exact: true }).focus()
  await page.keyboard.type('Bevel')
  await page.getByRole('radio', { name: 'Pencilled' }).focus()
  await page.keyboard.press('ArrowRight')
  expect(await page.getByRole('radio', { name: 'Firm' }).isChecked()).toBe(true)
  await page.getByLabel('Gear to bring').focus()
  await page.keyboard.type('Drop saw')
  await page.getByRole('button', { name: 'Book', exact: true }).focus()
  await page.keyboard.press('Enter')

  // The second crew stands on the surgery that Thursday: refused with the reason, allowed on purpose.
  const refusal = page.getByRole('alert').filter({ hasText: 'QR-107' })
  await refusal.waitFor()
  await page.getByLabel('Why both are booked').focus()
  await page.keyboard.type('Two of them finish the surgery by noon')
  await page.keyboard.press('Enter')
  const cell = page.getByRole('button', {
    name: /Thu 3 Dec: House with octagonal end, Bevel crew, firm/,
  })
  await cell.waitFor()

  await cell.focus()
  await page.keyboard.press('Enter')
  await page.getByRole('button', { name: 'Cancel the booking' }).focus()
  await page.keyboard.press('Enter')
  await cell.waitFor({ state: 'detached' })
  const cancelled = page.locator('li').filter({ hasText: 'cancelled.' })
  await cancelled.getByRole('button', { name: 'Undo' }).focus()
  await page.keyboard.press('Enter')
  await cell.waitFor()
  // The browser reports the refusals (409) by itself.
  expect(office.complaints.filter((line) => !line.includes('409'))).toEqual([])
  await office.close()
})
