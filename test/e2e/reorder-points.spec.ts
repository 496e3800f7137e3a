import type { Page } from '@playwright/test'
import { expectAccessible } from '../support/accessibility'
import { type ApiClient, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'
import { chooseMore, expect, signIn, test } from '../support/browser'

let crib: ApiClient
let shelf: Shelf
let codes: string[]
let itemIds: string[]

test.beforeEach(async () => {
  crib = await signedInAs('cribManager')
  shelf = await createShelf(crib)
  const mark = uniqueCode('RP')
  codes = ['a', 'b', 'c'].map((suffix) => `${mark}-${suffix}`)
  itemIds = []
  for (const code of codes) itemIds.push(await createCutter(crib, { code }))
  const rows = itemIds.map((itemId, at) => ({
    ...{ itemId, cribId: shelf.cribId },
    ...{ reorderPoint: 3 - at, orderUpTo: 10 + at },
  }))
  expect((await crib.send('PUT', '/api/reorder-points', { body: { rows } })).status).toBe(200)
})

const cell = (page: Page, row: number, column: string) =>
  page.locator(`[row-index="${row}"] [col-id="${column}"]`)

async function type(page: Page, text: string) {
  await page.keyboard.press('ControlOrMeta+A')
  await page.keyboard.type(text)
  await page.keyboard.press('Enter')
}

async function edit(page: Page, row: number, column: string, text: string) {
  await cell(page, row, column).dblclick()
  await type(page, text)
}

const listed = async () =>
  (await crib.get(`/api/reorder-points?cribId=${shelf.cribId}`)).body.rows.map(
    ({ reorderPoint, orderUpTo }) => [reorderPoint, orderUpTo],
  )

test('the list is sorted and narrowed in the address, and the choices say how many they leave', async ({
  page,
}) => {
  await signIn(page, 'cribManager')
  await page.goto('/reorder-points')
  await page.getByRole('combobox', { name: 'Crib' }).selectOption(shelf.cribId)
  await expect(page.getByText('3 found')).toBeVisible()
  await expect(
    page.getByRole('combobox', { name: 'Stock' }).getByRole('option', { name: 'Low (3)' }),
  ).toHaveCount(1)
  await page.getByRole('columnheader', { name: 'Reorder point' }).click()
  await expect(cell(page, 0, 'itemCode')).toHaveText(codes[2] ?? '')
  await page.getByRole('searchbox').fill(codes[1] ?? '')
  await expect(page.getByText('1 found')).toBeVisible()
  const { searchParams } = new URL(page.url())
  expect(Object.fromEntries(searchParams)).toEqual({
    ...{ q: codes[1], cribId: shelf.cribId, sort: 'reorderPoint' },
  })
  await page.reload()
  await expect(cell(page, 0, 'itemCode')).toHaveText(codes[1] ?? '')
  await page.getByRole('button', { name: 'Clear all' }).click()
  expect(new URL(page.url()).search).toBe('')
})

test('edits are taken back one by one, the last one first', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  await edit(page, 0, 'orderUpTo', '20')
  await expect(cell(page, 0, 'orderUpTo')).toHaveText('20')
  await edit(page, 1, 'orderUpTo', '30')
  await expect(cell(page, 1, 'orderUpTo')).toHaveText('30')
  await page.getByRole('button', { name: `Undo: Order up to of ${codes[1]}` }).click()
  await expect(cell(page, 1, 'orderUpTo')).toHaveText('11')
  await page.keyboard.press('ControlOrMeta+Z')
  await expect(cell(page, 0, 'orderUpTo')).toHaveText('10')
  await expect(page.getByRole('button', { name: 'Undo', exact: true })).toBeDisabled()
})

test('many are changed at once or none, and taken back at once', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  for (const row of [0, 1, 2]) await page.locator(`[row-index="${row}"] input[type="checkbox"]`).check()
  const change = async (text: string) => {
    await page.getByRole('dialog').getByLabel('New value').fill(text)
    await page.getByRole('button', { name: 'Change them all' }).click()
  }
  await page.getByRole('button', { name: 'Change 3 selected' }).click()
  await change('1.5')
  await expect(page.getByRole('dialog').getByText('“1.5” is not a whole number.')).toBeVisible()
  await change('11')
  const refused = page.getByRole('dialog').getByRole('alert')
  await expect(refused).toContainText(`${codes[0]} in`)
  await expect(refused).toContainText('The reorder point is above the order-up-to level.')
  await expectAccessible(page, 'many reorder points, refused')
  expect(await listed()).toEqual([
    [3, 10],
    [2, 11],
    [1, 12],
  ])
  await change('5')
  await expect(page.getByRole('dialog')).toHaveCount(0)
  for (const row of [0, 1, 2]) await expect(cell(page, row, 'reorderPoint')).toHaveText('5')
  await page.getByRole('button', { name: 'Undo: Reorder point of 3 rows' }).click()
  for (const row of [0, 1, 2]) await expect(cell(page, row, 'reorderPoint')).toHaveText(String(3 - row))
})

