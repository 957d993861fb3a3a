import { randomBytes } from 'node:crypto'
import path from 'node:path'
import { z } from 'zod'

const flag = z
  .enum(['0', '1', 'true', 'false'])
  .transform((value) => value === '1' || value === 'true')

const isHttps = (url: string | undefined): boolean => url?.startsWith('https:') ?? false

const envSchema = z
  .object({
    NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
    PORT: z.coerce.number().int().min(0).max(65_535).default(4380),
    HOST: z.string().min(1).default('127.0.0.1'),
    DATA_DIR: z.string().min(1).default('data'),
    APP_URL: z
      .url()
      .refine((url) => /^https?:\/\//.test(url), 'must start with http:// or https://')
      .optional(),
    SESSION_SECRET: z.string().min(32, 'at least 32 characters').optional(),
    SMTP_URL: z
      .url()
      .refine((url) => /^smtps?:/.test(url), 'must start with smtp:// or smtps://')
      .optional(),
    MAIL_FROM: z.string().min(3).default('Ridgehand <roofs@ridgehand.example>'),
    SEED_DEMO: flag.optional(),
    TRUST_PROXY: z.coerce.number().int().min(0).max(5).optional(),
    LOG_LEVEL: z.enum(['silent', 'error', 'warn', 'info', 'debug']).default('info'),
  })
  .superRefine((env, context) => {
    if (env.TRUST_PROXY === 0 && isHttps(env.APP_URL))
      context.addIssue({
        code: 'custom',
        path: ['TRUST_PROXY'],
        message: 'must be at least 1 with an https address: the proxy that speaks TLS',
      })
    if (env.NODE_ENV !== 'production') return
    for (const name of ['SESSION_SECRET', 'APP_URL'] as const) {
      if (!env[name])
        context.addIssue({ code: 'custom', path: [name], message: 'must be set in production' })
    }
  })

export type Env = {
  mode: 'development' | 'test' | 'production'
  port: number
  host: string
  dataDir: string
  /** Where links in mail lead; no slash at the end. */
  appUrl: string
  sessionSecret: string
  smtpUrl: string | null
  mailFrom: string
  seedDemo: boolean
  /** Proxies in front; this server speaks no TLS itself, so an https address means one at least. */
  trustProxy: number
  logLevel: 'silent' | 'error' | 'warn' | 'info' | 'debug'
}

/**
 * Reads the settings.
 *
 * @throws Error naming every bad setting.
 */
export function readEnv(source: NodeJS.ProcessEnv): Env {
  const given = Object.fromEntries(Object.entries(source).filter(([, value]) => value !== ''))
  const parsed = envSchema.safeParse(given)
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`)
    throw new Error(`These settings are wrong:\n${lines.join('\n')}`)
  }
  const env = parsed.data
  return {
    mode: env.NODE_ENV,
    port: env.PORT,
    host: env.HOST,
    dataDir: path.resolve(env.DATA_DIR),
    appUrl: (env.APP_URL ?? `http://localhost:${env.PORT}`).replace(/\/$/, ''),
    sessionSecret: env.SESSION_SECRET ?? randomBytes(32).toString('hex'),
    smtpUrl: env.SMTP_URL ?? null,
    mailFrom: env.MAIL_FROM,
    seedDemo: env.SEED_DEMO ?? env.NODE_ENV !== 'production',
    trustProxy: env.TRUST_PROXY ?? (isHttps(env.APP_URL) ? 1 : 0),
    logLevel: env.LOG_LEVEL,
  }
}
