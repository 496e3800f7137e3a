import { test as base, expect, type Page } from '@playwright/test'
import type { Role } from '@/core/policies/permissions'
import { createPerson, type TestPerson } from './people'

/** Fails the test on anything a page complains of, a refused answer of the API apart. */
export const test = base.extend<{ elsewhere: Page }>({
  page: async ({ page }, use) => {
    const complaints = complaintsOf(page)
    await use(page)
    expect(complaints, 'complaints of the page').toEqual([])
  },
  /** A page of a second browser, which knows nothing of the first. */
  elsewhere: async ({ browser }, use) => {
    const context = await browser.newContext()
    const page = await context.newPage()
    const complaints = complaintsOf(page)
    await use(page)
    expect(complaints, 'complaints of the page elsewhere').toEqual([])
    await context.close()
  },
})

/** A refused answer, which tests provoke, and the recorder's script, which a frame that may run nothing refuses. */
function isOfTheTools(text: string): boolean {
  return (
    text.startsWith('Failed to load resource') ||
    text.startsWith("Blocked script execution in 'about:srcdoc'")
  )
}

function complaintsOf(page: Page): string[] {
  const complaints: string[] = []
  page.on('pageerror', (error) => complaints.push(String(error)))
  page.on('console', (message) => {
    if (message.type() === 'error' && !isOfTheTools(message.text())) complaints.push(message.text())
  })
  return complaints
}

export { expect }

/** One person of each role for each worker: tests that run side by side don't change each other's unit or hands. */
const people = new Map<Role, Promise<TestPerson>>()

export function personOf(role: Role): Promise<TestPerson> {
  const person = people.get(role) ?? createPerson(role)
  people.set(role, person)
  return person
}

/** Signs the browser in as this worker's own person of a role. */
export async function signIn(page: Page, role: Role): Promise<TestPerson> {
  const person = await personOf(role)
  const { email, password } = person
  const answer = await page.request.post('/api/session', { data: { email, password } })
  expect(answer.status()).toBe(200)
  return person
}

/** How far the page can be scrolled to the side, which it should not be. */
export function sidewaysOverrunPx(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)
}
