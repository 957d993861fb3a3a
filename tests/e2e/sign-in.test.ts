import { expect, test } from 'vitest'
import { phone, serveTestApp, visit } from './browser.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(serveTestApp)

test('a wrong password says so, a right one leads to where the person was going', async () => {
  const { browser, app } = served()
  const person = app.addPerson('office', 'Orla Brandt')
  const visitor = await visit(browser, app.url, undefined, { viewport: phone })
  const { page } = visitor
  await page.goto('/people?q=orla')
  await page.getByLabel('E-mail').fill(person.email)
  await page.getByLabel('Password').fill('not the one')
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.getByRole('alert').filter({ hasText: 'do not go together' }).waitFor()
  await page.getByLabel('Password').fill('plumb bob and string line')
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.getByRole('heading', { level: 1, name: 'People' }).waitFor()
  expect(new URL(page.url()).search).toBe('?q=orla')
  // The browser itself reports the refused sign-in.
  expect(visitor.complaints.filter((line) => !line.includes('401'))).toEqual([])
  await visitor.close()
})
