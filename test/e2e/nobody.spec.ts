import type { Page } from '@playwright/test'
import { expect, personOf, signIn, test } from '../support/browser'

const pages = [
  '/reach?depth=25',
  '/ball-speed',
  '/cutters?q=ball&sort=-onHand',
  '/holders',
  '/collets',
  '/extensions',
  '/cutters/1',
  '/locations',
  '/imports',
  '/imports/new',
  '/people',
  '/settings',
  '/account',
  '/starting-speeds',
  '/fits?shankDiameterMm=6',
  '/duplicates?kind=holder',
  '/first-day',
]

async function fillIn(page: Page, password?: string): Promise<void> {
  const person = await personOf('admin')
  await page.getByLabel('E-mail address').fill(person.email)
  await page.getByLabel('Password').fill(password ?? person.password)
  await page.getByRole('button', { name: 'Sign in' }).click()
}

test('every page leads to the sign-in page, which knows the way back', async ({ page }) => {
  for (const path of pages) {
    await page.goto(path)
    await expect(page, path).toHaveURL(`/sign-in?next=${encodeURIComponent(path)}`)
    await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible()
  }
})

test('after signing in the page that was asked for opens, its view in the address', async ({ page }) => {
  await page.goto('/cutters?q=ball&sort=-onHand')
  await fillIn(page)
  await expect(page).toHaveURL('/cutters?q=ball&sort=-onHand')
  await expect(page.getByRole('searchbox')).toHaveValue('ball')
})

test('a session that ended elsewhere leads to sign-in and back as well', async ({ page }) => {
  const person = await signIn(page, 'admin')
  await page.goto('/people')
  const answer = await page.request.delete('/api/session')
  expect(answer.ok()).toBe(true)
  // The browser keeps a cookie that no longer opens anything.
  await page
    .context()
    .addCookies([
      { name: 'leadline-session', value: 'ended', url: new URL(page.url()).origin, httpOnly: true },
    ])
  await page.goto('/cutters?q=ball')
  await expect(page).toHaveURL(`/sign-in?next=${encodeURIComponent('/cutters?q=ball')}`)
  await fillIn(page, person.password)
  await expect(page).toHaveURL('/cutters?q=ball')
})

for (const next of [
  '//evil.example/',
  '/\\evil.example',
  '/\t/evil.example',
  'https://evil.example/',
  '/ /evil.example',
]) {
  test(`it follows no ${JSON.stringify(next)} out of the shop`, async ({ page }) => {
    const left: string[] = []
    await page.route('http*://evil.example/**', (route) => {
      left.push(route.request().url())
      return route.abort()
    })
    await page.goto(`/sign-in?next=${encodeURIComponent(next)}`)
    const origin = new URL(page.url()).origin
    await fillIn(page)
    await expect(page).not.toHaveURL(/\/sign-in/)
    expect(left).toEqual([])
    expect(new URL(page.url()).origin).toBe(origin)
  })
}

test('a wrong password is refused in one sentence, and what was typed stays', async ({ page }) => {
  await page.goto('/sign-in')
  await fillIn(page, 'not the password')
  await expect(page.getByRole('alert').filter({ hasText: 'do not belong together' })).toBeVisible()
  await expect(page.getByLabel('E-mail address')).toHaveValue((await personOf('admin')).email)
  await expect(page).toHaveURL('/sign-in')
})

test('an address that was used up or made up says so', async ({ page }) => {
  await page.goto('/invitation/made-up')
  await expect(page.getByRole('heading', { name: 'This address no longer opens' })).toBeVisible()
  await page.goto('/setup/made-up')
  await expect(page.getByRole('heading')).toBeVisible()
  await expect(page.getByRole('button', { name: 'Set up and sign in' })).toHaveCount(0)
})
