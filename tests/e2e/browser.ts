import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import path from 'node:path'
import { type Browser, chromium, type Page } from '@playwright/test'
import { builtScreens } from '../../server/http/screens.ts'
import { buildApp } from '../../server/app.ts'
import { createTestApp, testPassword } from '../api/harness.ts'

const chromiumArgs = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

const projectDir = path.join(import.meta.dirname, '../..')

export const phone = { width: 390, height: 844 }
export const desk = { width: 1440, height: 900 }

export function launchBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: '/usr/bin/chromium', args: chromiumArgs })
}

/** A whole server on a real port with the built screens; its clock is in the test's hand. */
export async function serveTestApp(options: { now?: Date } = {}) {
  const test = await createTestApp(options)
  const server = createServer()
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const url = `http://localhost:${(server.address() as AddressInfo).port}`
  const { app } = buildApp({
    ...test.deps,
    env: { ...test.env, appUrl: url },
    screens: builtScreens(path.join(projectDir, 'dist')),
  })
  server.on('request', app)
  const close = () =>
    new Promise<void>((resolve) => {
      server.close(() => {
        test.close()
        resolve()
      })
      server.closeAllConnections()
    })
  return { ...test, url, close }
}

export type ServedApp = Awaited<ReturnType<typeof serveTestApp>>

export type Visitor = {
  page: Page
  /** What the browser complained of; a test ends by expecting none. */
  complaints: string[]
  goto(path: string): Promise<void>
  close(): Promise<void>
}

type Look = { viewport?: { width: number; height: number }; dark?: boolean; touch?: boolean }

/** Somebody with a browser of their own; signed in when told as whom. */
export async function visit(
  browser: Browser,
  url: string,
  signIn?: { email: string; password?: string },
  look: Look = {},
): Promise<Visitor> {
  const context = await browser.newContext({
    baseURL: url,
    viewport: look.viewport ?? desk,
    colorScheme: look.dark ? 'dark' : 'light',
    hasTouch: look.touch ?? false,
    reducedMotion: 'reduce',
    locale: 'en-AU',
    timezoneId: 'Australia/Brisbane',
  })
  const page = await context.newPage()
  const complaints: string[] = []
  page.on('pageerror', (error) => complaints.push(`page error: ${error.message}`))
  page.on('console', (message) => {
    if (message.type() === 'error') complaints.push(`console: ${message.text()}`)
  })
  if (signIn) {
    await page.goto('/sign-in')
    await page.getByLabel('E-mail').fill(signIn.email)
    await page.getByLabel('Password').fill(signIn.password ?? testPassword)
    await page.getByRole('button', { name: 'Sign in' }).click()
    await page.getByRole('main').waitFor()
    await page.waitForURL((address) => !address.pathname.startsWith('/sign-in'))
  }
  return {
    page,
    complaints,
    goto: async (address) => {
      await page.goto(address)
      await page.getByRole('heading').first().waitFor()
    },
    close: () => context.close(),
  }
}
