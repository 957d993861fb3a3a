import type { Browser, Page } from '@playwright/test'
import { desc, eq } from 'drizzle-orm'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { outbox } from '../../server/db/tables/mail-tables.ts'
import { jobs, roofRevisions } from '../../server/db/tables/job-tables.ts'
import type { CutLine, FrameSpec } from '../../shared/roof/roof-types.ts'
import { formatAngle } from '../../shared/units/format-angle.ts'
import { formatMm } from '../../shared/units/format-length.ts'
import {
  desk,
  launchBrowser,
  phone,
  type ServedApp,
  serveTestApp,
  type Visitor,
  visit,
} from './browser.ts'
import { mailFor } from './demo.ts'

let browser: Browser
let app: ServedApp
let mail: ReturnType<typeof mailFor>
const visitors: Visitor[] = []

beforeAll(async () => {
  browser = await launchBrowser()
  // Wed 2 Dec 2026, 10:00 in Brisbane; the clock moves only by the test's hand.
  app = await serveTestApp({ now: new Date('2026-12-02T00:00:00Z') })
  mail = mailFor(app)
})
afterAll(async () => {
  await browser.close()
  await app.close()
})

async function signIn(email: string, viewport = desk): Promise<Visitor> {
  const visitor = await visit(browser, app.url, { email }, { viewport })
  visitors.push(visitor)
  return visitor
}

async function writeDownJob(page: Page, title: string): Promise<void> {
  await page.goto('/jobs/new')
  await page.getByLabel('Title', { exact: true }).fill(title)
  await page.getByLabel('Site address', { exact: true }).fill('12 Pardalote Drive, Marrow Creek')
  await page.getByLabel('Site contact', { exact: true }).fill('Cleo Marsh')
  await page
    .getByRole('button', { name: /save|add|create/i })
    .first()
    .click()
  await page.getByRole('heading', { level: 1, name: new RegExp(title) }).waitFor()
}

async function typeSections(page: Page): Promise<void> {
  const sizes = { Rafter: ['45', '140'], Hip: ['35', '190'], Ridge: ['35', '190'] } as const
  for (const [name, [thickness, depth]] of Object.entries(sizes)) {
    const group = page.getByRole('group', { name, exact: true })
    await group.getByLabel('Thickness, mm').fill(thickness)
    await group.getByLabel('Depth, mm').fill(depth)
  }
}

async function typeRoof(page: Page, shape: 'Rectangle' | 'Octagonal end'): Promise<void> {
  await page.getByRole('link', { name: /roof/i }).first().click()
  await page.getByRole('radio', { name: shape }).check({ force: true })
  await page.getByLabel('Length, mm', { exact: true }).fill('9000')
  await page.getByLabel('Width, mm', { exact: true }).fill('6000')
  await page.getByLabel('Pitch, degrees', { exact: true }).fill('25')
  await page.getByLabel('Eaves overhang, mm', { exact: true }).fill('450')
  await typeSections(page)
}

async function issue(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Issue as A' }).click()
  await page.getByText('Issued as A').first().waitFor()
}

function storedSpec(title: string): FrameSpec {
  const row = app.db
    .select({ spec: roofRevisions.spec })
    .from(roofRevisions)
    .innerJoin(jobs, eq(jobs.id, roofRevisions.jobId))
    .where(eq(jobs.title, title))
    .orderBy(desc(roofRevisions.sequence))
    .get()
  if (!row) throw new Error(`No roof issued for ${title}`)
  return row.spec
}

/** What must be readable of a line wherever it leaves for the saw. */
function numbersOf(spec: FrameSpec, line: CutLine): string[] {
  const member = spec.members.find((one) => one.mark === line.members[0])
  const head = member?.cuts.find((cut) => cut.end === 'head')
  if (!member || !head) return [formatMm(line.cutLengthMm)]
  return [
    formatMm(line.cutLengthMm),
    formatMm(member.setOutLengthMm),
    formatAngle(head.face.fromEdgeDeg),
    // A cut square across the top is said in words.
    ...(head.edge.fromSquareDeg === 0 ? [] : [formatAngle(head.edge.fromSquareDeg)]),
  ]
}

const lineOf = (spec: FrameSpec, role: string): CutLine => {
  const line = spec.cutLines.find((one) => one.role === role)
  if (!line) throw new Error(`No ${role} on this roof`)
  return line
}

