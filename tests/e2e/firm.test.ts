import { expect, test } from 'vitest'
import { readFirm } from '../../server/firm/firm-store.ts'
import { desk, visit } from './browser.ts'
import { demoSignIn, serveDemo } from './demo.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(() => serveDemo())

test('the office types a Christmas break, a short Friday, a holiday worked and its own minutes, and goes back to a default', async () => {
  const { browser, app } = served()
  const office = await visit(browser, app.url, demoSignIn('marnie'), { viewport: desk })
  const { page } = office
  await office.goto('/firm')

  await page.getByLabel('Some weekdays are longer or shorter').check()
  await page.getByLabel('Fri (h)').fill('6')
  await page.getByLabel('First day').fill('2026-12-21')
  await page.getByLabel('Last day').fill('2027-01-08')
  await page.getByLabel('Why', { exact: true }).fill('Christmas break')
  await page.getByRole('button', { name: 'Add', exact: true }).click()
  await page.getByText('Mon 21 Dec 2026 to Fri 8 Jan 2027 · Christmas break').waitFor()
  await page.getByRole('checkbox', { name: 'Mon 26 Jan · Australia Day' }).uncheck()
  await page.getByText('Rafters and lines, each piece').click()
  const cutHips = page.getByRole('group', { name: 'Hip', exact: true }).getByLabel('Cut (min)')
  await cutHips.fill('22')
  await page.getByRole('button', { name: 'Save settings' }).click()
  await page.getByText('Settings saved.').first().waitFor()

  const saved = readFirm(app.db)
  expect(saved.weekHours).toEqual([8, 8, 8, 8, 6, 0, 0])
  expect(saved.ownClosedDays).toEqual([
    { day: '2026-12-21', lastDay: '2027-01-08', name: 'Christmas break' },
  ])
  expect(saved.holidaysWorked).toEqual(['Australia Day'])
  expect(saved.labourRates.pieces.hip.cutMinutes).toBe(22)

  await page.getByRole('button', { name: 'Hip, Cut: back to the default' }).click()
  expect(await cutHips.inputValue()).toBe('15')
  await page.getByRole('button', { name: 'Save settings' }).click()
  await expect.poll(() => readFirm(app.db).labourRates.pieces.hip.cutMinutes).toBe(15)
  expect(office.complaints).toEqual([])
  await office.close()
})
