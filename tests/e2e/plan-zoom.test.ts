import { expect, test } from 'vitest'
import { desk, visit, type Visitor } from './browser.ts'
import { demoSignIn, jobIdOf, serveDemo } from './demo.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(serveDemo)

/** The plan of the demo's largest roof, and how wide it is drawn. */
async function openPlan(look: Parameters<typeof visit>[3]) {
  const { browser, app } = served()
  const visitor = await visit(browser, app.url, demoSignIn('marnie'), look)
  await visitor.goto(`/jobs/${jobIdOf(app.db, 'QR-113')}/revisions/A`)
  await visitor.page.locator('figure svg [data-mark]').first().waitFor({ state: 'attached' })
  return visitor
}

const planOf = ({ page }: Visitor) => page.getByRole('group', { name: /^Plan of the roof/ })
const widthOf = async (visitor: Visitor) => (await planOf(visitor).boundingBox())?.width ?? 0

/** Drawn larger, and its words set anew. */
async function grown(visitor: Visitor, fromPx: number) {
  await expect.poll(() => widthOf(visitor)).toBeGreaterThan(fromPx * 1.2)
  await expect
    .poll(async () => {
      const box = (await planOf(visitor).getAttribute('viewBox')) ?? ''
      return Math.abs(Number(box.split(' ')[2]) - (await widthOf(visitor)))
    })
    .toBeLessThan(3)
}

test('at the desk the wheel with Ctrl and the keys draw the plan larger, and 0 draws all of it', async () => {
  const visitor = await openPlan({ viewport: desk })
  const { page } = visitor
  const fittedPx = await widthOf(visitor)
  const timber = planOf(visitor).locator('[data-mark="R1"]')
  const box = await timber.boundingBox()
  if (!box) throw new Error('The ridge is not on the plan.')
  const at = { x: box.x + box.width / 2, y: box.y + box.height / 2 }
  await page.mouse.move(at.x, at.y)
  await page.keyboard.down('Control')
  for (let i = 0; i < 4; i++) await page.mouse.wheel(0, -120)
  await page.keyboard.up('Control')
  await grown(visitor, fittedPx)
  // What lay under the pointer stays under it.
  const after = await timber.boundingBox()
  expect(Math.abs((after?.y ?? 0) + (after?.height ?? 0) / 2 - at.y)).toBeLessThan(4)

  await timber.focus()
  await page.keyboard.press('0')
  await expect.poll(() => widthOf(visitor)).toBeLessThan(fittedPx + 3)
  await page.keyboard.press('+')
  await grown(visitor, fittedPx)
  await page.keyboard.press('Enter')
  await page.getByRole('dialog', { name: /^R1 · Ridge/ }).waitFor()
  expect(visitor.complaints).toEqual([])
  await visitor.close()
})

test('on a phone every mark is written at one tap', async () => {
  const visitor = await openPlan({ viewport: { width: 390, height: 844 } })
  const { page } = visitor
  const fittedPx = await widthOf(visitor)
  await page.getByRole('button', { name: 'draw it large enough for all' }).click()
  await grown(visitor, fittedPx)
  await page.getByText('not written').waitFor({ state: 'detached' })
  const marks = await planOf(visitor).locator('[data-mark]').count()
  const words = await planOf(visitor).locator('text').allTextContents()
  expect(words.filter((word) => /^[A-Z]+\d+[a-z]*$/.test(word))).toHaveLength(marks)
  const sideways = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  )
  expect(sideways).toBe(0)
  expect(visitor.complaints).toEqual([])
  await visitor.close()
})
