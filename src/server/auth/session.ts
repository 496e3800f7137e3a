import 'server-only'
import { getIronSession, type IronSession } from 'iron-session'
import { cookies } from 'next/headers'
import { db } from '../db/connection'
import { createSession, endSession, findSessionActor } from '../db/stores/session-store'
import { env } from '../env'
import type { Actor } from './actor'
import { hashToken, makeSecretToken } from './secret-token'

interface SealedSession {
  token?: string
}

export const sessionCookieName = 'leadline-session'
const absoluteLimitSeconds = 30 * 24 * 3600

/** The cookie carries only the sealed token; the database knows only the token's hash. */
async function sealedSession(): Promise<IronSession<SealedSession>> {
  return getIronSession<SealedSession>(await cookies(), {
    password: env().SESSION_SECRET,
    cookieName: sessionCookieName,
    ttl: absoluteLimitSeconds,
    cookieOptions: { secure: env().isCookieSecure, httpOnly: true, sameSite: 'lax', path: '/' },
  })
}

/** Who is signed in, or null: no cookie, an ended or idle session, or a person who was made inactive. */
export async function findActor(): Promise<Actor | null> {
  const sealed = await sealedSession()
  return sealed.token ? findSessionActor(db(), hashToken(sealed.token)) : null
}

/** A fresh token at every sign-in; a session that the browser still carries is ended. */
export async function beginSession(userId: string, userAgent: string | null): Promise<void> {
  const sealed = await sealedSession()
  if (sealed.token) await endSession(db(), hashToken(sealed.token))
  const { token, tokenHash } = makeSecretToken()
  await createSession(db(), { userId, tokenHash, userAgent, absoluteLimitSeconds })
  sealed.token = token
  await sealed.save()
}

export async function finishSession(): Promise<void> {
  const sealed = await sealedSession()
  if (sealed.token) await endSession(db(), hashToken(sealed.token))
  sealed.destroy()
}

/** The hash of the session this browser carries: the one that is kept when the others are ended. */
export async function currentTokenHash(): Promise<string | null> {
  const sealed = await sealedSession()
  return sealed.token ? hashToken(sealed.token) : null
}