test('an order-up-to level that is the point itself is kept, with a word of caution at it', async ({
  page,
}) => {
  await signIn(page, 'cribManager')
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  await edit(page, 0, 'orderUpTo', '3')
  await expect(cell(page, 0, 'orderUpTo')).toHaveText('3, the point itself')
  await expect(page.getByRole('status').filter({ hasText: 'its alert stays open' })).toContainText(
    codes[0] ?? '',
  )
  await expectAccessible(page, 'reorder points, a caution')
  await edit(page, 0, 'orderUpTo', '9')
  await expect(cell(page, 0, 'orderUpTo')).toHaveText('9')
  await expect(page.getByText('its alert stays open')).toHaveCount(0)
})

test('of two who edit one row the second is told, sees what is there, and loses nothing', async ({
  page,
}) => {
  await signIn(page, 'cribManager')
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  await expect(cell(page, 0, 'orderUpTo')).toHaveText('10')
  await crib.send('PUT', `/api/reorder-points/${itemIds[0]}/${shelf.cribId}`, {
    body: { reorderPoint: 4, orderUpTo: 40 },
  })
  await edit(page, 0, 'orderUpTo', '20')
  const notice = page.getByRole('alert').filter({ hasText: codes[0] ?? '' })
  await expect(notice).toContainText('was not changed to “20”. Someone else changed this row meanwhile')
  await expect(cell(page, 0, 'reorderPoint')).toHaveText('4')
  await expectAccessible(page, 'reorder points, a stale edit')
  await notice.getByRole('button', { name: 'Put mine over it' }).click()
  await expect(cell(page, 0, 'orderUpTo')).toHaveText('20')
  expect((await listed())[0]).toEqual([4, 20])
})

test('a first one is set by the item’s code, and taken away again', async ({ page }) => {
  await signIn(page, 'cribManager')
  const code = uniqueCode('FIRST')
  await createCutter(crib, { code })
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  await page.getByRole('button', { name: 'Add a reorder point' }).click()
  const dialog = page.getByRole('dialog')
  await expect(dialog.getByRole('combobox', { name: 'Crib' })).toHaveValue(shelf.cribId)
  await dialog.getByLabel('Item’s code').fill('nothing-like-it')
  await dialog.getByLabel('Reorder point').fill('6')
  await dialog.getByLabel('Order up to').fill('5')
  const add = dialog.getByRole('button', { name: 'Add the reorder point' })
  await add.click()
  await expect(dialog.getByText('No item in use has this code.')).toBeVisible()
  await dialog.getByLabel('Item’s code').fill(code.toLowerCase())
  await add.click()
  await expect(dialog.getByText('The reorder point is above the order-up-to level.')).toBeVisible()
  await dialog.getByLabel('Order up to').fill('6')
  await expect(dialog.getByText('its alert stays open')).toBeVisible()
  await dialog.getByLabel('Order up to').fill('8')
  await add.click()
  await expect(
    page.getByText(/ has the reorder point 6\. It is low now: 0 available and coming\.$/),
  ).toBeVisible()
  await expect(page.getByRole('searchbox')).toHaveValue(code)
  await expect(page.getByText('1 found')).toBeVisible()
  await page.locator('[row-index="0"] input[type="checkbox"]').check()
  await page.getByRole('button', { name: 'Take away' }).click()
  await page.getByRole('button', { name: 'Take it away' }).click()
  await expect(page.getByText(`No reorder point matches “${code}”.`)).toBeVisible()
})

test('a first one is of the crib where the pieces lie, and says beforehand what it would bring', async ({
  page,
}) => {
  await signIn(page, 'cribManager')
  const db = siteDatabase()
  const [stocked, bare] = [uniqueCode('STOCKED'), uniqueCode('BARE')]
  const itemId = await createCutter(crib, { code: stocked })
  await createCutter(crib, { code: bare })
  await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity: 3 })
  await db.destroy()
  await page.goto('/reorder-points')
  await page.getByRole('button', { name: 'Add a reorder point' }).click()
  const dialog = page.getByRole('dialog')
  const inCrib = dialog.getByRole('combobox', { name: 'Crib' })
  await dialog.getByLabel('Item’s code').fill(stocked)
  await expect(inCrib).toHaveValue(shelf.cribId)
  await dialog.getByLabel('Reorder point').fill('2')
  await expect(dialog.getByText(/^3 in .+; not low\.$/)).toBeVisible()
  await dialog.getByLabel('Reorder point').fill('3')
  await expect(dialog.getByText(/^3 in .+; low at once/)).toBeVisible()
  await dialog.getByLabel('Item’s code').fill(bare)
  await expect(inCrib).toHaveValue('')
  await dialog.getByLabel('Order up to').fill('5')
  await dialog.getByRole('button', { name: 'Add the reorder point' }).click()
  await expect(inCrib).toHaveAccessibleDescription(/Choose the crib/)
})

