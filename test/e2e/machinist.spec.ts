import type { Page } from '@playwright/test'
import type { Knex } from 'knex'
import { type ApiClient, signedInAs } from '../support/api'
import { siteDatabase } from '../support/api-stock'
import { expect, personOf, signIn, test } from '../support/browser'
import { createNeckedTool, misspelt, type NeckedToolRows } from '../support/shop-rows'

let db: Knex
let crib: ApiClient
let rows: NeckedToolRows

test.beforeAll(async () => {
  db = siteDatabase()
  crib = await signedInAs('cribManager')
})
test.afterAll(() => db.destroy())
test.beforeEach(async () => {
  rows = await createNeckedTool(db, crib)
})

const verdict = (page: Page) => page.getByTestId('verdict')
const row = (page: Page, name: RegExp) => page.getByRole('row', { name })

async function pick(page: Page, section: string, code: string): Promise<void> {
  const region = page.getByRole('region', { name: section, exact: true })
  await region.getByRole('combobox', { name: 'Pick from the crib' }).fill(code)
  await expect(region.getByRole('listbox').getByRole('option')).toHaveCount(1)
  await region.getByRole('combobox', { name: 'Pick from the crib' }).press('Enter')
  await expect(region.getByRole('link', { name: code })).toBeVisible()
}

test('from the door to the drawer: find a cutter, see where it lies, learn that it reaches, take one and bring it back', async ({
  page,
}) => {
  const me = await personOf('machinist')
  await page.goto('/')
  await page.getByLabel('E-mail address').fill(me.email)
  await page.getByLabel('Password').fill(me.password)
  await page.getByLabel('Password').press('Enter')
  await expect(page).toHaveURL('/reach')

  await page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: 'Cutters' }).click()
  await page.getByRole('searchbox').fill(misspelt(rows.word))
  await expect(page.getByText('1 found')).toBeVisible()
  const found = page.locator(`[row-id="${rows.cutterId}"]`)
  await expect(found.locator('[col-id="onHand"]')).toHaveText('5')
  await expect(found.locator('[col-id="locations"]')).toHaveText('A-1')
  await page.getByRole('link', { name: rows.cutterCode }).click()
  await expect(row(page, /^A-1 .* New 5$/)).toBeVisible()

  await page.getByRole('link', { name: 'Check reach' }).click()
  await expect(page).toHaveURL(new RegExp(`/reach\\?cutter=${rows.cutterId}`))
  await pick(page, 'Holder', rows.holderCode)
  await pick(page, 'Collet', rows.colletCode)
  await page.getByRole('textbox', { name: /^Depth/ }).fill('25')
  await expect(verdict(page)).toHaveText(
    'Reaches 25 mm at 39.5 mm stick-out. The transition touches next, at 38.16 mm.',
  )
  const stickOut = page.getByRole('slider', { name: 'Stick-out', exact: true })
  await stickOut.press('ArrowUp')
  await expect(verdict(page)).toContainText('Reaches 25 mm at 40 mm stick-out')
  await stickOut.press('ArrowDown')
  await stickOut.press('ArrowDown')
  await expect(stickOut).toHaveAttribute('aria-valuetext', '39 mm')
  await expect(verdict(page)).not.toContainText('Reaches 25 mm')

  await page.getByRole('link', { name: rows.cutterCode }).click()
  await page.getByRole('button', { name: 'Issue' }).click()
  const dialog = page.getByRole('dialog')
  await expect(dialog.getByLabel('To')).toContainText(`My hands (${me.name})`)
  await dialog.getByRole('button', { name: 'Issue' }).click()
  await expect(dialog).toHaveCount(0)
  await expect(row(page, /^A-1 .* New 4$/)).toBeVisible()
  await expect(row(page, new RegExp(`^${me.name} New 1$`))).toBeVisible()

  await page.getByRole('button', { name: 'Return' }).click()
  await dialog.getByLabel('Condition it comes back in').selectOption('new')
  await dialog.getByRole('button', { name: 'Return' }).click()
  await expect(row(page, /^A-1 .* New 5$/)).toBeVisible()
  await row(page, /Return 1/)
    .getByRole('button', { name: 'Reverse' })
    .click()
  await page.getByRole('button', { name: 'Reverse it' }).click()
  await expect(row(page, /Return 1 reversed/)).toBeVisible()
  await expect(row(page, new RegExp(`^${me.name} New 1$`))).toBeVisible()
})

test('another’s issue cannot be reversed, and what is not there cannot be issued', async ({ page }) => {
  const stock = (await crib.get(`/api/items/${rows.cutterId}/stock`)).body
  const [from] = stock.balances as { locationId: string }[]
  const issued = await crib.post(
    '/api/movements',
    {
      kind: 'issue',
      itemId: rows.cutterId,
      quantity: 5,
      fromLocationId: from?.locationId,
      fromCondition: 'new',
      toLocationId: crib.user.locationId,
      toCondition: 'new',
    },
    rows.cutterCode,
  )
  expect(issued.status).toBe(201)
  await signIn(page, 'machinist')
  await page.goto(`/cutters/${rows.cutterId}`)
  await expect(row(page, /Issue 5/)).toBeVisible()
  await expect(page.getByRole('button', { name: 'Reverse' })).toHaveCount(0)
  await page.getByRole('button', { name: 'Issue' }).click()
  await expect(page.getByText('No bin has a piece of it: there is nothing to issue.')).toBeVisible()
})
