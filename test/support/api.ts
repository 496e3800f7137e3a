import { randomUUID } from 'node:crypto'
import type { Role } from '@/core/policies/permissions'

/** The demo account of each role, as the interface's description fixes them. */
const emails: Record<Role, string> = {
  admin: 'admin@leadline.example',
  cribManager: 'crib@leadline.example',
  machinist: 'machinist@leadline.example',
  estimator: 'estimator@leadline.example',
}
const demoPassword = 'leadline-demo'

/** What tests read of an answer by name; anything else they compare as a whole. */
export interface AnswerBody {
  id: string
  version: number
  /** Of a row its own code, of a problem the problem's. */
  code: string
  cribId: string
  archivedAt: string | null
  rows: AnswerBody[]
  total?: number
  nextCursor: string | null
  errors?: { path: string; message: string }[]
  [member: string]: unknown
}

export interface Answer {
  status: number
  /** Read as JSON; empty where there is none. */
  body: AnswerBody
  headers: Headers
}

export interface SendOptions {
  body?: unknown
  /** Sent as it is, in place of `body`. */
  text?: string
  idempotencyKey?: string
  headers?: Record<string, string>
}

export interface ApiClient {
  /** The signed-in person's own id and hands. */
  user: { id: string; locationId: string }
  send(method: string, path: string, options?: SendOptions): Promise<Answer>
  get(path: string): Promise<Answer>
  /** For what is no JSON: a download. */
  getText(path: string): Promise<{ status: number; text: string; headers: Headers }>
  post(path: string, body: unknown, idempotencyKey?: string): Promise<Answer>
  patch(path: string, body: unknown): Promise<Answer>
  remove(path: string): Promise<Answer>
}

/** Where the site under test is; tests refuse one that is not on this machine. */
export function baseUrl(): string {
  const url = process.env.BASE_URL
  if (!url) throw new Error('Set BASE_URL to the address of a running Leadline.')
  if (!['127.0.0.1', 'localhost'].includes(new URL(url).hostname)) {
    throw new Error('Tests run against a site on this machine only.')
  }
  return url
}

/** Nobody signed in. */
export function asNobody(): ApiClient {
  return clientWith('', { id: '', locationId: '' })
}

/** A session of its own for the demo account of a role. */
export function signedInAs(role: Role): Promise<ApiClient> {
  return signIn(emails[role], demoPassword)
}

export async function signIn(email: string, password: string): Promise<ApiClient> {
  const answer = await asNobody().post('/api/session', { email, password })
  if (answer.status !== 200) throw new Error(`Signing in as ${email} answered ${answer.status}.`)
  const cookie = answer.headers
    .getSetCookie()
    .map((line) => line.split(';')[0])
    .join('; ')
  return clientWith(cookie, answer.body.user as ApiClient['user'])
}

/** A code that no other row has. */
export function uniqueCode(prefix: string): string {
  return `${prefix}-${randomUUID().slice(0, 13)}`
}

/** All rows of a list, block by block as a script reads them. */
export async function allRows(client: ApiClient, path: string): Promise<AnswerBody[]> {
  const rows: AnswerBody[] = []
  let cursor: string | null = ''
  while (cursor !== null) {
    const query: string = cursor ? `&cursor=${cursor}` : ''
    const block: Answer = await client.get(`${path}${query}`)
    if (block.status !== 200) throw new Error(`${path} answered ${block.status}.`)
    rows.push(...block.body.rows)
    cursor = block.body.nextCursor
  }
  return rows
}

/** The paths a problem names, in order. */
export function faultPaths(answer: Answer): string[] {
  return (answer.body.errors ?? []).map((fault) => fault.path)
}

function clientWith(cookie: string, user: ApiClient['user']): ApiClient {
  const send: ApiClient['send'] = async (method, path, options = {}) => {
    const text = options.text ?? (options.body === undefined ? null : JSON.stringify(options.body))
    const response = await fetch(`${baseUrl()}${path}`, {
      method,
      body: text,
      redirect: 'manual',
      headers: {
        ...(text === null ? {} : { 'content-type': 'application/json' }),
        ...(cookie ? { cookie } : {}),
        ...(options.idempotencyKey ? { 'idempotency-key': options.idempotencyKey } : {}),
        ...options.headers,
      },
    })
    const answered = await response.text()
    return { status: response.status, body: jsonOf(answered), headers: response.headers }
  }
  return {
    user,
    send,
    get: (path) => send('GET', path),
    getText: async (path) => {
      const response = await fetch(`${baseUrl()}${path}`, { headers: { cookie } })
      // The mark of UTF-8 at the beginning belongs to the file, which `text()` would drop.
      const text = new TextDecoder('utf-8', { ignoreBOM: true }).decode(await response.arrayBuffer())
      return { status: response.status, text, headers: response.headers }
    },
    post: (path, body, idempotencyKey) =>
      send('POST', path, { body, ...(idempotencyKey ? { idempotencyKey } : {}) }),
    patch: (path, body) => send('PATCH', path, { body }),
    remove: (path) => send('DELETE', path),
  }
}

function jsonOf(text: string): AnswerBody {
  try {
    return JSON.parse(text)
  } catch {
    return JSON.parse('{}')
  }
}
