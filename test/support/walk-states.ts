import type { Knex } from 'knex'
import type { Role } from '@/core/policies/permissions'
import { expectAccessible } from './accessibility'
import { type PageState, pageStates } from './accessible-states'
import { signedInAs, uniqueCode } from './api'
import { checkedImport } from './api-imports'
import { siteDatabase } from './api-stock'
import { signIn, test } from './browser'
import { createAssemblyRows, createShownAssemblies } from './kept-assemblies'
import { createMachineRows } from './machine-rows'
import { createReorderingRows, reorderingStates } from './reordering-states'

/** One test for each role: every page that role works with, in every state, light and dark. */
export function testEveryState(extra: readonly PageState[]): void {
  let every: PageState[]
  let db: Knex
  test.describe.configure({ timeout: 300_000 })
  test.beforeAll(async () => {
    db = siteDatabase()
    const crib = await signedInAs('cribManager')
    const rows = await createAssemblyRows(db, crib)
    const list = `Tool #,Type,Dia,LOC,OAL,Shank Dia,Shelf\n${uniqueCode('A')},Square,1/2,1,3,1/2,top\n${uniqueCode('B')},Square,1/2,1,long,1/2,top\n`
    const { id } = await checkedImport(crib, { kind: 'cutters', unit: 'in' }, list)
    const { rows: extensions } = (await crib.get('/api/extensions?limit=1')).body
    const shown = {
      rows,
      importId: id,
      extensionId: extensions[0]?.id ?? '',
      machine: await createMachineRows(crib),
      assemblies: await createShownAssemblies(crib, rows),
      invitation: await openInvitation(),
    }
    every = [...pageStates(shown), ...reorderingStates(await createReorderingRows(db, crib)), ...extra]
  })
  test.afterAll(() => db.destroy())

  const roles: (Role | null)[] = [null, 'machinist', 'cribManager', 'admin']
  for (const role of roles) {
    test(`no rule of accessibility is broken on any page of ${role ?? 'nobody'}`, async ({ page }) => {
      if (role) await signIn(page, role)
      for (const state of every.filter((each) => each.role === role)) {
        await page.goto(state.path)
        await state.reach(page)
        await expectAccessible(page, state.name)
        await page.unrouteAll()
      }
    })
  }
}

/** The path at which someone who was just added sets a password. */
async function openInvitation(): Promise<string> {
  const name = uniqueCode('Invited')
  const email = `${name.toLowerCase()}@leadline.example`
  const added = await (await signedInAs('admin')).post('/api/users', { name, email, role: 'machinist' })
  return new URL(String(added.body.link)).pathname
}
