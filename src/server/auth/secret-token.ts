import { createHash, randomBytes } from 'node:crypto'

/** 256 random bits for a cookie or a one-time address, and the hash that is all the database keeps of them. */
export function makeSecretToken(): { token: string; tokenHash: string } {
  const token = randomBytes(32).toString('base64url')
  return { token, tokenHash: hashToken(token) }
}

export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex')
}
