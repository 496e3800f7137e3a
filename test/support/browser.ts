import { test as base, expect, type Page } from '@playwright/test'
import type { Role } from '@/core/policies/permissions'

const emails: Record<Role, string> = {
  admin: 'admin@leadline.example',
  cribManager: 'crib@leadline.example',
  machinist: 'machinist@leadline.example',
  estimator: 'estimator@leadline.example',
}

/** Fails the test on anything the page complains of, a refused answer of the API apart. */
export const test = base.extend({
  page: async ({ page }, use) => {
    const complaints: string[] = []
    page.on('pageerror', (error) => complaints.push(String(error)))
    page.on('console', (message) => {
      const isRefusal = message.text().startsWith('Failed to load resource')
      if (message.type() === 'error' && !isRefusal) complaints.push(message.text())
    })
    await use(page)
    expect(complaints, 'complaints of the page').toEqual([])
  },
})

export { expect }

/** Signs the browser in as the demo account of a role. */
export async function signIn(page: Page, role: Role): Promise<void> {
  const answer = await page.request.post('/api/session', {
    data: { email: emails[role], password: 'leadline-demo' },
  })
  expect(answer.status()).toBe(200)
}
