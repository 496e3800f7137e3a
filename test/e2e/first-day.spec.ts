import { expectAccessible } from '../support/accessibility'
import { signedInAs, uniqueCode } from '../support/api'
import { expect, signIn, test } from '../support/browser'

test('a wall of bins is seen before it is made, and not made twice', async ({ page }) => {
  const crib = await signedInAs('cribManager')
  const code = uniqueCode('CRIB')
  await crib.post('/api/locations', { kind: 'crib', code, name: 'Wall', timeZone: 'Europe/Vienna' })
  await signIn(page, 'cribManager')
  await page.goto('/first-day')
  await expect(page.getByRole('heading', { name: /^Cribs and bins/ })).toBeVisible()
  await expectAccessible(page, 'the first day')
  await page.getByRole('button', { name: 'Bins by a pattern' }).click()
  await page.getByLabel('They stand in').selectOption({ label: `${code} · Wall` })
  await page.getByLabel('First code').fill('A1')
  await page.getByLabel('Last code').fill('F')
  await expect(page.getByText(/Both codes need the same pattern/)).toBeVisible()
  await page.getByLabel('Last code').fill('F12')
  await expect(page.getByText('72 bins, A1 to F12')).toBeVisible()
  await expectAccessible(page, 'the bins to be made')
  await page.getByRole('button', { name: 'Add 72 bins' }).click()
  await expect(page.getByText(`72 bins stand in ${code} now.`)).toBeVisible()

  await page.goto('/locations')
  await page.getByRole('button', { name: 'Bins by a pattern' }).click()
  await page.getByLabel('They stand in').selectOption({ label: `${code} · Wall` })
  await page.getByLabel('First code').fill('F12')
  await page.getByLabel('Last code').fill('F13')
  await expect(page.getByText('One of them is there already')).toBeVisible()
  await expect(page.getByRole('button', { name: 'Add 2 bins' })).toBeDisabled()
})

test('every step of the first day leads on', async ({ page }) => {
  await signIn(page, 'admin')
  await page.goto('/first-day')
  for (const [name, heading] of [
    ['Look at the settings', 'Shop settings'],
    ['Go to the locations', 'Locations'],
    ['Import a file', 'Import a file'],
    ['Import opening stock', 'Import a file'],
    ['Add people', 'People'],
  ] as const) {
    await page.getByRole('link', { name }).click()
    await expect(page.getByRole('heading', { name: heading, level: 1 })).toBeVisible()
    await page.goBack()
  }
})
