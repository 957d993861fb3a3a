import type { Route } from '@playwright/test'
import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { dayLogDelays, dayLogPeople, dayLogs } from '../../server/db/tables/day-log-tables.ts'
import { phone, visit } from './browser.ts'
import { dayIdOf, demoSignIn, jobIdOf, serveDemo } from './demo.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(() => serveDemo())
const today = '2026-12-02'

function storedLog(dayId: string) {
  const { app } = served()
  const log = app.db.select().from(dayLogs).where(eq(dayLogs.bookingDayId, dayId)).get()
  if (!log) return null
  const people = app.db.select().from(dayLogPeople).where(eq(dayLogPeople.dayLogId, log.id)).all()
  const delays = app.db.select().from(dayLogDelays).where(eq(dayLogDelays.dayLogId, log.id)).all()
  return { log, people, delays }
}

test('a leading hand closes a wet day from Today on a phone in under 20 seconds', async () => {
  const { browser, app } = served()
  const dayId = dayIdOf(app.db, 'QR-108', today)
  const lead = await visit(browser, app.url, demoSignIn('tamsin'), {
    viewport: phone,
    touch: true,
  })
  const { page } = lead
  await lead.goto('/today')

  const began = Date.now()
  await page.getByRole('link', { name: 'Close the day' }).first().click()
  await page.getByRole('heading', { name: 'Close Wed 2 Dec' }).waitFor()
  await page.getByRole('button', { name: 'Hours of Wil Osei: less' }).click()
  await page.getByLabel('Add what held you up').selectOption({ label: 'Weather' })
  await page.getByRole('button', { name: 'Hours lost: Weather: more' }).click()
  await page.getByRole('button', { name: 'Close the day, 23¾ h' }).click()
  await page.getByText('Day closed by Tamsin Rook: 23¾ h').waitFor()
  expect(Date.now() - began).toBeLessThan(20_000)

  const stored = storedLog(dayId)
  expect(stored?.people.map((row) => row.minutes).sort()).toEqual([465, 480, 480])
  expect(stored?.delays).toMatchObject([{ reason: 'weather', lostMinutes: 210 }])
  // The sheet says it beside the plan.
  expect(await page.getByText('23¾ h logged, 3½ h of them lost').count()).toBe(1)

  await page.getByRole('button', { name: 'Undo' }).click()
  await page.getByRole('link', { name: 'Close the day' }).first().waitFor()
  expect(storedLog(dayId)).toBeNull()
  expect(lead.complaints).toEqual([])
  await lead.close()
})

test('a log that did not arrive is still there after a reload, and is sent when the line is back', async () => {
  const { browser, app } = served()
  const dayId = dayIdOf(app.db, 'QR-108', today)
  const lead = await visit(browser, app.url, demoSignIn('tamsin'), { viewport: phone })
  const { page } = lead
  await lead.goto(`/today/close/${dayId}`)
  await page.getByLabel('What was done').fill('All creepers up')
  const isWrite = (route: Route) => route.request().method() === 'PUT'
  await page.route('**/log', (route) => (isWrite(route) ? route.abort() : route.fallback()))
  await page.getByRole('button', { name: /^Close the day/ }).click()
  await page.getByText('No answer from the server').waitFor()
  expect(storedLog(dayId)).toBeNull()

  // The phone is put away and taken out again: the page knows only what the device kept.
  await page.reload()
  await page.getByText('Not sent yet').waitFor()
  expect(await page.getByLabel('What was done').inputValue()).toBe('All creepers up')

  await page.getByRole('button', { name: /^Close the day/ }).click()
  await page.getByText('No answer from the server').waitFor()
  await page.unroute('**/log')
  await page.evaluate(() => window.dispatchEvent(new Event('online')))
  await page.getByText(/Day closed by Tamsin Rook/).waitFor()
  expect(storedLog(dayId)?.log.done).toBe('All creepers up')
  await lead.close()
})

test('two who close one day are shown both logs, and one press keeps the own', async () => {
  const { browser, app } = served()
  const dayId = dayIdOf(app.db, 'QR-108', today)
  app.db.delete(dayLogs).run()
  const lead = await visit(browser, app.url, demoSignIn('tamsin'), { viewport: phone })
  await lead.goto(`/today/close/${dayId}`)
  await lead.page.getByLabel('Remarks').fill('From site')
  const office = await visit(browser, app.url, demoSignIn('marnie'))
  await office.goto(`/today/close/${dayId}`)
  await office.page.getByLabel('Remarks').fill('By phone')
  await office.page.getByRole('button', { name: /^Close the day/ }).click()

  await lead.page.getByText('Marnie Quill has closed or corrected this day meanwhile').waitFor()
  await lead.page.getByText('By phone').waitFor()
  await lead.page.getByText('From site').waitFor()
  const byOffice = storedLog(dayId)?.log
  expect(byOffice?.remarks).toBe('By phone')
  await lead.page.getByRole('button', { name: 'Use yours' }).click()
  await lead.page.getByText(/Day closed by Tamsin Rook/).waitFor()
  expect(storedLog(dayId)?.log).toMatchObject({
    remarks: 'From site',
    version: byOffice!.version + 1,
  })
  await lead.close()
  await office.close()
})

test('the office reads hours beside the plan, prints the lost time without prices and saves the week', async () => {
  const { browser, app } = served()
  const jobId = jobIdOf(app.db, 'QR-108')
  const dayId = dayIdOf(app.db, 'QR-108', today)
  const office = await visit(browser, app.url, demoSignIn('marnie'))
  const { page } = office
  await office.goto(`/today/close/${dayId}`)
  await page.getByLabel('Add what held you up').selectOption({ label: 'Timber late' })
  await page.getByRole('button', { name: /^(Close the day|Save the correction)/ }).click()
  await page.getByText(/Day closed by Marnie Quill/).waitFor()

  await office.goto(`/jobs/${jobId}/hours`)
  await page
    .getByRole('row', { name: /Wed 2 Dec/ })
    .getByText('24 h')
    .first()
    .waitFor()
  await page.getByRole('link', { name: 'Lost time for the builder' }).click()
  await page.getByRole('heading', { name: /^Lost time/ }).waitFor()
  expect(await page.getByRole('row', { name: /Timber late/ }).count()).toBe(1)
  expect(await page.getByRole('main').innerText()).not.toContain('$')
  const pdf = await page.pdf({ preferCSSPageSize: true })
  // A4 in points, as the file itself says: 595.92 by 841.92 within a point.
  const box = /MediaBox \[\s*0 0 ([\d.]+) ([\d.]+)\s*\]/.exec(pdf.toString('latin1'))
  expect(Math.abs(Number(box?.[1]) - 595.3)).toBeLessThan(1.5)
  expect(Math.abs(Number(box?.[2]) - 841.9)).toBeLessThan(1.5)

  await office.goto('/hours')
  const [file] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('link', { name: 'Save as CSV' }).click(),
  ])
  expect(file.suggestedFilename()).toBe('hours-2026-11-30.csv')
  expect(office.complaints).toEqual([])
  await office.close()
})
