import { expect, test } from 'vitest'
import { phone, visit } from './browser.ts'
import { demoSignIn, jobIdOf, serveDemo } from './demo.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(serveDemo)

test('the yard’s day is set on the job, the clash shows on another’s calendar within two seconds, and an undo clears it', async () => {
  const { browser, app } = served()
  const desk = await visit(browser, app.url, demoSignIn('desh'))
  await desk.goto('/calendar')
  const count = desk.page.getByRole('link', { name: /^Clashes \(\d+\)$/ })
  await count.waitFor()
  const before = await count.innerText()

  const office = await visit(browser, app.url, demoSignIn('marnie'))
  const { page } = office
  await office.goto(`/jobs/${jobIdOf(app.db, 'QR-107')}`)
  const timber = page.getByRole('listitem').filter({ hasText: 'Timber on site' })
  await timber.getByRole('button', { name: 'Timber on site: day and who brings it' }).click()
  await timber.getByLabel('Day', { exact: true }).fill('2026-12-08')
  await timber.getByRole('button', { name: 'Save' }).click()
  await timber.getByText('Tue 8 Dec').waitFor()

  const more = Number(/\d+/.exec(before)?.[0]) + 1
  const raised = desk.page.getByRole('link', { name: `Clashes (${more})` })
  await raised.waitFor({ timeout: 2_000 })
  await raised.click()
  const panel = desk.page.getByRole('dialog', { name: 'Clashes' })
  await panel.getByText('Timber is promised for Tue 8 Dec, after the first day.').waitFor()
  await panel.getByRole('link', { name: /^QR-107/ }).click()
  const booking = desk.page.getByRole('dialog', { name: 'Surgery with splayed end' })
  await booking.getByRole('heading', { name: 'What stands in the way' }).waitFor()
  expect(await booking.getByText('Start on Tue 8 Dec or later').count()).toBe(1)

  await page.getByRole('button', { name: 'Undo' }).click()
  await booking
    .getByRole('heading', { name: 'What stands in the way' })
    .waitFor({ state: 'detached', timeout: 2_000 })
  expect(office.complaints).toEqual([])
  expect(desk.complaints).toEqual([])
  await office.close()
  await desk.close()
})

test('two who set the same milestone: the second sees both versions and chooses', async () => {
  const { browser, app } = served()
  const path = `/jobs/${jobIdOf(app.db, 'QR-111')}`
  const marnie = await visit(browser, app.url, demoSignIn('marnie'))
  await marnie.goto(path)
  const row = (page: typeof marnie.page) =>
    page.getByRole('listitem').filter({ hasText: 'Frames up' })
  await row(marnie.page)
    .getByRole('button', { name: /day and who brings it/ })
    .click()
  await row(marnie.page).getByRole('textbox', { name: 'Who brings it' }).fill('Hollis Framing')

  const desh = await visit(browser, app.url, demoSignIn('desh'))
  await desh.goto(path)
  await row(desh.page).getByText('Promised').click()
  await desh.page.getByText('Frames up: saved.').first().waitFor()

  await row(marnie.page).getByRole('button', { name: 'Save' }).click()
  const answer = row(marnie.page).getByRole('alert')
  await answer.getByText('Somebody else changed this').waitFor()
  await answer.getByRole('button', { name: 'Save mine' }).click()
  await row(marnie.page).getByText('Hollis Framing').waitFor()
  expect(await row(marnie.page).getByRole('radio', { name: 'Promised' }).isChecked()).toBe(true)
  expect(marnie.complaints.filter((line) => !line.includes('409'))).toEqual([])
  await marnie.close()
  await desh.close()
})

test('on a phone the list fits its width, and Esc goes back to the calendar as it was', async () => {
  const { browser, app } = served()
  const office = await visit(browser, app.url, demoSignIn('marnie'), { viewport: phone })
  const { page } = office
  await office.goto('/calendar/clashes?view=month&weight=caution')
  const panel = page.getByRole('dialog', { name: 'Clashes' })
  await panel.getByText('Edge protection: no day yet.').waitFor()
  expect(await panel.getByText('Timber is promised').count()).toBe(0)
  const wide = await page.evaluate(() => document.documentElement.scrollWidth)
  expect(wide).toBeLessThanOrEqual(phone.width)
  await page.keyboard.press('Escape')
  await page.waitForURL((url) => url.pathname === '/calendar' && url.search === '?view=month')
  expect(office.complaints).toEqual([])
  await office.close()
})
