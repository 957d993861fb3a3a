import type { Browser } from '@playwright/test'
import { afterAll, beforeAll } from 'vitest'
import { launchBrowser } from './browser.ts'

/** One browser and one served app for the tests of a file; both are closed after the last. */
export function withBrowserAnd<App extends { close(): Promise<void> }>(serve: () => Promise<App>) {
  let browser: Browser | null = null
  let app: App | null = null
  beforeAll(async () => {
    browser = await launchBrowser()
    app = await serve()
  })
  afterAll(async () => {
    await browser?.close()
    await app?.close()
  })
  return () => {
    if (!browser || !app) throw new Error('The app is not served yet.')
    return { browser, app }
  }
}
