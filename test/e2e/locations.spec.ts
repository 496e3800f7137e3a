import type { Page } from '@playwright/test'
import type { Knex } from 'knex'
import { type ApiClient, signedInAs, uniqueCode } from '../support/api'
import { createCutter, putOnShelf, siteDatabase } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'
import { createNamedShelf } from '../support/shop-rows'

let db: Knex
let crib: ApiClient

test.beforeAll(async () => {
  db = siteDatabase()
  crib = await signedInAs('cribManager')
})
test.afterAll(() => db.destroy())

const dialog = (page: Page) => page.getByRole('dialog')

async function add(page: Page, kind: string | null, code: string, name: string): Promise<void> {
  if (kind) await dialog(page).getByLabel('What').selectOption(kind)
  await dialog(page).getByLabel('Code').fill(code)
  await dialog(page).getByLabel('Name').fill(name)
  await dialog(page).getByRole('button', { name: 'Add', exact: true }).click()
  await expect(dialog(page)).toHaveCount(0)
}

test('a crib is set up from the door to the bin, renamed, and an empty bin taken away again', async ({
  page,
}) => {
  const code = uniqueCode('CRIB')
  await signIn(page, 'cribManager')
  await page.goto('/locations')
  await page.getByRole('button', { name: 'Add a crib' }).click()
  await add(page, null, code, 'Back room')
  const section = page.getByRole('region', { name: `${code} Back room` })
  await section.getByRole('button', { name: `Add to ${code}` }).click()
  await add(page, 'cabinet', 'B', 'By the window')
  await section.getByRole('button', { name: 'Add to B' }).click()
  await add(page, 'drawer', 'B1', 'Top drawer')
  await section.getByRole('button', { name: 'Add a bin to B1' }).click()
  await add(page, 'bin', 'B1-01', 'Left')
  await section.getByRole('button', { name: 'Bin B1-01' }).click()
  await expect(dialog(page).getByText('Nothing lies in it.')).toBeVisible()
  await dialog(page).getByLabel('Code').fill('B1-02')
  await dialog(page).getByRole('button', { name: 'Save' }).click()
  await section.getByRole('button', { name: 'Bin B1-02' }).click()
  await dialog(page).getByRole('button', { name: 'Archive' }).click()
  await expect(section.getByRole('button', { name: /^Bin B1/ })).toHaveCount(0)
})

test('a code is used once in its crib, and the refusal stands beside it', async ({ page }) => {
  const { cribCode: code } = await createNamedShelf(crib)
  await signIn(page, 'cribManager')
  await page.goto('/locations')
  await page
    .getByRole('button', { name: `Add to ${code}` })
    .first()
    .click()
  await dialog(page).getByLabel('What').selectOption('bin')
  await dialog(page).getByLabel('Code').fill('A-1')
  await dialog(page).getByLabel('Name').fill('The same again')
  await dialog(page).getByRole('button', { name: 'Add', exact: true }).click()
  await expect(dialog(page)).toContainText(/already|taken|has this code/)
  await expect(dialog(page).getByLabel('Name')).toHaveValue('The same again')
})

test('a bin shows what lies in it, leads to the item, and stays while it holds anything', async ({
  page,
}) => {
  const shelf = await createNamedShelf(crib)
  const itemId = await createCutter(crib)
  await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity: 7 })
  const { code } = (await crib.get(`/api/cutters/${itemId}`)).body
  await signIn(page, 'cribManager')
  await page.goto('/locations')
  const section = page.getByRole('region', { name: new RegExp(`^${shelf.cribCode}`) })
  await section.getByRole('button', { name: 'Bin A-1' }).click()
  await expect(dialog(page).getByRole('row').filter({ hasText: code })).toContainText('7')
  await dialog(page).getByRole('button', { name: 'Archive' }).click()
  await expect(dialog(page).getByRole('alert')).toBeVisible()
  await dialog(page).getByRole('link', { name: code }).click()
  await expect(page).toHaveURL(`/cutters/${itemId}`)
})

test('who only takes tools sees where they lie and is offered no change', async ({ page }) => {
  const { cribCode: code } = await createNamedShelf(crib)
  await signIn(page, 'machinist')
  await page.goto('/locations')
  const section = page.getByRole('region', { name: new RegExp(`^${code}`) })
  await section.getByRole('button', { name: 'Bin A-1' }).click()
  await expect(dialog(page).getByText('Nothing lies in it.')).toBeVisible()
  await expect(dialog(page).getByRole('button', { name: 'Save' })).toHaveCount(0)
  await dialog(page).getByRole('button', { name: 'Close' }).click()
  await expect(page.getByRole('button', { name: /^Add/ })).toHaveCount(0)
})
