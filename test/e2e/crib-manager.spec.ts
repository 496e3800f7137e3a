import type { Page } from '@playwright/test'
import { signedInAs, uniqueCode } from '../support/api'
import { createCutter } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'
import { exampleFile } from '../support/example-files'
import { createNamedShelf } from '../support/shop-rows'

/** What the worker brings about, on a machine that is busy with other tests. */
const byWorker = { timeout: 30_000 }

const dialog = (page: Page) => page.getByRole('dialog')
const field = (page: Page, name: string) => dialog(page).getByLabel(name).first()

test.beforeEach(async ({ page }) => {
  await signIn(page, 'cribManager')
})
test.afterEach(async ({ page }) => {
  await page.request.patch('/api/me', { data: { lengthUnit: null } })
})

async function upload(page: Page, kind: string, name: string, buffer: Buffer): Promise<void> {
  await page.goto('/imports/new')
  await page.getByRole('radio', { name: kind }).check()
  if (kind !== 'Opening stock') await page.getByLabel('Bare numbers are in').selectOption('in')
  await page.getByLabel('Choose a CSV file').setInputFiles({ name, mimeType: 'text/csv', buffer })
  await page.getByRole('button', { name: 'Upload and check' }).click()
}

test('a drill is added in fractions and by its number, and what cannot be is refused beside its field', async ({
  page,
}) => {
  const code = uniqueCode('DRILL')
  await page.request.patch('/api/me', { data: { lengthUnit: 'in' } })
  await page.goto('/cutters')
  await page.getByRole('button', { name: 'Add a cutter' }).click()
  await field(page, 'Code').fill(code)
  await field(page, 'Form').selectOption('drill')
  await field(page, 'Cutting diameter').fill('#7')
  await field(page, 'Point angle').fill('118')
  await field(page, 'Length of cut').fill('4 7/16')
  await field(page, 'Shank diameter').fill('#7')
  await field(page, 'Overall length').fill('3 3/4')
  await dialog(page).getByRole('button', { name: 'Add the cutter' }).click()
  await expect(dialog(page).locator('[aria-invalid="true"]').first()).toHaveAccessibleDescription(/.{10}/)
  expect((await (await page.request.get(`/api/cutters?q=${code}`)).json()).total).toBe(0)
  await field(page, 'Length of cut').fill('2 7/16')
  await dialog(page).getByRole('button', { name: 'Add the cutter' }).click()
  await expect(page.getByRole('heading', { name: code })).toBeVisible()
  const { rows } = await (await page.request.get(`/api/cutters?q=${code}`)).json()
  // A number 7 drill is 0.2010 in (ASME B94.11M); the rest is arithmetic: 2 7/16 in, 3 3/4 in.
  expect(rows).toMatchObject([
    {
      code,
      cuttingDiameterMm: 5.1054,
      lengthOfCutMm: 61.9125,
      shankDiameterMm: 5.1054,
      overallLengthMm: 95.25,
    },
  ])
})

test('of two browsers that edit one cutter the second is shown what the first saved, and may take it', async ({
  page,
  elsewhere,
}) => {
  const id = await createCutter(await signedInAs('cribManager'), { maker: 'Before' })
  await signIn(elsewhere, 'cribManager')
  for (const each of [page, elsewhere]) {
    await each.goto(`/cutters/${id}`)
    await each.getByRole('button', { name: 'Edit' }).click()
  }
  await field(elsewhere, 'Maker').fill('Theirs')
  await dialog(elsewhere).getByRole('button', { name: 'Save the changes' }).click()
  await expect(dialog(elsewhere)).toHaveCount(0)
  await field(page, 'Maker').fill('Mine')
  await dialog(page).getByRole('button', { name: 'Save the changes' }).click()
  const notice = dialog(page).getByRole('status').filter({ hasText: 'Nothing of yours was saved' })
  await expect(notice.getByRole('row', { name: 'Maker Before Theirs Mine' })).toBeVisible()
  await notice.getByRole('button', { name: 'Take theirs' }).click()
  await expect(field(page, 'Maker')).toHaveValue('Theirs')
  await dialog(page).getByRole('button', { name: 'Cancel' }).click()
  await expect(dialog(page)).toHaveCount(0)
  expect((await (await page.request.get(`/api/cutters/${id}`)).json()).maker).toBe('Theirs')
})

