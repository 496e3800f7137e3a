import AxeBuilder from '@axe-core/playwright'
import type { Page } from '@playwright/test'
import { uniqueCode } from '../support/api'
import { squareCutter } from '../support/api-stock'
import { chooseMore, expect, signIn, test } from '../support/browser'

const dialog = (page: Page) => page.getByRole('dialog')
const field = (page: Page, name: string) =>
  dialog(page).getByRole('textbox', { name: new RegExp(`^${name}`) })
const gridRows = (page: Page) => page.locator('.ag-grid-scrolling-container .ag-row')

/** A cutter of the test's own, by the API. */
async function makeCutter(page: Page, change: Record<string, unknown> = {}) {
  const answer = await page.request.post('/api/cutters', { data: squareCutter(change) })
  expect(answer.status()).toBe(201)
  return (await answer.json()) as { id: string; code: string; version: number }
}

test.beforeEach(async ({ page }) => {
  await signIn(page, 'cribManager')
})

test('a slash searches, one letter wrong is forgiven, Down and Enter open the row', async ({ page }) => {
  const word = uniqueCode('wolfram').replace(/[^a-z]/gi, '')
  const wrong = `${word.slice(0, 3)}${word[4]}${word[3]}${word.slice(5)}`
  const cutter = await makeCutter(page, { description: `Made of ${word}` })
  await page.goto('/cutters')
  await expect(gridRows(page).first()).toBeVisible()
  await page.keyboard.press('/')
  await page.keyboard.type(wrong)
  await expect(page.getByText('1 found')).toBeVisible()
  await page.keyboard.press('ArrowDown')
  await page.keyboard.press('Enter')
  await expect(page).toHaveURL(`/cutters/${cutter.id}`)
})

test('the address holds search, filters, sorting and columns, and gives them back', async ({ page }) => {
  const mark = uniqueCode('VIEW')
  for (const diameter of [4, 10, 8])
    await makeCutter(page, { maker: mark, cuttingDiameterMm: diameter, shankDiameterMm: 10 })
  const view = `maker=${mark}&cuttingDiameterMm.min=5&sort=-cuttingDiameterMm&columns=code,cuttingDiameterMm`
  await page.goto(`/cutters?${view}`)
  await expect(page.getByText('2 found')).toBeVisible()
  await expect(page.getByRole('columnheader')).toHaveCount(2)
  await expect(gridRows(page).locator('[col-id="cuttingDiameterMm"]')).toHaveText(['10', '8'])
  await page.getByRole('columnheader', { name: /Cutting diameter/ }).click()
  await expect(page).toHaveURL(new RegExp(`maker=${mark}.*columns=code,cuttingDiameterMm`))
  await expect(page).not.toHaveURL(/sort=/)
  await page.getByRole('button', { name: 'Clear all' }).click()
  await expect(page).not.toHaveURL(/maker=/)
})

test('nothing found, and a server that fails, each say so and what to do', async ({ page }) => {
  await page.goto(`/cutters?q=${uniqueCode('nowhere')}`)
  await expect(page.getByText(/^No cutter matches/)).toBeVisible()
  await page.getByRole('button', { name: 'Clear the search and filters' }).click()
  await expect(gridRows(page).first()).toBeVisible()
  await page.route('**/api/cutters?**', (route) => route.abort())
  await page.reload()
  await expect(page.getByText(/^The cutters could not be loaded/)).toBeVisible()
  await page.unroute('**/api/cutters?**')
  await page.getByRole('button', { name: 'Try again' }).click()
  await expect(gridRows(page).first()).toBeVisible()
})

