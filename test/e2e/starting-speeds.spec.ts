import { expectAccessible } from '../support/accessibility'
import { signedInAs, uniqueCode } from '../support/api'
import { createCutter } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'

test('a speed of the shop’s own is typed where the table stands, offered in ball-end speed and beside a cutter', async ({
  page,
}) => {
  const material = uniqueCode('Zinc')
  await signIn(page, 'cribManager')
  await page.goto('/starting-speeds')
  await expectAccessible(page, 'the table')
  await page.getByRole('button', { name: 'Add a material' }).click()
  await page.getByRole('textbox', { name: 'Material' }).fill(material)
  await page.getByRole('textbox', { name: 'Low end' }).fill('400')
  await page.getByRole('textbox', { name: 'High end' }).fill('300')
  await page.getByRole('button', { name: 'Save' }).click()
  await expect(page.getByText('The higher speed is below the lower one.')).toBeVisible()
  await expectAccessible(page, 'a row being added, refused')
  await page.getByRole('textbox', { name: 'High end' }).fill('500 m/min')
  await page.getByRole('button', { name: 'Save' }).click()
  await expect(
    page.getByRole('row', { name: new RegExp(`${material} Carbide 400 to 500 m/min`) }),
  ).toBeVisible()

  await page.goto('/ball-speed')
  await page.getByLabel('Start from a material').selectOption({ label: `${material} · Carbide` })
  await expect(page.getByText('400 to 500 m/min')).toBeVisible()
  await page.getByRole('button', { name: /Take the middle speed/ }).click()
  await expect(page.getByRole('textbox', { name: 'Cutting speed' })).toHaveValue('450')
  await expectAccessible(page, 'ball-end speed with a material')

  /* 100 mm at 400 m/min is 1273.2 rpm, at 500 it is 1591.5: 1000·vc/(π·D), by hand. */
  const crib = await signedInAs('cribManager')
  const id = await createCutter(crib, {
    cuttingDiameterMm: 100,
    shankDiameterMm: 40,
    substrate: 'carbide',
    maximumRpm: 1500,
  })
  await page.goto(`/cutters/${id}`)
  const row = page.getByRole('row', { name: new RegExp(material) })
  await expect(row).toContainText(/1.273 to 1.500 rpm/)
  await expect(row).toContainText('held to the limit')
  await page.getByLabel('Limit of spindle and holder').fill('1000')
  await expect(row).toContainText('slower than the range')

  await page.goto('/starting-speeds')
  await page.getByRole('button', { name: `Change ${material}, Carbide` }).click()
  await page.getByRole('button', { name: 'Remove' }).click()
  await expect(page.getByRole('row', { name: new RegExp(material) })).toHaveCount(0)
})

test('a machinist reads the table and is offered no change', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.goto('/starting-speeds')
  await expect(page.getByRole('row', { name: /Grey iron Carbide 150 to 275 m\/min/ })).toBeVisible()
  await expect(page.getByRole('button', { name: /Change|Add a material/ })).toHaveCount(0)
})
