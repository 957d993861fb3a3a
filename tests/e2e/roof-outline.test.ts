import { AxeBuilder } from '@axe-core/playwright'
import type { Page } from '@playwright/test'
import { expect, test } from 'vitest'
import { jobs } from '../../server/db/tables/job-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { desk, phone, type ServedApp, serveTestApp, visit } from './browser.ts'
import { withBrowserAnd } from './with-app.ts'

// Wed 2 Dec 2026, 10:00 in Brisbane.
const served = withBrowserAnd(() => serveTestApp({ now: new Date('2026-12-02T00:00:00Z') }))

let office: { email: string } | null = null
let count = 0

function addJob(app: ServedApp): string {
  const id = newId()
  const stamps = { createdAt: app.clock.current, updatedAt: app.clock.current }
  const number = `QR-${++count}`
  app.db
    .insert(jobs)
    .values({ id, number, title: `House ${count}`, covering: 'tiles', ...stamps })
    .run()
  return id
}

/** The office at a roof nobody has typed yet. */
async function emptyRoof(viewport = desk, touch = false) {
  const { browser, app } = served()
  office ??= app.addPerson('office', 'Maren Tolhurst')
  const visitor = await visit(browser, app.url, { email: office.email }, { viewport, touch })
  await visitor.goto(`/jobs/${addJob(app)}/roof`)
  return visitor
}

const pick = (page: Page, name: string) =>
  page.getByRole('radio', { name, exact: true }).check({ force: true })

/** Corners as the drawing says them, mm. */
async function cornersDrawn(page: Page): Promise<string[]> {
  const labels = await page
    .locator('[data-corner]')
    .evaluateAll((handles) => handles.map((handle) => handle.getAttribute('aria-label') ?? ''))
  return labels.map((label) => /^Corner \d+ at (.+?):/.exec(label)?.[1] ?? label)
}

// An L laid out by hand on squared paper: 10.0 by 8.0 m over all, both wings 4.0 m wide.
const theL = ['0, 0', '10000, 0', '10000, 4000', '4000, 4000', '4000, 8000', '0, 8000']

const expectTheL = (page: Page) => expect.poll(() => cornersDrawn(page)).toEqual(theL)

/** Where a point of the plan is on the screen, by two corners known to be drawn. */
async function placesOnScreen(page: Page) {
  const middleOf = async (corner: number) => {
    const box = await page.locator(`[data-corner="${corner}"] rect`).boundingBox()
    if (!box) throw new Error(`Corner ${corner + 1} is not drawn`)
    return { x: box.x + box.width / 2, y: box.y + box.height / 2 }
  }
  const drawn = (await cornersDrawn(page)).map((text) => {
    const [x = NaN, y = NaN] = text.replaceAll('−', '-').split(', ').map(Number)
    return { x, y }
  })
  const [a, b] = [await middleOf(0), await middleOf(1)]
  const pxPerMm = (b.x - a.x) / (drawn[1]!.x - drawn[0]!.x)
  const of = (x: number, y: number) => ({
    x: a.x + (x - drawn[0]!.x) * pxPerMm,
    y: a.y - (y - drawn[0]!.y) * pxPerMm,
  })
  return { middleOf, of }
}

async function drag(page: Page, corner: number, toMm: { x: number; y: number }, drop = true) {
  await page.locator('svg [data-corner]').first().scrollIntoViewIfNeeded()
  const places = await placesOnScreen(page)
  const [from, to] = [await places.middleOf(corner), places.of(toMm.x, toMm.y)]
  await page.mouse.move(from.x, from.y)
  await page.mouse.down()
  await page.mouse.move((from.x + to.x) / 2, (from.y + to.y) / 2, { steps: 4 })
  // A pixel, some 20 mm, off: it comes to rest by itself.
  await page.mouse.move(to.x + 1, to.y - 1, { steps: 4 })
  if (drop) await page.mouse.up()
}

async function expectAxeClean(page: Page) {
  const { violations } = await new AxeBuilder({ page }).analyze()
  expect(violations.map(({ id, nodes }) => `${id} ${nodes[0]?.target.join(' ')}`)).toEqual([])
}

