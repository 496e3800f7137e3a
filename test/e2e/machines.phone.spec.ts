import { signedInAs } from '../support/api'
import { expect, sidewaysOverrunPx, signIn, test } from '../support/browser'
import { createMachineRows } from '../support/machine-rows'

test('at the machine a phone shows the daylight and says whether the tool fits', async ({ page }) => {
  const rows = await createMachineRows(await signedInAs('cribManager'))
  await signIn(page, 'machinist')
  await page.goto('/machines')
  await page.getByRole('link', { name: new RegExp(rows.code) }).click()
  await expect(page.getByRole('img', { name: /^Drawing of the daylight/ })).toBeVisible()
  expect(await sidewaysOverrunPx(page)).toBe(0)
  await page.goto(`/machines/${rows.machineId}?holder=${rows.longHolder.id}&stickOutMm=40`)
  await expect(page.getByTestId('verdict')).toContainText('too long by 5 mm')
  await page.getByRole('button', { name: `Try ${rows.stubbyHolder.code}` }).click()
  await expect(page.getByTestId('verdict')).toContainText('fits this set-up')
  expect(await sidewaysOverrunPx(page)).toBe(0)
})
