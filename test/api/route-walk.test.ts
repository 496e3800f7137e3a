import { readdirSync, readFileSync } from 'node:fs'
import { join, relative } from 'node:path'
import bcrypt from 'bcryptjs'
import { beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, asNobody, signIn, uniqueCode } from '../support/api'
import { siteDatabase } from '../support/api-stock'

/*
 * Every route and method under src/app/api, and who may call it. Written by hand from what each role may do, not read
 * from the code: a route that is missing here, or here and gone, fails.
 */
type Role = 'machinist' | 'estimator' | 'cribManager' | 'admin'
type Allowed = 'anyone' | readonly Role[]

const roles = ['machinist', 'estimator', 'cribManager', 'admin'] as const
const signedIn: Allowed = roles
const movers: Allowed = ['machinist', 'cribManager', 'admin']
const keepers: Allowed = ['cribManager', 'admin']
const admins: Allowed = ['admin']

const walk: Record<string, Allowed> = {
  'GET /api/health': 'anyone',
  'POST /api/session': 'anyone',
  'GET /api/session': signedIn,
  'DELETE /api/session': 'anyone',
  'POST /api/setup': 'anyone',
  'POST /api/invitations': 'anyone',

  'PATCH /api/me': signedIn,
  'PUT /api/me/password': signedIn,
  'DELETE /api/me/sessions': signedIn,
  'GET /api/settings': signedIn,
  'PATCH /api/settings': admins,
  'GET /api/users': admins,
  'POST /api/users': admins,
  'PATCH /api/users/[id]': admins,
  'POST /api/users/[id]/link': admins,

  'GET /api/cutters': signedIn,
  'POST /api/cutters': keepers,
  'GET /api/cutters/[id]': signedIn,
  'PATCH /api/cutters/[id]': keepers,
  'DELETE /api/cutters/[id]': keepers,
  'GET /api/cutters/export': signedIn,
  'GET /api/cutters/counts': signedIn,
  'POST /api/cutters/bulk': keepers,
  'POST /api/cutters/found-changes': keepers,
  'POST /api/cutters/found-changes/rehearsal': keepers,
  'GET /api/holders': signedIn,
  'POST /api/holders': keepers,
  'GET /api/holders/[id]': signedIn,
  'PATCH /api/holders/[id]': keepers,
  'DELETE /api/holders/[id]': keepers,
  'GET /api/holders/export': signedIn,
  'GET /api/holders/counts': signedIn,
  'POST /api/holders/bulk': keepers,
  'POST /api/holders/found-changes': keepers,
  'POST /api/holders/found-changes/rehearsal': keepers,
  'GET /api/collets': signedIn,
  'POST /api/collets': keepers,
  'GET /api/collets/[id]': signedIn,
  'PATCH /api/collets/[id]': keepers,
  'DELETE /api/collets/[id]': keepers,
  'GET /api/collets/export': signedIn,
  'GET /api/collets/counts': signedIn,
  'POST /api/collets/bulk': keepers,
  'POST /api/collets/found-changes': keepers,
  'POST /api/collets/found-changes/rehearsal': keepers,
  'GET /api/extensions': signedIn,
  'POST /api/extensions': keepers,
  'GET /api/extensions/[id]': signedIn,
  'PATCH /api/extensions/[id]': keepers,
  'DELETE /api/extensions/[id]': keepers,
  'GET /api/extensions/export': signedIn,
  'GET /api/extensions/counts': signedIn,
  'POST /api/extensions/bulk': keepers,
  'POST /api/extensions/found-changes': keepers,
  'POST /api/extensions/found-changes/rehearsal': keepers,
  'GET /api/found-changes': keepers,
  'POST /api/found-changes/[id]/undo': keepers,
  'GET /api/fixtures': signedIn,
  'POST /api/fixtures': keepers,
  'GET /api/fixtures/[id]': signedIn,
  'PATCH /api/fixtures/[id]': keepers,
  'DELETE /api/fixtures/[id]': keepers,
  'GET /api/fixtures/export': signedIn,
  'GET /api/fixtures/counts': signedIn,
  'POST /api/fixtures/bulk': keepers,
  'POST /api/fixtures/found-changes': keepers,
  'POST /api/fixtures/found-changes/rehearsal': keepers,
  'GET /api/makers': signedIn,
  'GET /api/saved-views': signedIn,
  'POST /api/saved-views': signedIn,
  'PATCH /api/saved-views/[id]': signedIn,
  'DELETE /api/saved-views/[id]': signedIn,

  'GET /api/cribs': signedIn,
  'GET /api/locations': signedIn,
  'POST /api/locations': keepers,
  'PATCH /api/locations/[id]': keepers,
  'DELETE /api/locations/[id]': keepers,
  'GET /api/locations/[id]/contents': signedIn,
  'GET /api/items/[id]/stock': signedIn,
  'GET /api/items/[id]/movements': signedIn,
  'GET /api/items/[id]/fits': signedIn,
  'POST /api/movements': movers,
  'POST /api/movements/[id]/reversal': movers,

  'GET /api/imports': keepers,
  'POST /api/imports': keepers,
  'GET /api/imports/[id]': keepers,
  'DELETE /api/imports/[id]': keepers,
  'POST /api/imports/[id]/check': keepers,
  'POST /api/imports/[id]/commit': keepers,
  'GET /api/imports/[id]/rows': keepers,
  'GET /api/imports/[id]/rejects': keepers,

  'GET /api/reorder-points': signedIn,
  'PUT /api/reorder-points': keepers,
  'GET /api/reorder-points/counts': signedIn,
  'GET /api/reorder-points/export': signedIn,
  'PUT /api/reorder-points/[itemId]/[cribId]': keepers,
  'DELETE /api/reorder-points/[itemId]/[cribId]': keepers,
  'GET /api/alerts': signedIn,
  'GET /api/suppliers': signedIn,
  'POST /api/suppliers': keepers,
  'PATCH /api/suppliers/[id]': keepers,
  'GET /api/cribs/[id]/members': keepers,
  'PUT /api/cribs/[id]/members/[userId]': keepers,
  'DELETE /api/cribs/[id]/members/[userId]': keepers,

  'GET /api/first-day': keepers,
  'POST /api/locations/pattern': keepers,
  'GET /api/duplicates': keepers,
  'GET /api/duplicates/merge': keepers,
  'POST /api/duplicates/merge': keepers,
  'GET /api/items/[id]/merges': signedIn,
  'GET /api/fits': signedIn,
  'GET /api/fits/cutters': signedIn,
  'GET /api/starting-speeds': signedIn,
  'POST /api/starting-speeds': keepers,
  'PUT /api/starting-speeds/[id]': keepers,
  'DELETE /api/starting-speeds/[id]': keepers,

  'POST /api/reach': signedIn,
  'POST /api/reach/search': signedIn,
  'GET /api/assemblies': signedIn,
  'POST /api/assemblies': signedIn,
  'POST /api/assemblies/measurements': movers,
  'GET /api/assemblies/[id]': signedIn,
  'PATCH /api/assemblies/[id]': signedIn,
  'DELETE /api/assemblies/[id]': signedIn,
  'POST /api/assemblies/[id]/build': movers,
  'POST /api/assemblies/[id]/measure': movers,
  'POST /api/assemblies/[id]/pocket': movers,
  'POST /api/assemblies/[id]/break-down': movers,
  'POST /api/assemblies/[id]/take-over': signedIn,
  'POST /api/assemblies/[id]/checks': signedIn,
  'POST /api/ball-speed': signedIn,
  'POST /api/machine-window': signedIn,

  'GET /api/machines': signedIn,
  'POST /api/machines': keepers,
  'GET /api/machines/[id]': signedIn,
  'PATCH /api/machines/[id]': keepers,
  'DELETE /api/machines/[id]': keepers,
  'GET /api/set-ups': signedIn,
  'POST /api/set-ups': keepers,
  'GET /api/set-ups/[id]': signedIn,
  'PATCH /api/set-ups/[id]': keepers,
  'DELETE /api/set-ups/[id]': keepers,
  'POST /api/set-ups/[id]/assembly': signedIn,

  'GET /api/[...path]': 'anyone',
  'POST /api/[...path]': 'anyone',
  'PUT /api/[...path]': 'anyone',
  'PATCH /api/[...path]': 'anyone',
  'DELETE /api/[...path]': 'anyone',
}

