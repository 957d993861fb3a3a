import type { Locator, Page } from '@playwright/test'
import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { bookingDays, bookings } from '../../server/db/tables/booking-tables.ts'
import { crews } from '../../server/db/tables/people-tables.ts'
import { visit } from './browser.ts'
import { bookingIdOf, demoSignIn, jobIdOf, serveDemo } from './demo.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(serveDemo)

const address = '/calendar?view=crews&weeks=2&on=2026-12-07'
const [mon, tue, wed, thu, fri] = [
  '2026-12-07',
  '2026-12-08',
  '2026-12-09',
  '2026-12-10',
  '2026-12-11',
]

/** Where the database has a booking: crew letter, state and days. */
function standing(id: string): string {
  const { db } = served().app
  const booking = db
    .select({ letter: crews.letter, state: bookings.state, cancelledAt: bookings.cancelledAt })
    .from(bookings)
    .innerJoin(crews, eq(crews.id, bookings.crewId))
    .where(eq(bookings.id, id))
    .get()
  if (!booking || booking.cancelledAt) return 'not booked'
  const days = db
    .select({ day: bookingDays.day })
    .from(bookingDays)
    .where(eq(bookingDays.bookingId, id))
    .all()
    .map((row) => row.day)
    .sort()
  return `${booking.letter} ${booking.state} ${days.join(' ')}`
}

const crewId = (letter: string): string =>
  served().app.db.select().from(crews).where(eq(crews.letter, letter)).get()?.id ?? ''
const bar = (page: Page, id: string) => page.locator(`[data-booking="${id}"]`)
const cell = (page: Page, letter: string, day: string) =>
  page.locator(`[data-cell="${crewId(letter)} ${day}"]`)
const soon = (id: string, want: string) =>
  expect.poll(() => standing(id), { timeout: 5_000 }).toBe(want)

async function middleOf(place: Locator): Promise<{ x: number; y: number }> {
  const box = await place.boundingBox()
  if (!box) throw new Error('It is not on the page.')
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 }
}

async function carry(page: Page, from: { x: number; y: number }, to: Locator): Promise<void> {
  const end = await middleOf(to)
  await page.mouse.move(from.x, from.y)
  await page.mouse.down()
  await page.mouse.move(from.x + 10, from.y + 4)
  await page.mouse.move(end.x, end.y, { steps: 4 })
}

/** By the first of its days. */
async function hold(of: Locator): Promise<{ x: number; y: number }> {
  const box = await of.boundingBox()
  if (!box) throw new Error('It is not on the page.')
  return { x: box.x + 20, y: box.y + 30 }
}

const ghost = (page: Page) => page.locator('div.pointer-events-none.fixed')

test('a week is planned by drag: a job booked, moved to another crew, pulled longer, taken back and done again', async () => {
  const { browser, app } = served()
  const office = await visit(browser, app.url, demoSignIn('marnie'))
  const { page } = office
  await office.goto(address)
  const chip = page.locator('li').filter({ hasText: 'Homestead round a yard' })
  await chip.scrollIntoViewIfNeeded()
  await carry(page, await middleOf(chip), cell(page, 'B', mon))
  await page.mouse.up()
  await page.getByText('pencilled in for Bevel crew').first().waitFor()
  const homestead = bookingIdOf(app.db, 'QR-113')
  await soon(homestead, `B pencilled ${mon} ${tue}`)

  // Over the days of another job the ghost says why not, before anything is dropped.
  const garage = bookingIdOf(app.db, 'QR-111')
  await carry(page, await hold(bar(page, homestead)), cell(page, 'A', wed))
  await ghost(page).filter({ hasText: 'Adze crew' }).filter({ hasText: 'QR-111' }).waitFor()
  await page.mouse.move(...pointIn(await middleOf(cell(page, 'A', mon))))
  await ghost(page).filter({ hasText: 'Mon 7 Dec to Tue 8 Dec' }).waitFor()
  await page.mouse.up()
  await soon(homestead, `A pencilled ${mon} ${tue}`)

  const end = await bar(page, garage).locator('[data-pull="last"]').boundingBox()
  if (!end) throw new Error('The end of the bar is not there.')
  await carry(page, { x: end.x + end.width / 2, y: end.y + 30 }, cell(page, 'A', fri))
  await page.mouse.up()
  await soon(garage, `A firm ${wed} ${thu} ${fri}`)

  await page.keyboard.press('Control+z')
  await soon(garage, `A firm ${wed} ${thu}`)
  await page.getByRole('button', { name: /^Undo: .*moved to/ }).click()
  await soon(homestead, `B pencilled ${mon} ${tue}`)
  await page.keyboard.press('Control+Shift+z')
  await soon(homestead, `A pencilled ${mon} ${tue}`)

  // Dropped on the garage wing's days, the two change places.
  await carry(page, await hold(bar(page, homestead)), cell(page, 'A', wed))
  await page.mouse.up()
  await page.getByRole('button', { name: 'Change places with QR-111' }).click()
  await soon(homestead, `A pencilled ${wed} ${thu}`)
  await soon(garage, `A firm ${mon} ${tue}`)
  // The browser reports the refusal (409) by itself.
  expect(office.complaints.filter((line) => !line.includes('409'))).toEqual([])
  await office.close()
})

