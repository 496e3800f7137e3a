import { expectAccessible } from '../support/accessibility'
import { type ApiClient, signedInAs } from '../support/api'
import { createShelf, type Shelf } from '../support/api-stock'
import { expect, personOf, signIn, test } from '../support/browser'

let crib: ApiClient
let shelf: Shelf

test.beforeEach(async () => {
  crib = await signedInAs('cribManager')
  shelf = await createShelf(crib)
})

test('a crib without members says so where its alerts and points are, until somebody is chosen', async ({
  page,
}) => {
  const { email } = await personOf('machinist')
  await signIn(page, 'cribManager')
  await page.goto('/alerts')
  await page.getByRole('combobox', { name: 'Crib' }).selectOption(shelf.cribId)
  const notice = page.getByText(
    'has no members, so mail of what is low goes to every crib manager and admin.',
  )
  await expect(notice).toBeVisible()
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  await expect(page.getByRole('combobox', { name: 'Crib' })).toHaveValue(shelf.cribId)
  await notice.getByRole('link', { name: 'Choose who gets it' }).click()
  await expect(page.getByRole('heading', { name: 'Who gets the mail' })).toBeVisible()
  await page.getByRole('combobox', { name: 'Crib' }).selectOption(shelf.cribId)
  await expectAccessible(page, 'a crib without members')
  const box = page.getByRole('checkbox', { name: new RegExp(email) })
  await box.focus()
  await page.keyboard.press('Space')
  await expect(box).toBeChecked()
  await expect(box).toBeFocused()
  await expect(page.getByText('has no members')).toHaveCount(0)
  await expect(page.getByRole('combobox', { name: 'Crib' })).toHaveValue(shelf.cribId)
  // Scrolled to the box, another one may lie half under the heading, which counts as too small a target.
  await page.evaluate(() => window.scrollTo(0, 0))
  await expectAccessible(page, 'a crib with a member')
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  await expect(page.getByText('No reorder point passes these filters.')).toBeVisible()
  await expect(notice).toHaveCount(0)
})

test('what could not be changed stays as it is and says so', async ({ page }) => {
  const { email } = await personOf('machinist')
  await signIn(page, 'cribManager')
  await page.goto('/crib-members')
  await page.getByRole('combobox', { name: 'Crib' }).selectOption(shelf.cribId)
  const box = page.getByRole('checkbox', { name: new RegExp(email) })
  await page.route(/\/members\/\d+$/, (route) => route.abort())
  await box.click()
  await expect(page.getByRole('alert').filter({ hasText: 'was not changed' })).toContainText(
    'cannot be reached',
  )
  await expect(box).not.toBeChecked()
})

test('the members are for those who keep cribs', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.goto('/alerts')
  await expect(page.getByRole('link', { name: 'Who gets the mail' })).toHaveCount(0)
  await page.goto('/crib-members')
  await expect(page.getByRole('heading', { name: 'Who gets the mail' })).toHaveCount(0)
})