const methods = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS']
const apiFolder = join(process.cwd(), 'src/app/api')

/** `METHOD /path` of every handler a route file exports. */
function callsOf(file: string, source: string): string[] {
  const path = `/api/${relative(apiFolder, file).replace(/\/?route\.tsx?$/, '')}`.replace(/\/$/, '')
  const exported = [...source.matchAll(/^export\s+(?:const|let|var|(?:async\s+)?function)\s+(\w+)/gm)]
  return exported
    .map((match) => match[1] ?? '')
    .filter((name) => methods.includes(name))
    .map((name) => `${name} ${path}`)
}

const routeFiles = readdirSync(apiFolder, { recursive: true, encoding: 'utf8' })
  .filter((name) => /(^|\/)route\.tsx?$/.test(name))
  .map((name) => join(apiFolder, name))
const sources = routeFiles.map((file) => ({ file, source: readFileSync(file, 'utf8') }))
const onDisk = sources.flatMap(({ file, source }) => callsOf(file, source)).sort()

/** People of the walk's own: some of the calls end sessions. */
const password = 'walks every door'
const emails = new Map<Role, string>()

beforeAll(async () => {
  const db = siteDatabase()
  const passwordHash = await bcrypt.hash(password, 4)
  for (const role of roles) {
    const email = `${uniqueCode('walk')}@leadline.example`.toLowerCase()
    const stored = role === 'cribManager' ? 'crib_manager' : role
    await db('users').insert({ email, name: `Walker ${role}`, role: stored, password_hash: passwordHash })
    emails.set(role, email)
  }
  await db.destroy()
})