test('an L typed by its four measures is drawn, and its sizes say who typed them', async () => {
  const { page, complaints, close } = await emptyRoof()
  await pick(page, 'L')
  await page.getByLabel('A · Length over all').fill('10000')
  await page.getByLabel('B · Width over all').fill('8000')
  await page.getByLabel('C · Width of wing 1').fill('4000')
  await page.getByLabel('D · Width of wing 2').fill('4000')
  await expectTheL(page)
  await page.getByRole('button', { name: 'Mirror' }).click()
  await expect.poll(() => cornersDrawn(page)).toContain('6000, 4000')
  await page.getByRole('button', { name: 'Undo' }).click()
  await expectTheL(page)
  const rafter = page.getByRole('group', { name: 'Rafter', exact: true })
  await rafter.getByLabel('Depth, mm').fill('140')
  await rafter.getByLabel('Thickness, mm').fill('45')
  await rafter.getByText('Typed by Maren Tolhurst, Wed 2 Dec.').waitFor()
  await expectAxeClean(page)
  expect(complaints).toEqual([])
  await close()
})

test('the same L walked side by side, its last side worked out', async () => {
  const { page, complaints, close } = await emptyRoof()
  await pick(page, 'Any outline')
  for (const length of ['10000', '4000', '6000', '4000', '4000']) {
    const next = page.getByRole('textbox', { name: /^Side \d+, mm$/ }).last()
    await next.fill(length)
    await next.press('Enter')
    await expect.poll(() => next.inputValue()).toBe('')
  }
  await page.getByLabel('Turn after side 3').selectOption({ label: 'Right, square' })
  await page.getByRole('button', { name: 'Close it with a side of 8000 mm' }).click()
  await page.getByText('The outline closes.').waitFor()
  await expectTheL(page)
  expect(complaints).toEqual([])
  await close()
})

test('the same L pasted from a plan in metres, the other way round', async () => {
  const { page, complaints, close } = await emptyRoof(phone)
  await pick(page, 'Any outline')
  await page.getByRole('button', { name: 'Paste coordinates' }).click()
  const dialog = page.getByRole('dialog', { name: 'Paste coordinates' })
  const box = dialog.getByLabel('Corners, one a line: x, then y')
  await box.fill('0; 0\n0; 8,0\n4,0; 8,0\n4,0 4,0 1,0')
  await dialog.getByText(/^Line 4: /).waitFor()
  await box.fill('0; 0\n0; 8,0\n4,0; 8,0\n4,0; 4,0\n10,0; 4,0\n10,0; 0\n0; 0')
  await dialog.getByText(/Taken for metres\..*left out\..*turned round\./).waitFor()
  await expectAxeClean(page)
  await dialog.getByRole('button', { name: 'Take these 6 corners' }).click()
  await pick(page, 'Plan')
  await expectTheL(page)
  expect(complaints).toEqual([])
  await close()
})

test('the same L dragged out of a rectangle, a gable set on the drawing, all of it undone and redone', async () => {
  const { page, complaints, close } = await emptyRoof()
  await pick(page, 'Any outline')
  await page.getByRole('button', { name: 'Start with 10 × 8 m and drag' }).click()
  for (const edge of [1, 2]) {
    await page.locator(`[data-edge="${edge}"]`).focus()
    await page.keyboard.press('Insert')
    await page.locator(`[data-corner="${edge + 3}"]`).waitFor()
  }
  const before = await cornersDrawn(page)
  await drag(page, 3, { x: 4000, y: 4000 }, false)
  await page.getByText(/^Corner 4 at 4000, 4000: edge 3 is 6000/).waitFor()
  await page.keyboard.press('Escape')
  await page.mouse.up()
  expect(await cornersDrawn(page)).toEqual(before)
  await drag(page, 3, { x: 4000, y: 4000 })
  await expect.poll(async () => (await cornersDrawn(page))[3]).toBe('4000, 4000')
  await drag(page, 4, { x: 4000, y: 8000 })
  await expectTheL(page)

  const end = page.locator('[data-edge="1"]')
  await end.focus()
  await page.keyboard.press('Enter')
  const panel = page.getByRole('dialog', { name: 'Edge 2 · 4000' })
  await panel.getByRole('radio', { name: 'Gable' }).check({ force: true })
  await expect.poll(() => end.getAttribute('aria-label')).toContain('Edge 2, gable')
  await expectAxeClean(page)
  await page.keyboard.press('Escape')
  await panel.waitFor({ state: 'hidden' })
  expect(await end.evaluate((handle) => handle === document.activeElement)).toBe(true)

  const undo = page.getByRole('button', { name: 'Undo' })
  await undo.click()
  await expect.poll(() => end.getAttribute('aria-label')).toContain('Edge 2, eave')
  await undo.click()
  await expect.poll(async () => (await cornersDrawn(page))[4]).toBe('10000, 8000')
  await page.keyboard.press('Control+Shift+z')
  await page.keyboard.press('Control+Shift+z')
  await expectTheL(page)
  await expect.poll(() => end.getAttribute('aria-label')).toContain('Edge 2, gable')
  expect(complaints).toEqual([])
  await close()
})