test('a cutter is added as people write dimensions, and each fault stands at its field', async ({ page }) => {
  const code = uniqueCode('ADD')
  await page.goto('/cutters')
  await page.getByRole('button', { name: /^Add/ }).click()
  await field(page, 'Code').fill(code)
  await field(page, 'Cutting diameter').fill('1/8')
  await field(page, 'Length of cut').fill('half')
  await field(page, 'Shank diameter').fill('0.125"')
  await field(page, 'Overall length').fill('1.5 in')
  await dialog(page).getByRole('button', { name: 'Add the cutter' }).click()
  await expect(field(page, 'Length of cut')).toHaveAccessibleDescription(/is not a length/)
  await field(page, 'Length of cut').fill('500 thou')
  await dialog(page).getByRole('button', { name: 'Add the cutter' }).click()
  await expect(page.getByRole('heading', { name: code })).toBeVisible()
  await expect(page.getByRole('row', { name: 'APMX Length of cut 12.7 mm' })).toBeVisible()
  await expect(
    page.getByRole('img', { name: /square end mill, cutting diameter 3\.175 mm, length of cut 12\.7 mm/ }),
  ).toBeVisible()
})

test('a stale edit is refused, shown side by side, and can be kept', async ({ page }) => {
  const cutter = await makeCutter(page, { maker: 'Before' })
  await page.goto(`/cutters/${cutter.id}`)
  await page.getByRole('button', { name: 'Edit' }).click()
  await field(page, 'Overall length').fill('63')
  const change = { version: cutter.version, maker: 'Meanwhile', overallLengthMm: 60 }
  expect((await page.request.patch(`/api/cutters/${cutter.id}`, { data: change })).status()).toBe(200)
  await dialog(page).getByRole('button', { name: 'Save the changes' }).click()
  const notice = dialog(page).getByRole('status').filter({ hasText: 'Nothing of yours was saved' })
  await expect(notice.getByRole('row', { name: 'Overall length 57 60 63' })).toBeVisible()
  await expect(notice.getByRole('row', { name: 'Maker Before Meanwhile not changed' })).toBeVisible()
  await notice.getByRole('button', { name: 'Keep mine and save again' }).click()
  await expect(dialog(page)).toHaveCount(0)
  const saved = await (await page.request.get(`/api/cutters/${cutter.id}`)).json()
  expect(saved).toMatchObject({ maker: 'Meanwhile', overallLengthMm: 63 })
})

test('leaving with unsaved changes asks first', async ({ page }) => {
  const cutter = await makeCutter(page)
  await page.goto(`/cutters/${cutter.id}`)
  await page.getByRole('button', { name: 'Edit' }).click()
  await field(page, 'Description').fill('Not saved')
  await page.keyboard.press('Escape')
  await page.getByRole('button', { name: 'Go on editing' }).click()
  await expect(field(page, 'Description')).toHaveValue('Not saved')
  await page.keyboard.press('Escape')
  await page.getByRole('button', { name: 'Leave without saving' }).click()
  await expect(dialog(page)).toHaveCount(0)
})

test('a holder is built of segments, drawn while they are typed', async ({ page }) => {
  await page.goto('/holders')
  await page.getByRole('button', { name: /^Add/ }).click()
  await field(page, 'Length').fill('18')
  await field(page, '⌀ nose end').fill('28')
  await field(page, '⌀ spindle end').fill('28')
  await expect(
    dialog(page).getByRole('img', { name: /nut 18 mm long, diameter 28 mm to 28 mm/ }),
  ).toBeVisible()
  await dialog(page).getByRole('button', { name: 'Add a segment' }).click()
  await dialog(page).getByRole('button', { name: 'Remove segment 1' }).click()
  await expect(dialog(page).getByRole('combobox', { name: 'Part' })).toHaveCount(1)
})

test('who may not keep the crib is offered no change, and no cost', async ({ page }) => {
  const cutter = await makeCutter(page, { unitCost: 4321 })
  await signIn(page, 'machinist')
  await page.goto(`/cutters/${cutter.id}`)
  await expect(page.getByRole('button', { name: 'Issue' })).toBeVisible()
  await expect(page.getByRole('term').filter({ hasText: 'On hand' })).toBeVisible()
  await expect(page.getByRole('button', { name: 'Edit' })).toHaveCount(0)
  await expect(page.getByText('43.21')).toHaveCount(0)
})

