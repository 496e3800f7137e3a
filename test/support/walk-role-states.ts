import type { Role } from '@/core/policies/permissions'
import { expectAccessible } from './accessibility'
import type { PageState } from './accessible-states'
import { signIn, test } from './browser'

const roles: readonly Role[] = ['machinist', 'cribManager', 'admin']

/** One test for each role that has a state here: each is brought about and held to the rules, light and dark. */
export function testStatesOfRoles(load: () => Promise<readonly PageState[]>): void {
  let states: readonly PageState[]
  test.describe.configure({ timeout: 240_000 })
  test.beforeAll(async () => {
    states = await load()
  })
  for (const role of roles) {
    test(`no rule of accessibility is broken in any state ${role} may see`, async ({ page }) => {
      await signIn(page, role)
      for (const state of states.filter((each) => each.role === role)) {
        await page.goto(state.path)
        await state.reach(page)
        // What a click scrolled under the heading of the page is not out of reach: the page scrolls back.
        await page.evaluate(() => window.scrollTo(0, 0))
        await expectAccessible(page, state.name)
        await page.unrouteAll()
      }
    })
  }
}