const pointIn = ({ x, y }: { x: number; y: number }): [number, number] => [x, y]

test('with keys alone: a job is booked, carried to another crew and day, made longer and firm, split, and all taken back', async () => {
  const { browser, app } = served()
  const office = await visit(browser, app.url, demoSignIn('marnie'))
  const { page } = office
  await office.goto(address)
  await page.getByRole('button', { name: /Take QR-104/ }).focus()
  await page.keyboard.press('Space')
  await page.getByText('is in hand').first().waitFor({ state: 'attached' })
  // Onto the grid, a crew down, a day on.
  await page.keyboard.press('ArrowRight')
  await page
    .getByText(/Adze crew, Mon 7 Dec/)
    .first()
    .waitFor({ state: 'attached' })
  await page.keyboard.press('ArrowDown')
  await page
    .getByText(/Bevel crew, Mon 7 Dec/)
    .first()
    .waitFor({ state: 'attached' })
  await page.keyboard.press('ArrowRight')
  await page
    .getByText(/Bevel crew, Tue 8 Dec/)
    .first()
    .waitFor({ state: 'attached' })
  await page.keyboard.press('Space')
  await page.getByText('pencilled in for Bevel crew').first().waitFor()
  const octagon = bookingIdOf(app.db, 'QR-104')
  await soon(octagon, `B pencilled ${tue}`)

  await bar(page, octagon).focus()
  await page.keyboard.press('Space')
  await page.keyboard.press('ArrowRight')
  await page
    .getByText(/Bevel crew, Wed 9 Dec. Nothing/)
    .first()
    .waitFor({ state: 'attached' })
  await page.keyboard.press('Space')
  await soon(octagon, `B pencilled ${wed}`)
  await expect
    .poll(() => bar(page, octagon).evaluate((el) => el === document.activeElement))
    .toBe(true)
  await page.keyboard.press('Shift+ArrowRight')
  await soon(octagon, `B pencilled ${wed} ${thu}`)

  await page.keyboard.press('Enter')
  await page.getByRole('button', { name: 'Make it firm' }).focus()
  await page.keyboard.press('Enter')
  await soon(octagon, `B firm ${wed} ${thu}`)
  await bar(page, octagon).focus()
  await page.keyboard.press('Enter')
  await page.getByRole('button', { name: 'Split', exact: true }).focus()
  await page.keyboard.press('Enter')
  await page.getByRole('button', { name: 'Split it' }).focus()
  await page.keyboard.press('Enter')
  await soon(octagon, `B firm ${wed}`)
  for (let i = 0; i < 5; i++) await page.keyboard.press('Control+z')
  await soon(octagon, 'not booked')
  const left = app.db
    .select()
    .from(bookings)
    .where(eq(bookings.jobId, jobIdOf(app.db, 'QR-104')))
  expect(left.all().every((one) => one.cancelledAt !== null)).toBe(true)
  expect(office.complaints).toEqual([])
  await office.close()
})
