import AxeBuilder from '@axe-core/playwright'
import type { Page } from '@playwright/test'
import { uniqueCode } from '../support/api'
import { squareCutter } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'

const rows = (page: Page) => page.locator('.ag-grid-scrolling-container .ag-row')
const cells = (page: Page, column: string) => rows(page).locator(`[col-id="${column}"]`)

async function makeCutters(page: Page, maker: string, diameters: number[]) {
  const made: { id: string; code: string; version: number }[] = []
  for (const cuttingDiameterMm of diameters) {
    const data = squareCutter({ maker, cuttingDiameterMm, shankDiameterMm: 12 })
    const answer = await page.request.post('/api/cutters', { data })
    expect(answer.status()).toBe(201)
    made.push((await answer.json()) as (typeof made)[number])
  }
  return made
}

async function openList(page: Page, maker: string) {
  await page.goto(`/cutters?maker=${maker}&sort=cuttingDiameterMm&columns=code,cuttingDiameterMm,maker`)
  await expect(rows(page).first()).toBeVisible()
  await page.getByRole('button', { name: 'Edit in the list' }).click()
}

async function type(page: Page, column: string, row: number, text: string) {
  await cells(page, column).nth(row).dblclick()
  await page.keyboard.press('ControlOrMeta+a')
  await page.keyboard.type(text)
  await page.keyboard.press('Enter')
}

test.beforeEach(async ({ page }) => {
  await signIn(page, 'cribManager')
})

test('a cell takes a size as people write it, and Ctrl+Z and the button take edits back', async ({
  page,
}) => {
  const maker = uniqueCode('EDIT')
  const [cutter] = await makeCutters(page, maker, [6, 8])
  await openList(page, maker)
  await type(page, 'cuttingDiameterMm', 0, '1/8')
  await expect(cells(page, 'cuttingDiameterMm').first()).toHaveText('3.175')
  await type(page, 'cuttingDiameterMm', 0, '4')
  await expect(page.getByRole('button', { name: /^Undo: DC of/ })).toBeEnabled()
  await expect(cells(page, 'cuttingDiameterMm').first()).toHaveText('4')
  await page.keyboard.press('ControlOrMeta+z')
  await expect(cells(page, 'cuttingDiameterMm').first()).toHaveText('3.175')
  await page.getByRole('button', { name: /^Undo: DC of/ }).click()
  await expect(cells(page, 'cuttingDiameterMm').first()).toHaveText('6')
  const now = await (await page.request.get(`/api/cutters/${cutter?.id}`)).json()
  expect(now).toMatchObject({ cuttingDiameterMm: 6, version: 5 })
})

test('what cannot be stays at its cell with the reason until it is mended or left', async ({ page }) => {
  const maker = uniqueCode('EDIT')
  await makeCutters(page, maker, [6])
  await openList(page, maker)
  await type(page, 'cuttingDiameterMm', 0, 'half')
  await expect(cells(page, 'cuttingDiameterMm').first()).toHaveText('half')
  await expect(page.getByRole('alert').filter({ hasText: 'is not a length' })).toBeVisible()
  const found = await new AxeBuilder({ page }).analyze()
  expect(found.violations.map(({ id }) => id)).toEqual([])
  await page.getByRole('button', { name: 'Correct it' }).click()
  await page.keyboard.press('ControlOrMeta+a')
  await page.keyboard.type('5')
  await page.keyboard.press('Enter')
  await expect(cells(page, 'cuttingDiameterMm').first()).toHaveText('5')
  await expect(page.getByText('was not changed to')).toHaveCount(0)
})