test('list, page and form pass the accessibility rules', async ({ page }) => {
  const cutter = await makeCutter(page)
  await page.goto('/cutters')
  await expect(gridRows(page).first()).toBeVisible()
  expect((await new AxeBuilder({ page }).analyze()).violations.map((violation) => violation.id)).toEqual([])
  await page.goto(`/cutters/${cutter.id}`)
  await expect(page.getByText('Nothing has moved yet.')).toBeVisible()
  await page.getByRole('button', { name: 'Edit' }).click()
  await expect(field(page, 'Code')).toBeVisible()
  expect((await new AxeBuilder({ page }).analyze()).violations.map((violation) => violation.id)).toEqual([])
})

test('each filter says how many rows its choices leave, and the address keeps what is chosen', async ({
  page,
}) => {
  const mark = uniqueCode('COUNT')
  for (const form of ['square', 'square', 'ball']) await makeCutter(page, { maker: mark, form })
  await page.goto(`/cutters?maker=${mark}`)
  const form = page.getByLabel('Form')
  await form.hover()
  await expect(form.getByRole('option', { name: 'Square end mill (2)' })).toBeAttached()
  await expect(form.getByRole('option', { name: 'Drill (0)' })).toBeAttached()
  await form.selectOption({ label: 'Ball end mill (1)' })
  await expect(page.getByText('1 found')).toBeVisible()
  const stock = page.getByLabel('Stock', { exact: true })
  await stock.focus()
  await expect(stock.getByRole('option', { name: 'Out (1)' })).toBeAttached()
  await page.getByRole('button', { name: 'More filters' }).click()
  await page.getByLabel('Length of cut from').fill('13')
  await expect(page).toHaveURL(/form=ball.*lengthOfCutMm\.min=13/)
  await page.reload()
  await expect(page.getByText('0 found')).toBeVisible()
  await expect(page.getByLabel('Length of cut from')).toHaveValue('13')
})

test('a view is saved, renamed, shared and opened, without the column that is gone', async ({ page }) => {
  const name = uniqueCode('My view')
  await page.goto('/cutters?form=drill&sort=-cuttingDiameterMm&columns=code,cuttingDiameterMm')
  await chooseMore(page, 'Views')
  await dialog(page)
    .getByRole('textbox', { name: /^Save the list/ })
    .fill(name)
  await dialog(page).getByRole('button', { name: 'Save the view' }).click()
  await expect(dialog(page)).toHaveCount(0)
  await expect(page.getByText(`“${name}” is saved.`)).toBeVisible()
  await expect(page.getByRole('main').getByText(name, { exact: true })).toBeVisible()
  await chooseMore(page, 'Views')
  await dialog(page)
    .getByRole('button', { name: `Rename ${name}` })
    .click()
  await dialog(page)
    .getByRole('textbox', { name: /^New name/ })
    .fill(`${name} B`)
  await dialog(page).getByRole('button', { name: 'Rename', exact: true }).click()
  await dialog(page)
    .getByRole('button', { name: `Share ${name} B` })
    .click()
  await expect(dialog(page).getByText('yours, shared')).toBeVisible()
  await page.goto('/cutters')
  const data = { kind: 'cutter', name: `${name} C`, isShared: false, query: 'form=tap&columns=code,finish' }
  expect((await page.request.post('/api/saved-views', { data })).status()).toBe(201)
  await chooseMore(page, 'Views')
  await dialog(page)
    .getByRole('button', { name: `${name} B`, exact: true })
    .click()
  await expect(page).toHaveURL('/cutters?form=drill&sort=-cuttingDiameterMm&columns=code,cuttingDiameterMm')
  await chooseMore(page, 'Views')
  await dialog(page)
    .getByRole('button', { name: `${name} C`, exact: true })
    .click()
  await expect(page.getByText('is open without the column “finish”')).toBeVisible()
  await expect(page).toHaveURL('/cutters?form=tap&columns=code')
})
