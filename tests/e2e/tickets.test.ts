import sharp from 'sharp'
import { expect, test } from 'vitest'
import { serveTestApp, visit } from './browser.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(async () => {
  const app = await serveTestApp()
  const office = app.addPerson('office', 'Orla Brandt')
  const apprentice = app.addPerson('apprentice', 'Wil Osei')
  return { ...app, office, apprentice }
})

test('the office keeps a ticket with a photo of its card, the apprentice sees it, and it is removed when asked once', async () => {
  const { browser, app } = served()
  const office = await visit(browser, app.url, { email: app.office.email })
  const { page } = office
  await office.goto(`/people/${app.apprentice.id}`)
  await page.getByRole('button', { name: 'Add a ticket' }).click()
  await page.getByLabel('Number').fill('WAH 4471')
  await page.getByLabel('Last day it holds').fill('2026-12-20')
  await page.getByRole('button', { name: 'Add ticket', exact: true }).click()
  await page.getByText('Last day Sun 20 Dec 2026, lapses soon').waitFor()

  const create = { width: 400, height: 250, channels: 3, background: '#2f6b43' } as const
  const card = await sharp({ create }).png().toBuffer()
  const file = { name: 'card.png', mimeType: 'image/png', buffer: card }
  await page.getByLabel('Add a photo of the card: Working at heights').setInputFiles(file)
  await page.getByRole('button', { name: 'Show the card of Working at heights' }).waitFor()

  const own = await visit(browser, app.url, { email: app.apprentice.email })
  await own.goto('/account')
  await own.page.getByRole('button', { name: 'Show the card of Working at heights' }).click()
  const photo = own.page.getByRole('img', { name: 'Card: Working at heights' })
  await photo.waitFor()
  await expect
    .poll(() => photo.evaluate((img) => (img as HTMLImageElement).naturalWidth))
    .toBe(create.width)
  await own.page.keyboard.press('Escape')

  await page.getByRole('button', { name: 'Change Working at heights' }).click()
  await page.getByRole('button', { name: 'Remove the ticket' }).click()
  await page.getByText('goes for good, and the photo of its card with it').waitFor()
  await page.getByRole('button', { name: 'Remove it' }).click()
  // What the office does shows on the apprentice's screen without a reload.
  await own.page.getByText('None kept yet.').waitFor()
  expect([...office.complaints, ...own.complaints]).toEqual([])
  await office.close()
  await own.close()
})
