import { signedInAs } from '../support/api'
import { createCutter } from '../support/api-stock'
import { expect, sidewaysOverrunPx, signIn, test } from '../support/browser'

test('a tap on a symbol shows its name, a tap beside it takes it away', async ({ page }) => {
  const id = await createCutter(await signedInAs('cribManager'))
  await signIn(page, 'machinist')
  await page.goto(`/cutters/${id}`)
  const name = page.locator('[popover]:popover-open')
  await page.getByRole('button', { name: 'OAL' }).tap()
  await expect(name).toHaveText('OAL: overall length (ISO 13399)')
  expect(await sidewaysOverrunPx(page)).toBe(0)
  await page.getByRole('heading', { name: 'Geometry' }).tap()
  await expect(name).toHaveCount(0)
})