test('a corner is moved by keys, and edges that cross are marked where they cross', async () => {
  const { page, complaints, close } = await emptyRoof()
  await pick(page, 'Any outline')
  await page.getByRole('button', { name: 'Start with 10 × 8 m and drag' }).click()
  const corner = page.locator('[data-corner="2"]')
  await corner.focus()
  for (const key of ['ArrowRight', 'Shift+ArrowUp', 'Control+ArrowLeft']) {
    await page.keyboard.press(key)
  }
  await expect.poll(async () => (await cornersDrawn(page))[2]).toBe('10099, 8010')
  expect(await corner.evaluate((handle) => handle === document.activeElement)).toBe(true)
  await drag(page, 2, { x: 2000, y: -2000 })
  const words = 'Edges 1 and 3 cross or touch: put the corners in order round the building.'
  await page.getByRole('img', { name: `1: ${words}` }).waitFor()
  expect(await page.getByRole('list', { name: 'What to put right' }).innerText()).toContain(words)
  await corner.focus()
  await page.keyboard.press('Delete')
  await expect.poll(async () => (await cornersDrawn(page)).length).toBe(3)
  expect(complaints).toEqual([])
  await close()
})

test('a finger on a corner moves the corner and not the page; beside it the page scrolls', async () => {
  const { page, complaints, close } = await emptyRoof({ width: 390, height: 600 }, true)
  await pick(page, 'Any outline')
  await page.getByRole('button', { name: 'Start with 10 × 8 m and drag' }).click()
  await pick(page, 'Plan')
  const corner = page.locator('[data-corner="2"] rect')
  await corner.waitFor()
  const cdp = await page.context().newCDPSession(page)
  const swipe = async (from: { x: number; y: number }, by: { x: number; y: number }) => {
    const touch = (type: 'touchStart' | 'touchMove' | 'touchEnd', share: number) =>
      cdp.send('Input.dispatchTouchEvent', {
        type,
        touchPoints:
          type === 'touchEnd' ? [] : [{ x: from.x + by.x * share, y: from.y + by.y * share }],
      })
    await touch('touchStart', 0)
    for (let step = 1; step <= 8; step++) await touch('touchMove', step / 8)
    await touch('touchEnd', 1)
  }
  const scrolled = () => page.evaluate(() => window.scrollY)
  const box = (await corner.boundingBox())!
  const places = await placesOnScreen(page)
  const before = await scrolled()
  const pxOf2m = places.of(0, 0).y - places.of(0, 2000).y
  await swipe({ x: box.x + 6, y: box.y + 6 }, { x: 0, y: pxOf2m })
  await expect.poll(async () => (await cornersDrawn(page))[2]).toBe('10000, 6000')
  expect(await scrolled()).toBe(before)
  // Towards the top or the foot of the page, whichever is further.
  const way = before > 60 ? 1 : -1
  await swipe((await placesOnScreen(page)).of(5000, 3000), { x: 0, y: way * 120 })
  await expect.poll(async () => Math.abs((await scrolled()) - before)).toBeGreaterThan(40)
  expect((await cornersDrawn(page))[2]).toBe('10000, 6000')
  expect(complaints).toEqual([])
  await close()
})
