import type { Knex } from 'knex'
import { expectAccessible } from '../support/accessibility'
import { type ApiClient, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'
import { expect, sidewaysOverrunPx, signIn, test } from '../support/browser'

let db: Knex
let crib: ApiClient
let shelf: Shelf
let code: string

test.beforeAll(async () => {
  db = siteDatabase()
  crib = await signedInAs('cribManager')
  shelf = await createShelf(crib)
  code = uniqueCode('LOW')
  const itemId = await createCutter(crib, { code })
  await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity: 4 })
  await crib.send('PUT', `/api/reorder-points/${itemId}/${shelf.cribId}`, {
    body: { reorderPoint: 4, orderUpTo: 12, packSize: 5 },
  })
})
test.afterAll(() => db.destroy())

test('what is low stands in the list with what to order, and is counted in the heading', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto('/alerts')
  await page.getByRole('combobox', { name: 'Crib' }).selectOption(shelf.cribId)
  const row = page.getByRole('row').filter({ hasText: code })
  await expect(row).toContainText('A-1')
  await expect(row.getByRole('cell').nth(5)).toHaveText('Order10')
  await expect(
    page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: /^Low stock.*low$/ }),
  ).toBeVisible()
  await expectAccessible(page, 'low stock')
  expect(await sidewaysOverrunPx(page)).toBe(0)
})

test('reorder points are edited in place, and one that cannot be says why and changes nothing', async ({
  page,
}) => {
  await signIn(page, 'cribManager')
  await page.goto('/reorder-points')
  await page.getByRole('searchbox', { name: 'Search reorder points' }).fill(code)
  const cell = page.locator('[row-index="0"] [col-id="packSize"]')
  await expect(page.locator('[row-index="0"] [col-id="itemCode"]')).toHaveText(code)
  await cell.dblclick()
  await page.keyboard.press('ControlOrMeta+A')
  await page.keyboard.type('6')
  await page.keyboard.press('Enter')
  await expect(cell).toHaveText('6')
  const point = page.locator('[row-index="0"] [col-id="reorderPoint"]')
  await point.dblclick()
  await page.keyboard.press('ControlOrMeta+A')
  await page.keyboard.type('900')
  await page.keyboard.press('Enter')
  await expect(page.getByRole('alert').filter({ hasText: code })).toContainText('above the order-up-to level')
  const { rows } = (await crib.get(`/api/reorder-points?cribId=${shelf.cribId}`)).body
  expect(rows).toMatchObject([{ packSize: 6, reorderPoint: 4 }])
})

test('an admin sees what was written to whom, and the templates', async ({ page }) => {
  await signIn(page, 'admin')
  await page.goto('/mail')
  await expect(page.getByRole('heading', { name: 'Mail' })).toBeVisible()
  await expectAccessible(page, 'mail')
  await page.getByRole('link', { name: 'See the templates' }).click()
  await expect(page.getByRole('heading', { name: 'Low stock in Main crib: EM-6-3' })).toBeVisible()
  await expect(page.locator('iframe').first()).toHaveAttribute('srcdoc', /Suggested order/)
  await expect(page.locator('iframe').first()).toHaveAttribute('sandbox', '')
})

test('mail is nobody’s but an admin’s', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto('/mail')
  await expect(page.getByRole('heading', { name: 'Mail', exact: true })).toHaveCount(0)
})