test(
  'from a typed roof to a ticked creeper: office, reminder, leading hand, apprentice',
  { timeout: 240_000 },
  async () => {
    const office = app.addPerson('office', 'Marnie Quill')
    const lead = app.addPerson('leading-hand', 'Tamsin Rook')
    const apprentice = app.addPerson('apprentice', 'Wil Osei')
    app.addCrew('Adze crew', [lead.id, apprentice.id])

    // The office writes two jobs down and types their roofs.
    const { page } = await signIn(office.email)
    await writeDownJob(page, 'House with octagonal end')
    await typeRoof(page, 'Octagonal end')
    await issue(page)
    await writeDownJob(page, 'House, four hips')
    await page.getByRole('button', { name: 'Price sent today' }).click()
    await page.getByRole('button', { name: 'Accepted today' }).click()
    await page.getByText('Not booked').first().waitFor()
    await typeRoof(page, 'Rectangle')
    await page.getByText('R1', { exact: true }).first().waitFor()
    await issue(page)
    const spec = storedSpec('House, four hips')
    const octagonal = storedSpec('House with octagonal end')
    expect(
      octagonal.members.filter((member) => member.role === 'crown-end').length,
    ).toBeGreaterThanOrEqual(3)
    expect(lineOf(spec, 'hip').quantity).toBe(4)

    // Books a crew by dragging the won job onto Thursday.
    await page.goto('/calendar')
    const card = page.locator('[data-job]').filter({ hasText: 'House, four hips' })
    const thursday = page.locator('td[data-date="2026-12-03"]')
    await thursday.waitFor()
    const from = await card.boundingBox()
    const to = await thursday.boundingBox()
    if (!from || !to) throw new Error('The calendar is not laid out')
    await page.mouse.move(from.x + 60, from.y + 20)
    await page.mouse.down()
    await page.mouse.move(from.x, from.y + 60, { steps: 5 })
    await page.mouse.move(to.x + to.width / 2, to.y + to.height / 2, { steps: 15 })
    await page.mouse.up()
    const dialog = page.getByRole('dialog')
    await dialog.getByLabel('First day').waitFor()
    expect(await dialog.getByLabel('First day').inputValue()).toBe('2026-12-03')
    await dialog.getByRole('radio', { name: 'Firm' }).check({ force: true })
    await dialog.getByRole('button', { name: 'Book', exact: true }).click()
    await page.locator('[data-booking]').filter({ hasText: 'House, four hips' }).first().waitFor()

    // Before the firm's hour nothing goes; at three o'clock everyone rostered gets one mail.
    await mail.worker.runOnce()
    expect(mail.fake.sent.map((each) => each.to)).toEqual([])
    app.clock.current = new Date('2026-12-02T05:00:00Z')
    await mail.worker.runOnce()
    await mail.worker.runOnce()
    expect(mail.fake.sent.map((each) => each.to).sort()).toEqual(
      [lead.email, apprentice.email].sort(),
    )
    const reminder = mail.fake.sent[0]
    const creeper = lineOf(spec, 'creeper')
    const wanted = [creeper, lineOf(spec, 'hip'), lineOf(spec, 'common')].flatMap((line) =>
      numbersOf(spec, line),
    )
    for (const text of wanted) expect(reminder?.text).toContain(text)
    expect(reminder?.text).toContain('Cut one, try it, then cut the rest.')
    expect(reminder?.text).toMatch(/from plan, plates not measured/i)
    expect(
      app.db
        .select()
        .from(outbox)
        .all()
        .every((row) => row.state === 'sent'),
    ).toBe(true)

    // Next morning the leading hand opens Today on a phone and hands the creepers out.
    app.clock.current = new Date('2026-12-02T20:30:00Z')
    const leading = await signIn(lead.email, phone)
    await leading.page.getByRole('heading', { level: 1, name: /Thu 3 Dec/ }).waitFor()
    const task = leading.page.getByRole('article').filter({ hasText: `Cut ${creeper.mark} ` })
    const shown = (await task.innerText()).replaceAll(' ', ' ')
    for (const text of numbersOf(spec, creeper)) expect(shown).toContain(text)
    await task.getByLabel('Who does it').selectOption({ label: 'Wil Osei' })
    await expect.poll(() => task.getByLabel('Who does it').inputValue()).toBe(apprentice.id)

    // The apprentice finds the card, reads the same numbers and ticks off a piece.
    const young = await signIn(apprentice.email, phone)
    await young.page
      .getByRole('link', { name: new RegExp(`${creeper.mark}`) })
      .first()
      .click()
    await young.page.getByRole('button', { name: /one done/ }).waitFor()
    const cardText = await young.page.getByRole('main').innerText()
    for (const text of numbersOf(spec, creeper)) expect(cardText).toContain(text)
    expect(cardText).toContain('Cut one, try it, then cut the rest.')
    await young.page.getByRole('button', { name: /one done/ }).click()

    // The leading hand sees the count move without reloading.
    await expect
      .poll(() => task.getByRole('group', { name: new RegExp(creeper.mark) }).innerText(), {
        timeout: 15_000,
      })
      .toMatch(/^1\s/)
    for (const visitor of visitors) expect(visitor.complaints).toEqual([])
  },
)