test('Undo clears what was not taken before it touches an edit, and no row moves for it', async ({
  page,
}) => {
  const maker = uniqueCode('EDIT')
  await makeCutters(page, maker, [6, 8])
  await openList(page, maker)
  await type(page, 'cuttingDiameterMm', 0, '5')
  await expect(page.getByRole('button', { name: /^Undo: DC of/ })).toBeEnabled()
  const before = await rows(page).nth(1).boundingBox()
  await type(page, 'cuttingDiameterMm', 1, 'half')
  await expect(page.getByRole('alert').filter({ hasText: 'is not a length' })).toBeVisible()
  expect(await rows(page).nth(1).boundingBox()).toEqual(before)
  await page.getByRole('button', { name: /^Undo: half typed in / }).click()
  await expect(cells(page, 'cuttingDiameterMm')).toHaveText(['5', '8'])
  await expect(page.getByText('was not changed to')).toHaveCount(0)
  await page.getByRole('button', { name: /^Undo: DC of/ }).click()
  await expect(cells(page, 'cuttingDiameterMm')).toHaveText(['6', '8'])
  await page.getByRole('button', { name: 'Redo' }).click()
  await expect(cells(page, 'cuttingDiameterMm')).toHaveText(['5', '8'])
  await expect(page.getByRole('button', { name: /^Undo: DC of/ })).toBeEnabled()
})

test('editing is not done while a value is not taken, unless it is let go', async ({ page }) => {
  const maker = uniqueCode('EDIT')
  await makeCutters(page, maker, [6])
  await openList(page, maker)
  await type(page, 'cuttingDiameterMm', 0, 'half')
  await page.getByRole('button', { name: 'Done editing' }).click()
  await expect(page.getByRole('alert').filter({ hasText: 'editing is not done' })).toBeVisible()
  await expect(cells(page, 'cuttingDiameterMm').first()).toHaveText('half')
  await page.getByRole('button', { name: 'Drop it and finish' }).click()
  await expect(page.getByRole('button', { name: 'Done editing' })).toHaveCount(0)
  await expect(cells(page, 'cuttingDiameterMm').first()).toHaveText('6')
})

test('an edit of a row someone else changed says so, and goes over theirs only when asked', async ({
  page,
}) => {
  const maker = uniqueCode('EDIT')
  const [cutter] = await makeCutters(page, maker, [6])
  await openList(page, maker)
  const theirs = await page.request.patch(`/api/cutters/${cutter?.id}`, {
    data: { version: 1, cuttingDiameterMm: 7 },
  })
  expect(theirs.status()).toBe(200)
  await type(page, 'cuttingDiameterMm', 0, '5')
  await expect(page.getByText('changed this row meanwhile')).toBeVisible()
  await expect(cells(page, 'cuttingDiameterMm').first()).toHaveText('5')
  await page.getByRole('button', { name: 'Put mine over it' }).click()
  await expect(page.getByText('changed this row meanwhile')).toHaveCount(0)
  const now = await (await page.request.get(`/api/cutters/${cutter?.id}`)).json()
  expect(now).toMatchObject({ cuttingDiameterMm: 5, version: 3 })
})

test('many rows are selected and one field of all is changed, or of none, with each reason', async ({
  page,
}) => {
  const maker = uniqueCode('EDIT')
  const made = await makeCutters(page, maker, [6, 8])
  await openList(page, maker)
  for (const box of await page.getByRole('checkbox', { name: /row/i }).all()) await box.check()
  await page.getByRole('button', { name: 'Change 2 selected' }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('Field').selectOption('lengthOfCutMm')
  await dialog.getByRole('textbox').fill('900')
  await dialog.getByRole('button', { name: 'See what would change' }).click()
  await expect(dialog.getByText('2 of 2 cutters cannot be changed so; nothing was changed.')).toBeVisible()
  for (const { code } of made) await expect(dialog.getByRole('listitem')).toContainText(code)
  await dialog.getByLabel('Field').selectOption('maker')
  await dialog.getByRole('combobox', { name: 'To' }).fill(`${maker}-B`)
  await dialog.getByRole('button', { name: 'See what would change' }).click()
  await expect(dialog.getByText('2 cutters selected: 2 would change.')).toBeVisible()
  await expect(cells(page, 'maker')).toHaveText([maker, maker])
  await dialog.getByRole('button', { name: 'Change 2 cutters' }).click()
  await expect(dialog).toHaveCount(0)
  await expect(cells(page, 'maker')).toHaveText([`${maker}-B`, `${maker}-B`])
  await page.getByRole('button', { name: 'Undo: Maker of 2 cutters' }).click()
  await expect(cells(page, 'maker')).toHaveText([maker, maker])
})
