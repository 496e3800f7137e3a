import { uniqueCode } from '../support/api'
import { squareCutter } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'

test('the list is edited, undone, selected from and changed by the keyboard alone', async ({ page }) => {
  await signIn(page, 'cribManager')
  const maker = uniqueCode('KEYED')
  for (const cuttingDiameterMm of [6, 8]) {
    const data = squareCutter({ maker, cuttingDiameterMm, shankDiameterMm: 12 })
    expect((await page.request.post('/api/cutters', { data })).status()).toBe(201)
  }
  await page.goto(`/cutters?maker=${maker}&sort=cuttingDiameterMm&columns=code,cuttingDiameterMm,maker`)
  await expect(page.getByText('2 found')).toBeVisible()
  const cells = (column: string) => page.locator(`.ag-grid-scrolling-container .ag-row [col-id="${column}"]`)

  await page.getByRole('button', { name: 'Edit in the list' }).focus()
  await page.keyboard.press('Enter')
  await expect(page.getByRole('button', { name: 'Done editing' })).toBeVisible()

  await page.keyboard.press('/')
  await page.keyboard.press('ArrowDown')
  for (const key of ['ArrowRight', 'ArrowRight']) await page.keyboard.press(key)
  await page.keyboard.press('F2')
  await page.keyboard.press('ControlOrMeta+a')
  await page.keyboard.type('1/4')
  await page.keyboard.press('Enter')
  await expect(cells('cuttingDiameterMm').first()).toHaveText('6.35')
  await page.keyboard.press('ControlOrMeta+z')
  await expect(cells('cuttingDiameterMm').first()).toHaveText('6')

  await page.keyboard.press('Space')
  await expect(page.getByRole('button', { name: 'Change 1 selected' })).toBeEnabled()
  await page.getByRole('button', { name: 'Change 1 selected' }).focus()
  await page.keyboard.press('Enter')
  const dialog = page.getByRole('dialog')
  await expect(dialog).toBeVisible()
  await dialog.getByRole('combobox', { name: 'To' }).focus()
  await page.keyboard.type(`${maker}-B`)
  await page.keyboard.press('Enter')
  await dialog.getByRole('button', { name: 'Change 1 cutter' }).focus()
  await page.keyboard.press('Enter')
  await expect(dialog).toHaveCount(0)
  await expect(page.getByRole('button', { name: 'Undo: Maker of 1 cutter' })).toBeEnabled()
  await page.keyboard.press('ControlOrMeta+z')
  await expect(cells('maker')).toHaveText([maker, maker])
})