test('a messy list goes in: a heading said once, one row rejected with its reason, cancelled, then committed with its stock', async ({
  page,
}) => {
  test.slow()
  const mark = uniqueCode('IMP')
  const heading = uniqueCode('Size')
  const { content, toBuffer } = exampleFile('cutters-inch.csv', mark)
  // The shop's own heading for the diameter, and an overall length nobody can read.
  const list = content
    .replace('Dia (in)', heading)
    .replace('Price ($)', 'Price')
    .replace(';3/8;2 1/2;', ';3/8;long;')

  async function checkColumns(): Promise<void> {
    await upload(page, 'Cutters', 'tools.csv', toBuffer(list))
    await expect(page.getByText('Nothing can be taken: 22 rejected.')).toBeVisible(byWorker)
    await page.getByRole('tab', { name: /^Columns/ }).click()
    await page.getByLabel(heading, { exact: true }).selectOption('cuttingDiameterMm')
    await page.getByRole('button', { name: 'Check again' }).click()
    await expect(page.getByText('This file would add 21; 1 is rejected.')).toBeVisible(byWorker)
  }

  await checkColumns()
  await page.getByRole('tab', { name: /^Rejected/ }).click()
  await expect(page.getByRole('row').filter({ hasText: 'long' }).getByRole('cell')).toHaveText([
    /6/,
    'OAL',
    'long',
    /is not a length/,
  ])
  await page.getByRole('button', { name: 'Cancel the import' }).click()
  await dialog(page).getByRole('button', { name: 'Cancel the import' }).click()
  await expect(page.getByText('Cancelled. Nothing was changed.')).toBeVisible()
  await page.goto(`/cutters?maker=${mark}`)
  await expect(page.getByText('No cutter passes these filters.')).toBeVisible()

  await checkColumns()
  await page.getByLabel('Leave out the 1 rejected').check()
  await page.getByRole('button', { name: 'Bring in 21' }).click()
  await expect(page.getByText('Committed: 21 added, 1 rejected.')).toBeVisible(byWorker)
  await page.goto(`/cutters?maker=${mark}&sort=code`)
  await expect(page.getByText('21 found')).toBeVisible()
  await expect(page.getByRole('link', { name: `${mark}-0101` })).toBeVisible()

  const { cribCode } = await createNamedShelf(await signedInAs('cribManager'))
  const stock = `Crib,Bin,Tool #,Qty on hand,Condition\n${cribCode},A-1,${mark}-0101,12,new\n${cribCode},Z-9,${mark}-0102,1,new\n`
  await upload(page, 'Opening stock', 'stock.csv', Buffer.from(stock))
  await expect(page.getByRole('row').filter({ hasText: 'Z-9' })).toBeVisible(byWorker)
  await page.getByLabel('Leave out the 1 rejected').check()
  await page.getByRole('button', { name: 'Bring in 1' }).click()
  await expect(page.getByText('Committed: 1 added, 1 rejected.')).toBeVisible(byWorker)

  await page.goto(`/cutters?maker=${mark}&sort=code`)
  await page.getByRole('link', { name: `${mark}-0101` }).click()
  await expect(page.getByRole('row', { name: /^A-1 .* New 12$/ })).toBeVisible()
  await page.getByRole('button', { name: 'Archive' }).click()
  await dialog(page).getByRole('button', { name: 'Archive it' }).click()
  await expect(dialog(page).getByRole('alert').filter({ hasText: 'pieces of this item' })).toBeVisible()
})

test('what nobody has in stock is archived, leaves the list, and is brought back', async ({ page }) => {
  const mark = uniqueCode('OLD')
  const id = await createCutter(await signedInAs('cribManager'), { maker: mark })
  await page.goto(`/cutters/${id}`)
  await page.getByRole('button', { name: 'Archive' }).click()
  await dialog(page).getByRole('button', { name: 'Archive it' }).click()
  await expect(page.getByText('This item is archived')).toBeVisible()
  await page.goto(`/cutters?maker=${mark}`)
  await expect(page.getByText('No cutter passes these filters.')).toBeVisible()
  await page.goto(`/cutters/${id}`)
  await page.getByRole('button', { name: 'Bring it back' }).click()
  await expect(page.getByText('This item is archived')).toHaveCount(0)
  await page.goto(`/cutters?maker=${mark}`)
  await expect(page.getByText('1 found')).toBeVisible()
})
