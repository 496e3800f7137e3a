import { expectAccessible } from '../support/accessibility'
import { signedInAs, uniqueCode } from '../support/api'
import { expect, sidewaysOverrunPx, signIn, test } from '../support/browser'
import { createMachineRows } from '../support/machine-rows'

test('a crib manager enters a machine and a set-up, and sees what it takes before saving', async ({
  page,
}) => {
  const crib = await signedInAs('cribManager')
  const { viseCode } = await createMachineRows(crib)
  const code = uniqueCode('MILL')
  await signIn(page, 'cribManager')
  await page.goto('/machines')
  await page.getByRole('button', { name: 'Add a machine' }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByRole('button', { name: 'Save' }).click()
  await expect(dialog.getByText('Gauge line to table is needed.')).toBeVisible()
  await dialog.getByRole('textbox', { name: 'Code' }).fill(code)
  await dialog.getByRole('textbox', { name: 'Name' }).fill('Corner mill')
  await dialog.getByRole('textbox', { name: 'Spindle taper' }).fill('CAT40')
  await dialog.getByRole('textbox', { name: 'Gauge line to table' }).fill('600')
  await dialog.getByRole('textbox', { name: 'Z travel' }).fill('450')
  await dialog.getByRole('textbox', { name: 'Fastest speed' }).fill('8100')
  await dialog.getByRole('button', { name: 'Add a point' }).click()
  await dialog.getByRole('textbox', { name: /^Speed rpm/ }).fill('1500')
  await dialog.getByRole('textbox', { name: 'Torque' }).fill('70')
  await dialog.getByRole('button', { name: 'Save' }).click()

  await expect(page.getByRole('heading', { name: `${code} · Corner mill` })).toBeVisible()
  await expect(page.getByRole('row', { name: /1.500 rpm – 70 Nm/ })).toBeVisible()
  await page.getByRole('button', { name: 'Add the first set-up' }).click()
  await dialog.getByRole('textbox', { name: 'Name' }).fill('Vise on parallels')
  await dialog.getByRole('textbox', { name: 'Highest thing above the table' }).fill('100')
  await dialog.getByRole('textbox', { name: 'Lowest tip position above the table' }).fill('60')
  await dialog.getByRole('button', { name: 'Add a fixture' }).click()
  await dialog.getByLabel('Fixture', { exact: true }).selectOption({ label: `${viseCode} · 180 mm high` })
  await dialog.getByRole('textbox', { name: 'Stands at' }).fill('40')
  // Case 1 of the machine windows by hand.
  await expect(dialog.getByText('Takes gauge lengths from 90 mm to 355 mm.')).toBeVisible()
  await dialog.getByRole('button', { name: 'Save' }).click()
  await expect(page.getByTestId('verdict')).toContainText('Takes gauge lengths from 90 mm to 355 mm.')
  await expect(
    page.getByRole('img', { name: /highest thing stands 220 mm high.*from 90 mm to 355 mm/ }),
  ).toBeVisible()
  await expectAccessible(page, 'a machine with its first set-up')
})

test('a tool too long is told by how much, and a stubbier holder is one tap away', async ({ page }) => {
  const crib = await signedInAs('cribManager')
  const rows = await createMachineRows(crib)
  await signIn(page, 'machinist')
  await page.goto(`/machines/${rows.machineId}`)
  await page.getByRole('combobox', { name: 'Holder' }).fill(rows.longHolder.code)
  await page.getByRole('option', { name: new RegExp(rows.longHolder.code) }).click()
  await page.getByRole('textbox', { name: 'Stick-out' }).fill('40')
  await expect(page.getByTestId('verdict')).toContainText('A gauge length of 360 mm is too long by 5 mm.')
  await expect(page.getByRole('img', { name: /is too long by 5 mm/ })).toContainText('too long by 5 mm')
  await page.getByRole('button', { name: `Try ${rows.stubbyHolder.code}` }).click()
  await expect(page.getByTestId('verdict')).toContainText('A gauge length of 190 mm fits this set-up.')
  await page.reload()
  await expect(page.getByTestId('verdict')).toContainText('A gauge length of 190 mm fits this set-up.')
  await expect(page.getByRole('button', { name: /Add a set-up|Change/ })).toHaveCount(0)
})

test('a rotary stock that strikes the table is said and drawn', async ({ page }) => {
  const crib = await signedInAs('cribManager')
  const { machineId } = await createMachineRows(crib)
  const name = uniqueCode('Bar')
  await crib.post('/api/set-ups', {
    ...{ machineId, name, highestMm: 0, lowestTipMm: 40, retractClearanceMm: 25 },
    rotaryStock: { widthMm: 80, heightMm: 80, axisHeightMm: 50 },
  })
  await signIn(page, 'machinist')
  await page.goto(`/machines/${machineId}`)
  await page.getByRole('button', { name: new RegExp(`${name} Strikes the table`) }).click()
  await expect(page.getByTestId('verdict')).toContainText('it would go 6.569 mm into it')
  await expect(page.getByRole('img', { name: /sweeping a circle of radius 56.569 mm/ })).toContainText(
    'strikes the table by 6.569 mm',
  )
  expect(await sidewaysOverrunPx(page)).toBe(0)
})

test('the list of machines says that it failed and that it is empty, and goes on', async ({ page }) => {
  const { code } = await createMachineRows(await signedInAs('cribManager'))
  await signIn(page, 'cribManager')
  await page.route(/\/api\/machines$/, (route) => route.abort())
  await page.goto('/machines')
  await expect(page.getByText('Leadline cannot be reached. Check the network and try again.')).toBeVisible()
  await expectAccessible(page, 'machines, failed')
  await page.unroute(/\/api\/machines$/)
  await page.getByRole('button', { name: 'Try again' }).click()
  await expect(page.getByText('Leadline cannot be reached')).toHaveCount(0)
  await expect(page.getByRole('link', { name: new RegExp(code) })).toBeVisible()

  await page.route(/\/api\/machines$/, (route) => route.fulfill({ json: { rows: [] } }))
  await page.reload()
  await expect(page.getByText('No machine is entered yet.')).toBeVisible()
  await expectAccessible(page, 'machines, none')
  await page.getByRole('button', { name: 'Add the first machine' }).click()
  await expect(page.getByRole('dialog', { name: 'Add a machine' })).toBeVisible()
})

test('a set-up whose heights no longer make a window says so and is changed', async ({ page }) => {
  const crib = await signedInAs('cribManager')
  const { machineId } = await createMachineRows(crib)
  const vise = await crib.post('/api/fixtures', { code: uniqueCode('VISE'), heightMm: 90 })
  const name = uniqueCode('Low')
  await crib.post('/api/set-ups', {
    ...{ machineId, name, highestMm: 0, lowestTipMm: 60, retractClearanceMm: 25 },
    fixtures: [{ itemId: vise.body.id, baseMm: 0 }],
  })
  await crib.patch(`/api/fixtures/${vise.body.id}`, { version: 1, heightMm: 30 })
  await signIn(page, 'cribManager')
  await page.goto(`/machines/${machineId}`)
  await page.getByRole('button', { name: new RegExp(`${name} Heights that cannot be`) }).click()
  await expect(
    page.getByText('The lowest tip position is above the highest thing in the set-up.'),
  ).toBeVisible()
  await page.getByRole('button', { name: 'Change the set-up' }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByRole('textbox', { name: 'Lowest tip position above the table' }).fill('20')
  await dialog.getByRole('button', { name: 'Save' }).click()
  await expect(page.getByTestId('verdict')).toContainText('Takes gauge lengths from 130 mm to 545 mm.')
})
