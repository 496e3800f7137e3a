import { expectAccessible } from '../support/accessibility'
import { type ApiClient, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, type Shelf } from '../support/api-stock'
import { expect, sidewaysOverrunPx, signIn, test } from '../support/browser'

let crib: ApiClient
let shelf: Shelf
let code: string
let itemId: string

test.beforeEach(async () => {
  crib = await signedInAs('cribManager')
  shelf = await createShelf(crib)
  code = uniqueCode('PH')
  itemId = await createCutter(crib, { code })
  await crib.send('PUT', `/api/reorder-points/${itemId}/${shelf.cribId}`, {
    body: { reorderPoint: 4, orderUpTo: 12, packSize: 5 },
  })
})

test('a reorder point is found and changed with a thumb, and no grid is loaded', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto('/reorder-points')
  await page.getByRole('searchbox').fill(code)
  const row = page.getByRole('main').getByRole('listitem')
  await expect(row).toHaveCount(1)
  await expect(row).toContainText('Low')
  expect((await row.getByRole('button').boundingBox())?.height).toBeGreaterThanOrEqual(44)
  await expect(page.locator('.ag-root')).toHaveCount(0)
  expect(await sidewaysOverrunPx(page)).toBe(0)
  await row.getByRole('button').click()
  const dialog = page.getByRole('dialog', { name: new RegExp(`^${code} in`) })
  await dialog.getByLabel('Reorder point').fill('30')
  await dialog.getByLabel('Pack').fill('2.5')
  await dialog.getByRole('button', { name: 'Save the changes' }).click()
  await expect(dialog.getByText('“2.5” is not a whole number.')).toBeVisible()
  await dialog.getByLabel('Pack').fill('5')
  await dialog.getByRole('button', { name: 'Save the changes' }).click()
  await expect(dialog.getByText('The reorder point is above the order-up-to level.')).toBeVisible()
  await expect(dialog.getByLabel('Reorder point')).toHaveValue('30')
  await expectAccessible(page, 'a reorder point on a phone, refused')
  await dialog.getByLabel('Reorder point').fill('2')
  await dialog.getByRole('button', { name: 'Save the changes' }).click()
  await expect(row).toContainText('low at 2, up to 12')
})

test('of two who change one, the second keeps what was typed and sees what is there', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  await page.getByRole('main').getByRole('listitem').getByRole('button').click()
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('Order up to').fill('15')
  await crib.send('PUT', `/api/reorder-points/${itemId}/${shelf.cribId}`, {
    body: { reorderPoint: 3, orderUpTo: 20 },
  })
  await dialog.getByRole('button', { name: 'Save the changes' }).click()
  await expect(dialog.getByRole('alert')).toContainText('It is now: reorder point 3, order up to 20, pack 5')
  await expect(dialog.getByLabel('Order up to')).toHaveValue('15')
  await expectAccessible(page, 'a reorder point on a phone, stale')
  await dialog.getByRole('button', { name: 'Begin with theirs' }).click()
  await expect(dialog.getByLabel('Order up to')).toHaveValue('20')
  await expect(dialog.getByRole('alert')).toHaveCount(0)
  await dialog.getByLabel('Order up to').fill('18')
  await dialog.getByRole('button', { name: 'Save the changes' }).click()
  await expect(page.getByRole('main').getByRole('listitem')).toContainText('low at 3, up to 18')
})

test('it is taken away after one more question, and narrowed in a drawer', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto('/reorder-points')
  await page.getByRole('button', { name: 'Filters' }).click()
  const drawer = page.getByRole('dialog')
  await drawer.getByRole('combobox', { name: 'Crib' }).selectOption(shelf.cribId)
  await drawer.getByRole('combobox', { name: 'Sorted by' }).selectOption('-position')
  await drawer.getByRole('button', { name: /^Show \d+$/ }).click()
  await expect(page).toHaveURL(new RegExp(`cribId=${shelf.cribId}&sort=-position`))
  await page.getByRole('main').getByRole('listitem').getByRole('button').click()
  await page.getByRole('button', { name: 'Take it away' }).click()
  await expect(page.getByRole('dialog', { name: `Take away the reorder point of ${code}` })).toBeVisible()
  await page.getByRole('button', { name: 'Take it away' }).click()
  await expect(page.getByText('No reorder point passes these filters.')).toBeVisible()
})

test('what is low is read on a phone, and leads to the item', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.goto('/alerts')
  await page.getByRole('combobox', { name: 'Crib' }).selectOption(shelf.cribId)
  const row = page.getByRole('row').filter({ hasText: code })
  await expect(row).toContainText('Order')
  expect(await sidewaysOverrunPx(page)).toBe(0)
  expect((await row.getByRole('link').boundingBox())?.height).toBeGreaterThanOrEqual(44)
  await row.getByRole('link').click()
  await expect(page.getByRole('heading', { name: code })).toBeVisible()
})
