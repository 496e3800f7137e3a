import type { Knex } from 'knex'
import { type ApiClient, signedInAs } from '../support/api'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'

let db: Knex
let crib: ApiClient
let shelf: Shelf
let itemId: string

test.beforeAll(async () => {
  db = siteDatabase()
  crib = await signedInAs('cribManager')
  shelf = await createShelf(crib)
})
test.afterAll(() => db.destroy())

test.beforeEach(async ({ page }) => {
  itemId = await createCutter(crib)
  await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity: 5 })
  await signIn(page, 'machinist')
  await page.goto(`/cutters/${itemId}`)
})

test('issue, return and reversal are posted from the page and show on it at once', async ({ page }) => {
  const balance = (name: RegExp) => page.getByRole('row', { name })
  await expect(balance(/^A-1 .* New 5$/)).toBeVisible()
  await page.getByRole('button', { name: 'Issue' }).click()
  await page.getByLabel('Pieces').fill('2')
  await page.getByRole('dialog').getByRole('button', { name: 'Issue' }).click()
  await expect(balance(/^A-1 .* New 3$/)).toBeVisible()
  await expect(balance(/Issue 2 A-1 new/)).toBeVisible()

  await page.getByRole('button', { name: 'Return' }).click()
  await page.getByRole('dialog').getByRole('button', { name: 'Return' }).click()
  await expect(balance(/^A-1 .* Used 1$/)).toBeVisible()

  await balance(/Return 1/)
    .getByRole('button', { name: 'Reverse' })
    .click()
  await page.getByRole('button', { name: 'Reverse it' }).click()
  await expect(balance(/Return 1 reversed/)).toBeVisible()
  await expect(balance(/^A-1 .* Used 1$/)).toHaveCount(0)
})

test('more than there is gets refused beside the number, and nothing moves', async ({ page }) => {
  await page.getByRole('button', { name: 'Issue' }).click()
  await page.getByLabel('Pieces').fill('6')
  await page.getByRole('dialog').getByRole('button', { name: 'Issue' }).click()
  await expect(page.getByLabel('Pieces')).toHaveAccessibleDescription(/Not enough there/)
  expect((await crib.get(`/api/items/${itemId}/stock`)).body.onHand).toBe(5)
})

test('an item with stock is not archived, and the page says why', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.reload()
  await page.getByRole('button', { name: 'Archive' }).click()
  await page.getByRole('button', { name: 'Archive it' }).click()
  await expect(page.getByRole('alert').filter({ hasText: 'pieces of this item' })).toBeVisible()
})

test('an issue that brings an item low says so, and the count in the heading moves at once', async ({
  page,
}) => {
  await crib.send('PUT', `/api/reorder-points/${itemId}/${shelf.cribId}`, {
    body: { reorderPoint: 3, orderUpTo: 6 },
  })
  await signIn(page, 'cribManager')
  await page.goto(`/cutters/${itemId}`)
  const heading = page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: /^Low stock/ })
  await expect(heading).toHaveText(/\d/)
  const before = (await heading.textContent()) ?? ''
  await page.getByRole('button', { name: 'Issue' }).click()
  await page.getByLabel('Pieces').fill('2')
  await page.getByRole('dialog').getByRole('button', { name: 'Issue' }).click()
  await expect(page.getByText(/ is now low in .+: 3 left, reorder point 3\.$/)).toBeVisible()
  await expect(heading).not.toHaveText(before)
})

test('its reorder point stands beside its stock, is set there and changed there', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto(`/cutters/${itemId}`)
  await expect(page.getByText('It has no reorder point, so nobody is told when it runs out.')).toBeVisible()
  await page.getByRole('button', { name: 'Add a reorder point' }).click()
  const dialog = page.getByRole('dialog')
  await expect(dialog.getByRole('combobox', { name: 'Crib' })).toHaveValue(shelf.cribId)
  await expect(dialog.getByLabel('Item’s code')).toHaveCount(0)
  await dialog.getByLabel('Reorder point').fill('5')
  await dialog.getByLabel('Order up to').fill('9')
  await dialog.getByRole('button', { name: 'Add the reorder point' }).click()
  const row = page.getByRole('row', { name: / 5 9 5, low/ })
  await expect(row).toBeVisible()
  await page.getByRole('button', { name: 'Add a reorder point' }).click()
  await dialog.getByLabel('Reorder point').fill('1')
  await dialog.getByLabel('Order up to').fill('1')
  await dialog.getByRole('button', { name: 'Add the reorder point' }).click()
  await expect(dialog.getByText('It has a reorder point there already: change that one.')).toBeVisible()
  await dialog.getByRole('button', { name: 'Cancel' }).click()
  await row.getByRole('button', { name: /^Change the reorder point/ }).click()
  await dialog.getByLabel('Reorder point').fill('2')
  await dialog.getByRole('button', { name: 'Save the changes' }).click()
  await expect(page.getByRole('row', { name: / 2 9 5 / })).toBeVisible()

  await signIn(page, 'machinist')
  await page.reload()
  await expect(page.getByRole('row', { name: / 2 9 5$/ })).toBeVisible()
  await expect(page.getByRole('button', { name: 'Add a reorder point' })).toHaveCount(0)
})
