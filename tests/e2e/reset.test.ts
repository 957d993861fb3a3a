import { expect, test } from 'vitest'
import { phone, serveTestApp, visit } from './browser.ts'
import { mailFor } from './demo.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(serveTestApp)

test('a forgotten password is reset by the link in the mail, which works once', async () => {
  const { browser, app } = served()
  const person = app.addPerson('leading-hand', 'Tamsin Rook')
  const mail = mailFor(app)
  const { page, complaints, close } = await visit(browser, app.url, undefined, { viewport: phone })
  await page.goto('/sign-in')
  await page.getByRole('link', { name: 'Forgotten the password?' }).click()
  await page.getByLabel('E-mail').fill(person.email)
  await page.getByRole('button', { name: 'Send me a link' }).click()
  await page.getByRole('status').filter({ hasText: 'on its way' }).waitFor()
  await mail.worker.runOnce()
  const link = mail.fake.sent[0]?.text.match(/https?:\/\/\S+set-password\S+/)?.[0] ?? ''
  expect(link).toContain(`${app.url}/set-password?token=`)
  await page.goto(link)
  await page.getByLabel('New password').fill('a fresh one for summer')
  await page.getByRole('button', { name: 'Save and sign in' }).click()
  await page.waitForURL('**/today')
  expect(complaints).toEqual([])
  await close()
  const again = await visit(browser, app.url, undefined, { viewport: phone })
  await again.page.goto(link)
  await again.page.getByLabel('New password').fill('another one altogether')
  await again.page.getByRole('button', { name: 'Save and sign in' }).click()
  await again.page.getByRole('alert').filter({ hasText: 'has been used' }).waitFor()
  await again.close()
  await (
    await app.agentFor()
  )
    .post('/api/session')
    .send({ email: person.email, password: 'a fresh one for summer' })
    .expect(201)
})
