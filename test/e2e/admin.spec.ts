import type { Page } from '@playwright/test'
import { uniqueCode } from '../support/api'
import { expect, signIn, test } from '../support/browser'
import { createPerson } from '../support/people'

const dialog = (page: Page) => page.getByRole('dialog')

async function openPerson(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name, exact: true }).click()
  await expect(dialog(page).getByLabel('Role')).toBeVisible()
}

test('a person is added, sets a password at the one-time address, is given another role, and is sent away', async ({
  page,
  elsewhere,
}) => {
  const name = uniqueCode('Nora')
  const email = `${name.toLowerCase()}@leadline.example`
  const password = uniqueCode('a password of hers')
  await signIn(page, 'admin')
  await page.goto('/people')
  await page.getByRole('button', { name: 'Add a person' }).click()
  await dialog(page).getByLabel('Name').fill(name)
  await dialog(page).getByLabel('E-mail address').fill('nora')
  await dialog(page).getByLabel('Role').selectOption('machinist')
  await dialog(page).getByRole('button', { name: 'Add and make the invitation' }).click()
  await expect(dialog(page).getByLabel('E-mail address')).toHaveAccessibleDescription(/not an e-mail address/)
  await dialog(page).getByLabel('E-mail address').fill(email)
  await dialog(page).getByRole('button', { name: 'Add and make the invitation' }).click()
  const address = await dialog(page).getByLabel('One-time address to set a password').inputValue()
  await dialog(page).getByRole('button', { name: 'Done' }).click()
  const line = page.getByRole('row').filter({ hasText: email })
  await expect(line).toContainText('Invited, no password yet')

  // The address names where people reach the shop; here that may be another port than the one under test.
  const invitation = new URL(address).pathname
  await elsewhere.goto(invitation)
  await elsewhere.getByLabel('Password').fill('short')
  await elsewhere.getByRole('button', { name: 'Set password' }).click()
  await expect(elsewhere.getByLabel('Password')).toHaveAccessibleDescription(/at least 8 characters/)
  await elsewhere.getByLabel('Password').fill(password)
  await elsewhere.getByRole('button', { name: 'Set password' }).click()
  await elsewhere.getByRole('link', { name: 'Sign in with it' }).click()
  await elsewhere.getByLabel('E-mail address').fill(email)
  await elsewhere.getByLabel('Password').fill(password)
  await elsewhere.getByRole('button', { name: 'Sign in' }).click()
  await expect(elsewhere).toHaveURL('/reach')
  const places = elsewhere.getByRole('navigation', { name: 'Main' })
  await expect(places.getByRole('link', { name: 'Imports' })).toHaveCount(0)

  await page.reload()
  await expect(line).toContainText('Active')
  await openPerson(page, name)
  await dialog(page).getByLabel('Role').selectOption('cribManager')
  await dialog(page).getByRole('button', { name: 'Save' }).click()
  await expect(line).toContainText('Crib manager')
  await elsewhere.reload()
  await expect(places.getByRole('link', { name: 'Imports' })).toBeVisible()

  await openPerson(page, name)
  await dialog(page).getByLabel('Standing').selectOption('no')
  await dialog(page).getByRole('button', { name: 'Save' }).click()
  await expect(line).toContainText('Inactive')
  await elsewhere.goto('/cutters')
  await expect(elsewhere).toHaveURL(/\/sign-in/)
  await elsewhere.getByLabel('E-mail address').fill(email)
  await elsewhere.getByLabel('Password').fill(password)
  await elsewhere.getByRole('button', { name: 'Sign in' }).click()
  await expect(elsewhere.getByRole('alert').filter({ hasText: 'do not belong together' })).toBeVisible()
})

test('a one-time address opens once', async ({ page, elsewhere }) => {
  const person = await createPerson('machinist')
  await signIn(page, 'admin')
  await page.goto('/people')
  await openPerson(page, person.name)
  await dialog(page).getByRole('button', { name: 'Make a password link' }).click()
  const address = await dialog(page).getByLabel('One-time address to set a password').inputValue()
  const path = new URL(address).pathname
  await elsewhere.goto(path)
  await elsewhere.getByLabel('Password').fill(uniqueCode('another password'))
  await elsewhere.getByRole('button', { name: 'Set password' }).click()
  await expect(elsewhere.getByRole('heading', { name: 'Your password is set' })).toBeVisible()
  await elsewhere.goto(path)
  await expect(elsewhere.getByRole('heading', { name: 'This address no longer opens' })).toBeVisible()
})

test('an e-mail address belongs to one person, however it is written', async ({ page }) => {
  const taken = await createPerson('machinist')
  await signIn(page, 'admin')
  await page.goto('/people')
  await page.getByRole('button', { name: 'Add a person' }).click()
  await dialog(page).getByLabel('Name').fill('The same again')
  await dialog(page).getByLabel('E-mail address').fill(taken.email.toUpperCase())
  await dialog(page).getByRole('button', { name: 'Add and make the invitation' }).click()
  await expect(dialog(page)).toContainText(/already/)
})

test('a password is changed with the present one, and every other browser is signed out', async ({
  page,
  elsewhere,
}) => {
  const { email, password } = await createPerson('machinist')
  for (const each of [page, elsewhere]) await each.request.post('/api/session', { data: { email, password } })
  await elsewhere.goto('/account')
  await page.goto('/account')
  await page.getByLabel('Present password').fill('not it')
  await page.getByLabel('New password').fill(`${password} and more`)
  await page.getByRole('button', { name: 'Change password' }).click()
  await expect(page.getByLabel('Present password')).toHaveAccessibleDescription(/.+/)
  await page.getByLabel('Present password').fill(password)
  await page.getByRole('button', { name: 'Change password' }).click()
  await expect(page.getByText('Your password is changed')).toBeVisible()
  await elsewhere.reload()
  await expect(elsewhere).toHaveURL(/\/sign-in\?next=%2Faccount/)
})

test('a figure of reach that the admin sets decides the verdict of everyone', async ({ page, elsewhere }) => {
  // A drill of 6 mm for a hole of 6.15: 0.075 off on each side, 0.15 on the diameter, against a tolerance of 0.1.
  const check =
    '/reach?feature=hole&depth=20&diameter=6.15&c.form=drill&c.DC=6&c.SIG=118&c.LCF=40&c.DMM=6&c.OAL=80&h.A=100&h.depth=60&h.grip=10&h.segments=nut:18x28'
  await signIn(page, 'admin')
  await signIn(elsewhere, 'machinist')
  await page.goto('/settings')
  const tolerance = page.getByLabel('Hole tolerance')
  const before = await tolerance.inputValue()
  expect(before).toBe('0.1')
  try {
    await elsewhere.goto(check)
    await expect(elsewhere.getByTestId('verdict')).toContainText('hole')
    await expect(elsewhere.getByTestId('verdict')).not.toContainText('Reaches')
    await tolerance.fill('a bit')
    await page.getByRole('button', { name: 'Save' }).click()
    await expect(tolerance).toHaveAccessibleDescription(/is not a length/)
    await tolerance.fill('0.2')
    await page.getByRole('button', { name: 'Save' }).click()
    await expect(page.getByText('Saved. Every check from now on uses these.')).toBeVisible()
    await elsewhere.reload()
    await expect(elsewhere.getByTestId('verdict')).toContainText('Reaches 20 mm')
  } finally {
    const settings = await (await page.request.get('/api/settings')).json()
    const restored = await page.request.patch('/api/settings', {
      data: { version: settings.version, reach: { ...settings.reach, holeToleranceMm: Number(before) } },
    })
    expect(restored.status()).toBe(200)
  }
})
