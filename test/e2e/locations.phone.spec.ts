import { signedInAs } from '../support/api'
import { expect, sidewaysOverrunPx, signIn, test } from '../support/browser'
import { createNamedShelf } from '../support/shop-rows'

test('a bin is opened with a thumb, and no cabinet runs off the side', async ({ page }) => {
  const crib = await signedInAs('cribManager')
  const { cribCode: code } = await createNamedShelf(crib)
  await signIn(page, 'machinist')
  await page.goto('/locations')
  const bin = page
    .getByRole('region', { name: new RegExp(`^${code}`) })
    .getByRole('button', { name: 'Bin A-1' })
  await expect(bin).toBeVisible()
  expect(await sidewaysOverrunPx(page)).toBe(0)
  expect((await bin.boundingBox())?.height).toBeGreaterThanOrEqual(44)
  await bin.tap()
  await expect(page.getByRole('dialog').getByText('Nothing lies in it.')).toBeVisible()
})
