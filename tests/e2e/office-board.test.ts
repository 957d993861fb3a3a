import type { Page } from '@playwright/test'
import { and, eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { jobs } from '../../server/db/tables/job-tables.ts'
import { outbox } from '../../server/db/tables/mail-tables.ts'
import { variations } from '../../server/db/tables/variation-tables.ts'
import { visit, type Visitor } from './browser.ts'
import { demoSignIn, jobIdOf, serveDemo } from './demo.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(serveDemo)

let office: Visitor | null = null

/** The office at its desk, signed in once; nothing is complained of on the way. */
async function atTheDesk(work: (page: Page, goto: Visitor['goto']) => Promise<void>) {
  const { browser, app } = served()
  office ??= await visit(browser, app.url, demoSignIn('marnie'))
  await work(office.page, office.goto)
  expect(office.complaints).toEqual([])
}

const jobRow = (number: string) =>
  served().app.db.select().from(jobs).where(eq(jobs.number, number)).get()
const soon = (read: () => unknown, want: unknown) =>
  expect.poll(read, { timeout: 5_000 }).toEqual(want)
const today = '2026-12-02'

const columnOf = (page: Page, stage: string) =>
  page.locator('section').filter({ has: page.getByRole('heading', { name: stage }) })
const cardIn = (page: Page, stage: string, number: string) =>
  columnOf(page, stage).getByRole('link').filter({ hasText: number })

test('a card carried from enquiry to priced by mouse, and from priced to won by keys, sets one fact; Undo takes it back', async () => {
  await atTheDesk(async (page, goto) => {
    await goto('/board')
    const from = await cardIn(page, 'Enquiry', 'QR-102').boundingBox()
    const to = await columnOf(page, 'Priced').boundingBox()
    if (!from || !to) throw new Error('The board is not there.')
    const carryTo = async (x: number) => {
      await page.mouse.move(from.x + 40, from.y + 30)
      await page.mouse.down()
      await page.mouse.move(from.x + 55, from.y + 34)
      await page.mouse.move(x, to.y + 120, { steps: 5 })
    }
    await carryTo(to.x + to.width / 2)
    await page.getByText('Price sent today', { exact: true }).waitFor()
    await page.mouse.up()
    await soon(() => jobRow('QR-102')?.priceSentOn, today)
    await cardIn(page, 'Priced', 'QR-102').waitFor()
    await page.getByRole('button', { name: 'Undo' }).click()
    await soon(() => jobRow('QR-102')?.priceSentOn, null)
    await cardIn(page, 'Enquiry', 'QR-102').waitFor()

    await cardIn(page, 'Priced', 'QR-103').focus()
    await page.keyboard.press('Space')
    await page.getByText('QR-103 over Priced: where it was').waitFor({ state: 'attached' })
    await page.keyboard.press('ArrowRight')
    await page.getByText('QR-103 over Won: Accepted today').waitFor({ state: 'attached' })
    await page.keyboard.press('Space')
    await soon(() => jobRow('QR-103')?.acceptedOn, today)
    await cardIn(page, 'Won', 'QR-103').waitFor()
    await page.getByRole('button', { name: 'Undo' }).last().press('Enter')
    await soon(() => jobRow('QR-103')?.acceptedOn, null)
    await cardIn(page, 'Priced', 'QR-103').waitFor()

    // A stage that days make: the card in hand says so, and nothing is set.
    const firm = await columnOf(page, 'Firm').boundingBox()
    const before = jobRow('QR-102')
    await carryTo((firm?.x ?? 0) + 60)
    await page.getByText('Days in the calendar make a job firm. Book it there.').first().waitFor()
    await page.mouse.up()
    await cardIn(page, 'Enquiry', 'QR-102').waitFor()
    expect(jobRow('QR-102')).toEqual(before)
  })
})

test('the board as a table is sorted by a heading, and its address keeps the order', async () => {
  await atTheDesk(async (page, goto) => {
    await goto('/board')
    await page.getByRole('radio', { name: 'Table' }).check({ force: true })
    const wanted = page.getByRole('columnheader', { name: 'Wanted by' })
    await wanted.getByRole('button').press('Enter')
    await wanted.and(page.locator('[aria-sort="ascending"]')).waitFor()
    const numbers = () => page.locator('tbody a').allTextContents()
    // By the demo's own days: the house on Tue 8 Dec, the hall on Fri 11 Dec, the surgery on Mon 14 Dec.
    const soonest = ['QR-108', 'QR-109', 'QR-107']
    await expect.poll(async () => (await numbers()).slice(0, 3)).toEqual(soonest)
    const kept = new URL(page.url())
    expect([kept.searchParams.get('view'), kept.searchParams.get('sort')]).toEqual([
      'table',
      'wanted',
    ])
    await goto(kept.pathname + kept.search)
    await wanted.and(page.locator('[aria-sort="ascending"]')).waitFor()
    expect((await numbers()).slice(0, 3)).toEqual(soonest)
  })
})

test('a variation is added, asked for and agreed by name; Undo takes the yes back', async () => {
  await atTheDesk(async (page, goto) => {
    const jobId = jobIdOf(served().app.db, 'QR-104')
    const row = () =>
      served().app.db.select().from(variations).where(eq(variations.jobId, jobId)).get()
    await goto(`/jobs/${jobId}`)
    const card = page.getByRole('region', { name: 'Variations' })
    await card.getByRole('button', { name: 'Add a variation' }).press('Enter')
    await card.getByLabel('What, and why').fill('Skylight trimmed in, asked for on site')
    await card.getByLabel('Price').fill('450')
    await card.getByRole('button', { name: 'Add it' }).press('Enter')
    await card.getByText('Waiting for a yes').waitFor()
    await card.getByRole('button', { name: 'Asked today' }).press('Enter')
    await soon(() => row()?.askedOn, today)
    await card.getByRole('button', { name: 'Builder said yes' }).press('Enter')
    await card.getByLabel('Who said yes').fill('Lorcan Tait')
    await page.keyboard.press('Enter')
    await card.getByText('Lorcan Tait, Wed 2 Dec').waitFor()
    expect(row()).toMatchObject({ priceCents: 45_000, agreedOn: today, agreedBy: 'Lorcan Tait' })
    // 9260 and 450 dollars.
    await card.getByText('$9,710').waitFor()
    await page.getByRole('button', { name: 'Undo' }).last().press('Enter')
    await soon(() => row()?.agreedOn, null)
  })
})

test('who has not been told is listed beside the calendar, told by one press, and each mail is in Messages', async () => {
  await atTheDesk(async (page, goto) => {
    const { app } = served()
    const notices = () =>
      app.db
        .select()
        .from(outbox)
        .where(and(eq(outbox.kind, 'change-notice'), eq(outbox.state, 'sent')))
        .all()
    await goto('/calendar')
    await page.getByRole('link', { name: 'Not yet told (3)' }).press('Enter')
    const panel = page.getByRole('dialog', { name: 'Not yet told' })
    const tamsin = panel.getByRole('listitem').filter({ hasText: 'Tamsin Rook' }).first()
    await tamsin.getByText('New: QR-111 House with a garage wing').first().waitFor()
    expect(notices()).toEqual([])
    await panel.getByRole('button', { name: 'Tell them (3 mails)' }).press('Enter')
    await page.getByText('3 mails on the way').first().waitFor()
    await app.mail.worker.runOnce()
    await panel.getByText('Everybody knows').waitFor()
    await goto('/messages')
    expect(
      notices()
        .map((mail) => mail.toName)
        .sort(),
    ).toEqual(['Petra Vane', 'Tamsin Rook', 'Wil Osei'])
    for (const { toName, subject, text } of notices()) {
      expect(text).toContain('QR-111 House with a garage wing')
      const line = page.getByRole('link').filter({ hasText: toName })
      await line
        .filter({ hasText: subject ?? 'no subject' })
        .first()
        .waitFor()
    }
  })
})

test('a revision is compared with the one before, line by line', async () => {
  await atTheDesk(async (page, goto) => {
    const jobId = jobIdOf(served().app.db, 'QR-103')
    await goto(`/jobs/${jobId}/revisions/B/against/A`)
    await page.getByRole('heading', { name: 'QR-103 roof, revision A to B' }).waitFor()
    await page.getByText('From plan, plates not measured').first().waitFor()
    // By hand: 200 mm more run at 22.5° is 216.5 mm more rafter.
    const commons = page.getByRole('row').filter({ hasText: 'C1 Common rafter' })
    await commons.getByText('Longer', { exact: true }).waitFor()
    const cells = await commons.getByRole('cell').allTextContents()
    const lengths = cells.slice(-2).map((words) => Number.parseInt(words, 10))
    const longerMm = (lengths[1] ?? 0) - (lengths[0] ?? 0)
    expect([216, 217]).toContain(longerMm)
    expect(cells[1]).toContain(`by ${longerMm} mm`)
    await page.getByRole('link', { name: 'Open revision B' }).press('Enter')
    await page.waitForURL(`**/jobs/${jobId}/revisions/B`)
  })
})
