import { mkdirSync, rmSync } from 'node:fs'
import path from 'node:path'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { desk, launchBrowser, phone, visit } from './browser.ts'
import { demoSignIn, serveDemo } from './demo.ts'
import { screensOf } from './screen-list.ts'

// A picture of every screen; arguments name screens to take only those ('office-board').
const only = process.argv.slice(2)
const outDir = path.join(import.meta.dirname, '../../screens')
const browser = await launchBrowser()
const app = await serveDemo()
const today = localDayOf(app.clock.now(), 'Australia/Brisbane')
const all = screensOf(app, today)
const wanted = all.filter(
  (screen) => only.length === 0 || only.some((part) => screen.name.includes(part)),
)
if (only.length === 0) rmSync(outDir, { recursive: true, force: true })
mkdirSync(outDir, { recursive: true })

const looks = [
  { name: '390-light', viewport: phone, dark: false },
  { name: '390-dark', viewport: phone, dark: true },
  { name: '1440-light', viewport: desk, dark: false },
  { name: '1440-dark', viewport: desk, dark: true },
]

let taken = 0
for (const look of looks) {
  for (const who of [...new Set(wanted.map((screen) => screen.who))]) {
    const visitor = await visit(browser, app.url, who ? demoSignIn(who) : undefined, look)
    for (const screen of wanted.filter((each) => each.who === who)) {
      await visitor.goto(screen.path)
      await visitor.page.waitForLoadState('networkidle')
      await screen.first?.(visitor.page)
      await visitor.page.waitForTimeout(400)
      await visitor.page.screenshot({
        path: path.join(outDir, `${screen.name}-${look.name}.png`),
        fullPage: true,
      })
      taken++
    }
    for (const complaint of visitor.complaints)
      console.log(`${who ?? 'signed out'} ${look.name}: ${complaint}`)
    await visitor.close()
  }
}
await browser.close()
await app.close()
console.log(`${taken} pictures in screens/`)
