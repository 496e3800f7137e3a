import { test as base, type ConsoleMessage, expect, type Page } from '@playwright/test'
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

/** A refused answer, which tests provoke. */
function isRefusedAnswer(message: ConsoleMessage): boolean {
  return message.text().startsWith('Failed to load resource')
}

/**
 * The recorder of a trace runs its script in every frame, which the frame of a mail refuses as it refuses any. Without a
 * trace nothing is said. Whether its message names an address differs from run to run, so it is known by the page alone.
 */
function isRecorderInMail(page: Page, message: ConsoleMessage): boolean {
  return (
    new URL(page.url()).pathname.startsWith('/mail') &&
    message.text().startsWith("Blocked script execution in 'about:srcdoc'")
  )
}

function complaintsOf(page: Page): string[] {
  const complaints: string[] = []
  page.on('pageerror', (error) => complaints.push(String(error)))
  page.on('console', (message) => {
    if (message.type() !== 'error' || isRefusedAnswer(message) || isRecorderInMail(page, message)) return
    complaints.push(message.text())
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

/** Takes one of the acts behind a list's “More”. */
export async function chooseMore(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name: 'More', exact: true }).click()
  await page.getByRole('menuitem', { name, exact: true }).click()
}

/** How far the page can be scrolled to the side, which it should not be. */
export function sidewaysOverrunPx(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)
}
