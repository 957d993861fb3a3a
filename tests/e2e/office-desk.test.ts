import { AxeBuilder } from '@axe-core/playwright'
import { expect, test } from 'vitest'
import { visit } from './browser.ts'
import { demoSignIn, serveDemo } from './demo.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(serveDemo)

async function officeAtDesk() {
  const { browser, app } = served()
  return visit(browser, app.url, demoSignIn('marnie'))
}

test('all seven stages of the board stand side by side at 1440 px', async () => {
  const office = await officeAtDesk()
  await office.goto('/board')
  const complete = office.page.getByRole('heading', { name: /^Complete/ })
  await complete.waitFor()
  const box = await complete.boundingBox()
  expect((box?.x ?? Infinity) + (box?.width ?? 0)).toBeLessThanOrEqual(1440)
  const overflow = await complete.evaluate((heading) => {
    const columns = heading.closest('section')!.parentElement!
    return columns.scrollWidth - columns.clientWidth
  })
  expect(overflow).toBeLessThanOrEqual(0)
  expect(office.complaints).toEqual([])
  await office.close()
})

test('the keys that work are listed under ? and do what the list says', async () => {
  const office = await officeAtDesk()
  const { page } = office
  await office.goto('/board')
  await page.keyboard.press('?')
  const list = page.getByRole('dialog', { name: 'Keys' })
  await list.waitFor()
  const { violations } = await new AxeBuilder({ page }).analyze()
  expect(violations).toEqual([])
  await page.keyboard.press('Escape')
  await list.waitFor({ state: 'hidden' })
  await page.keyboard.press('/')
  const search = page.getByLabel('Find a job')
  expect(await search.evaluate((input) => input === document.activeElement)).toBe(true)
  // In a field a question mark is a question mark.
  await page.keyboard.press('?')
  expect(await search.inputValue()).toBe('?')
  expect(await list.count()).toBe(0)
  expect(office.complaints).toEqual([])
  await office.close()
})

test('a double click saves the settings once, and a form opens at its first field', async () => {
  const office = await officeAtDesk()
  const { page } = office
  await office.goto('/firm')
  await page.getByLabel('Phone').fill('(07) 5550 0141')
  await page.getByRole('button', { name: 'Save settings' }).dblclick()
  await page.getByText('Settings saved.').first().waitFor()
  await page.waitForLoadState('networkidle')
  expect(await page.getByRole('alert').count()).toBe(0)

  await office.goto('/people')
  await page.getByRole('link', { name: 'Add a person' }).click()
  const name = page.getByRole('textbox', { name: 'Name', exact: true })
  await name.waitFor()
  expect(await name.evaluate((input) => input === document.activeElement)).toBe(true)
  expect(office.complaints).toEqual([])
  await office.close()
})
