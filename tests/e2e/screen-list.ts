import type { Page } from '@playwright/test'
import type { ServedApp } from './browser.ts'
import {
  bookingIdOf,
  crewIdOf,
  dayIdOf,
  jobIdOf,
  messageIdOf,
  taskIdOf,
  personIdOf,
} from './demo.ts'

export type Screen = {
  name: string
  who: string | null
  path: string
  /** What somebody does there first, for a state without an address. */
  first?: (page: Page) => Promise<void>
}

/** Every screen, as whoever uses it; on the demo firm. */
export function screensOf({ db }: ServedApp, today: string): Screen[] {
  const house = jobIdOf(db, 'QR-108')
  const octagon = jobIdOf(db, 'QR-104')
  const splay = jobIdOf(db, 'QR-107')
  const todaysDay = dayIdOf(db, 'QR-108', today)
  const task = taskIdOf(db, 'wil@quillback.example', todaysDay)
  const signedOut = (name: string, path: string): Screen => ({ name, who: null, path })
  const office = (name: string, path: string, first?: Screen['first']): Screen => ({
    name: `office-${name}`,
    who: 'marnie',
    path,
    ...(first ? { first } : {}),
  })
  const lead = (name: string, path: string): Screen => ({
    name: `leading-hand-${name}`,
    who: 'tamsin',
    path,
  })
  const apprentice = (name: string, path: string): Screen => ({
    name: `apprentice-${name}`,
    who: 'wil',
    path,
  })
  return [
    signedOut('sign-in', '/sign-in'),
    signedOut('reset', '/reset'),
    signedOut('set-password', '/set-password?token=0'),
    office('board', '/board'),
    office('board-search', '/board?q=nothing+like+this'),
    office('board-table', '/board?view=table&sort=-price'),
    office('job', `/jobs/${house}`),
    office('job-variations', `/jobs/${house}`, addVariations),
    office('job-edit', `/jobs/${house}/edit`),
    office('job-new', '/jobs/new'),
    office('roof-editor', `/jobs/${octagon}/roof`),
    office('roof-editor-l', `/jobs/${jobIdOf(db, 'QR-111')}/roof`),
    office('roof-editor-outline', `/jobs/${jobIdOf(db, 'QR-112')}/roof`, showOutline),
    office('roof-editor-edge', `/jobs/${jobIdOf(db, 'QR-113')}/roof`, openEdge),
    office('roof-editor-walk', `/jobs/${jobIdOf(db, 'QR-114')}/roof`, showSides),
    office('roof-editor-paste', `/jobs/${jobIdOf(db, 'QR-114')}/roof`, openPaste),
    office('roof-editor-empty', `/jobs/${jobIdOf(db, 'QR-101')}/roof`),
    office('revision-octagonal', `/jobs/${octagon}/revisions/A`),
    office('revision-splayed', `/jobs/${splay}/revisions/A`),
    office('revision-wings', `/jobs/${jobIdOf(db, 'QR-113')}/revisions/A`),
    office('revision-all-timbers', `/jobs/${jobIdOf(db, 'QR-112')}/revisions/A`),
    office('card-valley', `/jobs/${jobIdOf(db, 'QR-112')}/revisions/A?timber=V1a`),
    office('card-underpurlin', `/jobs/${jobIdOf(db, 'QR-112')}/revisions/A?timber=UP1`),
    office('comparison', `/jobs/${jobIdOf(db, 'QR-103')}/revisions/B/against/A`),
    office('not-told', '/calendar/not-told'),
    office('calendar-month', '/calendar'),
    office('calendar-week', `/calendar?view=week&on=${today}`),
    office('clashes', '/calendar/clashes'),
    office('clashes-none', '/calendar/clashes?q=nothing+like+this'),
    office('crew-weeks', `/calendar?view=crews&on=${today}`),
    office('crew-weeks-five', `/calendar?view=crews&weeks=5&on=${today}`),
    office('crew-weeks-wall', `/calendar?view=crews&weeks=3&wall=1&on=${today}`),
    office('booking', `/calendar/bookings/${bookingIdOf(db, 'QR-108')}`),
    office('book', `/calendar/book?job=${octagon}`),
    office('rain-off', `/calendar/rain-off?day=${today}&days=2`),
    office('find-days', `/calendar/find-days?job=${octagon}`),
    office('today', '/today'),
    office('messages', '/messages'),
    office('message', `/messages/${messageIdOf(db)}`),
    office('people', '/people'),
    office('person', `/people/${personIdOf(db, 'bram')}`),
    office('person-new', '/people/new'),
    office('crew', `/people/crews/${crewIdOf(db, 'B')}`),
    office('firm', '/firm'),
    office('close-day', `/today/close/${todaysDay}`),
    office('job-hours', `/jobs/${house}/hours`),
    office('lost-time', `/jobs/${house}/lost-time`),
    office('hours', '/hours'),
    office('account', '/account'),
    office('not-found', '/no-such-page'),
    lead('today', '/today'),
    lead('plates', `/today/plates/${todaysDay}`),
    lead('ask-rain-off', `/today/rain-off?day=${today}`),
    lead('close-day', `/today/close/${todaysDay}`),
    lead('board', '/board'),
    lead('job', `/jobs/${house}`),
    lead('calendar', '/calendar'),
    lead('crew-weeks', `/calendar?view=crews&on=${today}`),
    lead('clashes', '/calendar/clashes'),
    lead('revision', `/jobs/${house}/revisions/A`),
    apprentice('my-tasks', '/my-tasks'),
    apprentice('task', `/my-tasks/${task}`),
    apprentice('today', '/today'),
    apprentice('account', '/account'),
  ]
}

const pick = (page: Page, name: string) =>
  page.getByRole('radio', { name, exact: true }).check({ force: true })

async function showOutline(page: Page): Promise<void> {
  // On a phone the plan is a part of its own.
  if ((page.viewportSize()?.width ?? 0) < 1024) await pick(page, 'Plan')
  await pick(page, 'Outline')
  await page.locator('[data-edge="1"]').waitFor()
}

async function openEdge(page: Page): Promise<void> {
  await showOutline(page)
  await page.locator('[data-edge="1"]').focus()
  await page.keyboard.press('Enter')
  await page.getByRole('dialog', { name: /^Edge 2/ }).waitFor()
}

const showSides = (page: Page) => pick(page, 'Sides and turns')

async function openPaste(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Paste coordinates' }).click()
  const box = page.getByLabel('Corners, one a line: x, then y')
  await box.fill('0; 0\n0; 8,0\n4,0; 8,0\n4,0; 4,0\n10,0; 4,0\n10,0; 0\n0; 0')
}

/** One agreed, one in the form. */
async function addVariations(page: Page): Promise<void> {
  const card = page.getByRole('region', { name: 'Variations' })
  const add = card.getByRole('button', { name: 'Add a variation' })
  await add.click()
  await card.getByLabel('What, and why').fill('Skylight trimmed in, asked for on site')
  await card.getByLabel('Price').fill('450')
  await card.getByRole('button', { name: 'Add it' }).click()
  await card.getByRole('button', { name: 'Builder said yes' }).last().click()
  await card.getByLabel('Who said yes').fill('Nell Ashby')
  await card.getByRole('button', { name: 'Keep the yes' }).click()
  await card.getByRole('button', { name: 'Take the yes back' }).last().waitFor()
  await add.click()
  await card.getByLabel('What, and why').fill('Second valley gutter left out')
}