test('the keyboard alone reaches a cell, changes it and leaves it', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  await expect(cell(page, 0, 'itemCode')).toHaveText(codes[0] ?? '')
  await page.keyboard.press('/')
  await expect(page.getByRole('searchbox')).toBeFocused()
  await page.keyboard.press('ArrowDown')
  for (let step = 0; step < 20; step += 1) {
    if (await cell(page, 0, 'reorderPoint').evaluate((element) => element === document.activeElement)) break
    await page.keyboard.press('ArrowRight')
  }
  await page.keyboard.press('F2')
  await type(page, '7')
  await expect(cell(page, 0, 'reorderPoint')).toHaveText('7')
  await page.keyboard.press('ControlOrMeta+Z')
  await expect(cell(page, 0, 'reorderPoint')).toHaveText('3')
})

test('what it exports changes nothing when it is imported again', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  const coming = page.waitForEvent('download')
  await chooseMore(page, 'Export as CSV')
  const path = await (await coming).path()
  await chooseMore(page, 'Import a file')
  await expect(page.getByRole('radio', { name: /^Reorder points/ })).toBeChecked()
  await expect(page.getByLabel('Bare numbers are in')).toHaveCount(0)
  await page.locator('input[type="file"]').setInputFiles(path)
  await page.getByRole('button', { name: 'Upload and check' }).click()
  await expect(page.getByText('Nothing would change: all 3 are there as they are.')).toBeVisible()
})

test('a machinist reads the points and changes none', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  await expect(cell(page, 0, 'itemCode')).toHaveText(codes[0] ?? '')
  for (const name of ['Add a reorder point', 'Change the rows selected', 'Take away'])
    await expect(page.getByRole('button', { name })).toHaveCount(0)
  await page.getByRole('button', { name: 'More', exact: true }).click()
  await expect(page.getByRole('menuitem', { name: 'Export as CSV' })).toBeVisible()
  await expect(page.getByRole('menuitem', { name: /Import|Paste/ })).toHaveCount(0)
  await page.keyboard.press('Escape')
  await cell(page, 0, 'reorderPoint').click()
  await expect(page).toHaveURL(new RegExp(`/cutters/${itemIds[0]}$`))
})

test('the list says that it failed, that it is empty and that nothing was found, and goes on', async ({
  page,
}) => {
  await signIn(page, 'cribManager')
  const calls = /\/api\/reorder-points\?/
  await page.route(calls, (route) => route.abort())
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  await expect(
    page.getByText('The reorder points could not be read. Leadline cannot be reached.'),
  ).toBeVisible()
  await page.unrouteAll()
  await page.getByRole('button', { name: 'Try again' }).click()
  await expect(cell(page, 0, 'itemCode')).toHaveText(codes[0] ?? '')
  await page.goto('/reorder-points?stockState=purple')
  await page.getByRole('button', { name: 'Show the whole list' }).click()
  await expect(page.locator('[row-id]').first()).toBeVisible()
  await page.route(calls, (route) => route.fulfill({ json: { rows: [], nextCursor: null, total: 0 } }))
  await page.reload()
  await expect(page.getByText('No item is watched yet, so nothing is ever called low.')).toBeVisible()
  await expectAccessible(page, 'reorder points, none')
})

test('rows pasted from a spreadsheet go through the checks of an import', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto(`/reorder-points?cribId=${shelf.cribId}`)
  await expect(cell(page, 0, 'itemCode')).toHaveText(codes[0] ?? '')
  await chooseMore(page, 'Paste rows')
  const { rows: cribs } = (await crib.get('/api/cribs')).body
  const crate = cribs.find(({ id }) => id === shelf.cribId)?.code
  const lines = codes.map((code, at) => [code, crate, at === 0 ? '9' : '2', at === 1 ? '1' : '15'].join('\t'))
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('Rows').fill(['Item\tCrib\tMin\tMax', ...lines].join('\n'))
  await expect(dialog.getByText('Bare numbers')).toHaveCount(0)
  await dialog.getByRole('button', { name: 'Check these rows' }).click()
  await expect(page.getByText('This file would change 2; 1 is rejected.')).toBeVisible()
  await expect(page.getByText('The reorder point is above the order-up-to level.')).toBeVisible()
})
