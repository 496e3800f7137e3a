import { expect, personOf, sidewaysOverrunPx, test } from '../support/browser'

test('signing in with a thumb opens the page that was asked for, and the menu signs out', async ({
  page,
}) => {
  const { email, password, name } = await personOf('machinist')
  await page.goto('/locations')
  await expect(page).toHaveURL(/\/sign-in\?next=/)
  expect(await sidewaysOverrunPx(page)).toBe(0)
  await page.getByLabel('E-mail address').fill(email)
  await page.getByLabel('Password').fill(password)
  await page.getByRole('button', { name: 'Sign in' }).tap()
  await expect(page).toHaveURL('/locations')
  await page.getByRole('button', { name: 'Menu' }).tap()
  const menu = page.getByRole('dialog')
  await expect(menu.getByRole('link', { name })).toBeVisible()
  await expect(menu.getByRole('link', { name: 'People' })).toHaveCount(0)
  await menu.getByRole('button', { name: 'Sign out' }).tap()
  await expect(page).toHaveURL('/sign-in')
  await page.goBack()
  await expect(page).toHaveURL(/\/sign-in/)
})
