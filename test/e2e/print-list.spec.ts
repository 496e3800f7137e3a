import { uniqueCode } from '../support/api'
import { squareCutter } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'

test('the rows of the view are printed with the columns shown, and nothing of the page around them', async ({
  page,
}) => {
  await signIn(page, 'cribManager')
  const maker = uniqueCode('PRINT')
  for (const cuttingDiameterMm of [4, 6, 5]) {
    const answer = await page.request.post('/api/cutters', {
      data: squareCutter({ maker, cuttingDiameterMm }),
    })
    expect(answer.status()).toBe(201)
  }
  // The browser's own dialog would wait for a hand.
  await page.addInitScript(() => {
    window.print = () => undefined
  })
  await page.goto(`/cutters?maker=${maker}&sort=-cuttingDiameterMm&columns=code,cuttingDiameterMm`)
  await expect(page.getByText('3 found')).toBeVisible()
  await page.getByRole('button', { name: 'Print', exact: true }).click()
  await page.emulateMedia({ media: 'print' })
  const sheet = page.locator('section', { has: page.getByRole('heading', { name: 'Cutters' }) }).last()
  await expect(sheet.getByRole('columnheader')).toHaveText(['Code', 'DCmm'])
  await expect(sheet.locator('tbody td:nth-child(2)')).toHaveText(['6', '5', '4'])
  await expect(page.getByRole('banner')).toBeHidden()
  await expect(page.getByRole('button', { name: 'Export' })).toBeHidden()
  await expect(page.locator('.ag-root-wrapper')).toBeHidden()
  await page.evaluate(() => window.dispatchEvent(new Event('afterprint')))
  await expect(sheet.locator('tbody')).toHaveCount(0)
})
