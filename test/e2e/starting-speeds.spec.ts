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
  const holderCode = uniqueCode('SLOW')
  const holder = await crib.post('/api/holders', {
    code: holderCode,
    gaugeLengthMm: 100,
    bore: { kind: 'fixed', diameterMm: 40 },
    maximumRpm: 1400,
    segments: [{ part: 'holder', lengthMm: 40, noseDiameterMm: 60, spindleDiameterMm: 60 }],
  })
  expect(holder.status).toBe(201)
  await page.goto(`/cutters/${id}`)
  const row = page.getByRole('row', { name: new RegExp(material) })
  await expect(row).toContainText(/1.273 to 1.500 rpm/)
  await expect(row).toContainText('held to the cutter’s limit')
  const speeds = page.getByRole('region', { name: 'Starting speeds' })
  await expect(speeds.getByText(/Capped by the cutter, at 1.500 rpm/)).toBeVisible()
  await speeds.getByRole('combobox', { name: 'Holder, from the crib' }).fill(holderCode)
  // From the top, where the page's own acts lie under no edge of the heading that stays.
  await page.evaluate(() => window.scrollTo(0, 0))
  await expectAccessible(page, 'a cutter’s speeds, picking its holder')
  await speeds.getByRole('option', { name: new RegExp(holderCode) }).click()
  await expect(speeds.getByText(/Capped by the holder, at 1.400 rpm/)).toBeVisible()
  await expect(row).toContainText('held to the holder’s limit')
  await page.getByLabel('Spindle limit').fill('1000')
  await expect(row).toContainText('the spindle’s limit; slower than the range')
  await page.evaluate(() => window.scrollTo(0, 0))
  await expectAccessible(page, 'a cutter’s speeds, capped by the spindle')

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

test('in ball-end speed the cutter and the holder come from the crib, and the answer names what caps it', async ({
  page,
}) => {
  const crib = await signedInAs('cribManager')
  const [cutterCode, holderCode] = [uniqueCode('BALL'), uniqueCode('CHUCK')]
  await createCutter(crib, { code: cutterCode, form: 'ball', cornerRadiusMm: 3, maximumRpm: 20_000 })
  await crib.post('/api/holders', {
    code: holderCode,
    gaugeLengthMm: 100,
    bore: { kind: 'fixed', diameterMm: 6 },
    maximumRpm: 15_000,
    segments: [{ part: 'holder', lengthMm: 40, noseDiameterMm: 20, spindleDiameterMm: 20 }],
  })
  await signIn(page, 'machinist')
  await page.goto(
    '/ball-speed?cuttingDiameterMm=8&depthOfCutMm=0.3&tiltDeg=30&spindleRpm=30000&maximumRpm=24000',
  )
  await expect(page.getByText(/is over the spindle’s limit, so 24.000 rpm/).first()).toBeVisible()
  const form = page.getByRole('form', { name: 'The cut' })
  await form.getByRole('combobox', { name: 'Pick from the crib' }).fill(cutterCode)
  await form.getByRole('option', { name: new RegExp(cutterCode) }).click()
  await expect(form.getByRole('textbox', { name: 'Diameter' })).toHaveValue('6')
  await expect(page.getByText(/is over the cutter’s limit, so 20.000 rpm/).first()).toBeVisible()
  await form.getByRole('combobox', { name: 'Holder, from the crib' }).focus()
  await page.keyboard.type(holderCode)
  await expect(form.getByRole('listbox').getByRole('option')).toHaveCount(1)
  await page.keyboard.press('Enter')
  await expect(form.getByText(/Capped by the holder, at 15.000 rpm\./)).toBeVisible()
  await expect(page.getByText(/is over the holder’s limit, so 15.000 rpm/).first()).toBeVisible()
  await expectAccessible(page, 'ball-end speed, cutter and holder picked')

  await expect(page).toHaveURL(/holder=\d+/)
  await page.reload()
  await expect(form.getByText(/Capped by the holder/)).toBeVisible()
  await form.getByRole('textbox', { name: 'Diameter' }).fill('7')
  await expect(form.getByRole('link', { name: cutterCode })).toHaveCount(0)
  await form.getByRole('button', { name: /Remove the holder/ }).click()
  await expect(form.getByText(/Capped by the spindle, at 24.000 rpm/)).toBeVisible()
})
