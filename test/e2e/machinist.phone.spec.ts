import type { Knex } from 'knex'
import { type ApiClient, signedInAs } from '../support/api'
import { siteDatabase } from '../support/api-stock'
import { expect, sidewaysOverrunPx, signIn, test } from '../support/browser'
import { createNeckedTool, misspelt } from '../support/shop-rows'

let db: Knex
let crib: ApiClient

test.beforeAll(async () => {
  db = siteDatabase()
  crib = await signedInAs('cribManager')
})
test.afterAll(() => db.destroy())

test('at the machine: find it, see the drawer, check the reach, step the stick-out, take one', async ({
  page,
}) => {
  const rows = await createNeckedTool(db, crib)
  const me = await signIn(page, 'machinist')
  await page.goto('/cutters')
  await page.getByRole('searchbox').fill(misspelt(rows.word))
  const link = page.getByRole('link', { name: new RegExp(rows.cutterCode) })
  await expect(link).toContainText('A-1')
  await expect(page.getByText('1 cutter', { exact: true })).toBeVisible()
  await link.tap()
  await expect(page.getByRole('row', { name: /^A-1 .* New 5$/ })).toBeVisible()
  expect(await sidewaysOverrunPx(page)).toBe(0)

  await page.getByRole('link', { name: 'Check reach' }).tap()
  for (const [section, code] of [
    ['Holder', rows.holderCode],
    ['Collet', rows.colletCode],
  ] as const) {
    const region = page.getByRole('region', { name: section, exact: true })
    await region.getByRole('combobox', { name: 'Pick from the crib' }).fill(code)
    await region.getByRole('option', { name: new RegExp(code) }).tap()
    await expect(region.getByRole('link', { name: code })).toBeVisible()
  }
  await page.getByRole('textbox', { name: /^Depth/ }).fill('25')
  const verdict = page.getByTestId('verdict')
  await expect(verdict).toContainText('Reaches 25 mm at 39.5 mm stick-out')
  await page.getByRole('button', { name: /^Stick-out longer/ }).tap()
  await expect(verdict).toContainText('at 40 mm stick-out')
  expect(await sidewaysOverrunPx(page)).toBe(0)

  await page.goto(`/cutters/${rows.cutterId}`)
  await page.getByRole('button', { name: 'Issue' }).tap()
  await page.getByRole('dialog').getByRole('button', { name: 'Issue' }).tap()
  await expect(page.getByRole('row', { name: new RegExp(`^${me.name} New 1$`) })).toBeVisible()
})
