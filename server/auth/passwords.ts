import { createHash, randomBytes } from 'node:crypto'
import { hash, verify } from '@node-rs/argon2'

// argon2id is this library's default algorithm; memory and passes are OWASP's first choice for it.
const argonOptions = { memoryCost: 19_456, timeCost: 2, parallelism: 1 }

export function hashPassword(password: string): Promise<string> {
  return hash(password, argonOptions)
}

export function verifyPassword(passwordHash: string, password: string): Promise<boolean> {
  return verify(passwordHash, password)
}

/**
 * Spends the time of a real check, so that an unknown address answers no faster than a known one.
 * Made ahead, so that the first such try is no slower either.
 */
export function createDecoy(): { verify(password: string): Promise<false> } {
  const decoyHash = hashPassword(randomBytes(16).toString('hex'))
  return {
    async verify(password) {
      await verifyPassword(await decoyHash, password)
      return false
    },
  }
}

export function newToken(): string {
  return randomBytes(32).toString('base64url')
}

/** Tokens are long and random, so a plain hash is enough to keep them out of the database. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex')
}
