import { expect, test } from 'vitest'
import { readEnv } from '../../server/env.ts'

test('outside production every setting has a working default', () => {
  const env = readEnv({})
  expect(env).toMatchObject({ mode: 'development', port: 4380, smtpUrl: null, seedDemo: true })
  expect(env.appUrl).toBe('http://localhost:4380')
  expect(env.sessionSecret.length).toBeGreaterThanOrEqual(32)
})

test.each([
  ['PORT', 'eighty'],
  ['PORT', '70000'],
  ['APP_URL', 'not an address'],
  ['SESSION_SECRET', 'too short'],
  ['SMTP_URL', 'https://mail.example'],
  ['SEED_DEMO', 'perhaps'],
  ['LOG_LEVEL', 'loud'],
])('a wrong %s (%s) stops the start and names itself', (name, value) => {
  expect(() => readEnv({ [name]: value })).toThrow(
    new RegExp(`These settings are wrong:\n {2}${name}: `),
  )
})

test('production insists on its own secret and address, and seeds no demo unless asked', () => {
  expect(() => readEnv({ NODE_ENV: 'production' })).toThrow(
    /SESSION_SECRET[\s\S]*APP_URL|APP_URL[\s\S]*SESSION_SECRET/,
  )
  const own = {
    NODE_ENV: 'production',
    SESSION_SECRET: 'x'.repeat(40),
    APP_URL: 'https://roofs.example/',
  }
  expect(readEnv(own)).toMatchObject({ seedDemo: false, appUrl: 'https://roofs.example' })
  expect(readEnv({ ...own, SEED_DEMO: '1' }).seedDemo).toBe(true)
})