const fresh = (role: Role) => signIn(emails.get(role) ?? '', password)

/** Sent with a body that nothing takes and an id that nothing has, so that whoever is let in changes nothing. */
async function statusOf(
  client: ApiClient,
  call: string,
  headers: Record<string, string> = {},
): Promise<number> {
  const [method = '', path = ''] = call.split(' ')
  const hasBody = !['GET', 'HEAD', 'DELETE'].includes(method)
  const answer = await client.send(
    method,
    path.replaceAll('[id]', '0').replace('[...path]', 'nowhere/at/all'),
    {
      ...(hasBody ? { text: '[]' } : {}),
      headers: { 'content-type': 'application/json', ...headers },
    },
  )
  return answer.status
}

/** 401 and 403 say that the door is shut; a fault of ours says nothing. */
function expectLetIn(status: number): void {
  expect([401, 403]).not.toContain(status)
  expect(status).toBeLessThan(500)
}

describe('the walk', () => {
  it('finds every route and method on disk, and names none that is gone', () => {
    expect(onDisk.length).toBeGreaterThan(0)
    expect(onDisk).toEqual(Object.keys(walk).sort())
  })

  it('can read what every route file exports', () => {
    for (const { file, source } of sources) {
      expect(callsOf(file, source), file).not.toHaveLength(0)
      expect(source, file).not.toMatch(/^export\s*(\{|\*|(const|let|var)\s*\{|default)/m)
    }
  })

  it('sees a method that is missing from the table', () => {
    const source = 'export const GET = route({})\nexport async function DELETE() {}\nconst POST = 1\n'
    expect(callsOf(join(apiFolder, 'secrets/[id]/route.ts'), source)).toEqual([
      'GET /api/secrets/[id]',
      'DELETE /api/secrets/[id]',
    ])
  })
})

describe.each(Object.entries(walk))('%s', (call, allowed) => {
  it(allowed === 'anyone' ? 'lets in who is not signed in' : 'refuses who is not signed in', async () => {
    const status = await statusOf(asNobody(), call)
    if (allowed === 'anyone') expectLetIn(status)
    else expect(status).toBe(401)
  })

  it.each(roles)('is open to %s as the table of the walk says', async (role) => {
    const status = await statusOf(await fresh(role), call)
    if (allowed === 'anyone' || allowed.includes(role)) expectLetIn(status)
    else expect(status).toBe(403)
  })

  if (!call.startsWith('GET ')) {
    it('refuses a change that comes from another site', async () => {
      const elsewhere = { origin: 'https://elsewhere.example' }
      expect(await statusOf(await fresh('admin'), call, elsewhere)).toBe(403)
    })
  }
})
