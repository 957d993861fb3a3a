import { AxeBuilder } from '@axe-core/playwright'
import { expect, test } from 'vitest'
import { desk, phone, visit } from './browser.ts'
import { demoSignIn, serveDemo } from './demo.ts'
import { screensOf } from './screen-list.ts'
import { withBrowserAnd } from './with-app.ts'

const served = withBrowserAnd(serveDemo)

/** Every screen in both looks with `npm run proof`; else each in one, turn about. */
const isProof = process.env['PROOF'] === '1'
const looks = [
  { name: 'on a phone, light', viewport: phone, dark: false, turn: 0 },
  { name: 'at the desk, dark', viewport: desk, dark: true, turn: 1 },
]

// side by side: most of the time is the browser's
test.concurrent.each(looks)(
  'axe finds nothing on the screens of this turn and none scrolls sideways: $name',
  { timeout: 480_000 },
  async (look) => {
    const { browser, app } = served()
    const screens = screensOf(app, '2026-12-02').filter((_, i) => isProof || i % 2 === look.turn)
    expect(screens.length).toBeGreaterThan(20)
    const faults: string[] = []
    for (const who of [...new Set(screens.map((screen) => screen.who))]) {
      const visitor = await visit(browser, app.url, who ? demoSignIn(who) : undefined, look)
      for (const { name, path, first } of screens.filter((screen) => screen.who === who)) {
        await visitor.goto(path)
        await visitor.page.waitForLoadState('networkidle')
        await first?.(visitor.page)
        const { violations } = await new AxeBuilder({ page: visitor.page }).analyze()
        for (const violation of violations) {
          faults.push(
            `${name}: ${violation.id} at ${violation.nodes[0]?.target.join(' ')} (${violation.nodes.length})`,
          )
        }
        const overflow = await visitor.page.evaluate(
          () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
        )
        if (overflow > 0) faults.push(`${name}: scrolls sideways by ${overflow} px`)
      }
      faults.push(...visitor.complaints.map((complaint) => `${who}: ${complaint}`))
      await visitor.close()
    }
    expect(faults).toEqual([])
  },
)
