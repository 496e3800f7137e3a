import type { Page } from '@playwright/test'
import { uniqueCode } from '../support/api'
import { squareCutter } from '../support/api-stock'
import { chooseMore, expect, signIn, test } from '../support/browser'

/** A list of the test's own, 3 cutters from thick to thin, on a page whose printing waits for no hand. */
async function openList(page: Page): Promise<string> {
  await signIn(page, 'cribManager')
  const maker = uniqueCode('PRINT')
  for (const cuttingDiameterMm of [4, 6, 5]) {
    const answer = await page.request.post('/api/cutters', {
      data: squareCutter({ maker, cuttingDiameterMm }),
    })
    expect(answer.status()).toBe(201)
  }
  await page.addInitScript(() => {
    window.print = () => document.documentElement.setAttribute('data-printed', 'yes')
  })
  await page.goto(`/cutters?maker=${maker}&sort=-cuttingDiameterMm&columns=code,cuttingDiameterMm`)
  await expect(page.getByText('3 found')).toBeVisible()
  return maker
}

const sheetOf = (page: Page) => page.getByRole('region', { name: 'Cutters, printed' })
const isPrinted = (page: Page) => expect(page.locator('html')).toHaveAttribute('data-printed', 'yes')

test('the rows of the view are printed with the columns shown and what narrows them, and nothing of the page around', async ({
  page,
}) => {
  const maker = await openList(page)
  await chooseMore(page, 'Print')
  await isPrinted(page)
  await page.emulateMedia({ media: 'print' })
  const sheet = sheetOf(page)
  await expect(sheet.getByRole('columnheader')).toHaveText(['Code', 'DCdiametermm'])
  await expect(sheet.locator('tbody td:nth-child(2)')).toHaveText(['6', '5', '4'])
  await expect(sheet).toContainText('3 rows.')
  await expect(sheet).toContainText(`Maker: ${maker}.`)
  await expect(page.getByRole('banner')).toBeHidden()
  await expect(page.getByRole('button', { name: 'More', exact: true })).toBeHidden()
  await expect(page.locator('.ag-root-wrapper')).toBeHidden()
  await page.evaluate(() => window.dispatchEvent(new Event('afterprint')))
  await expect(sheet).toHaveCount(0)
})

test('Ctrl+P prints the whole list as the menu does', async ({ page }) => {
  await openList(page)
  await page.keyboard.press('ControlOrMeta+p')
  await isPrinted(page)
  await page.emulateMedia({ media: 'print' })
  await expect(sheetOf(page).locator('tbody tr')).toHaveCount(3)
})

test('what the browser prints by itself is the rows loaded, and the sheet says how many there are', async ({
  page,
}) => {
  await signIn(page, 'cribManager')
  await page.goto('/cutters')
  await expect(page.locator('.ag-grid-scrolling-container .ag-row').first()).toBeVisible()
  await page.evaluate(() => window.dispatchEvent(new Event('beforeprint')))
  await page.emulateMedia({ media: 'print' })
  await expect(sheetOf(page).locator('tbody tr')).toHaveCount(100)
  await expect(sheetOf(page)).toContainText(/Rows 1 to 100 of \d+: those loaded\./)
})
