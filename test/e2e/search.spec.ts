import type { Page } from '@playwright/test'
import type { Knex } from 'knex'
import { expectAccessible } from '../support/accessibility'
import { signedInAs, uniqueCode } from '../support/api'
import { siteDatabase } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'
import { createSearchCrib, type SearchCrib } from '../support/search-crib'

let db: Knex
let rows: SearchCrib

test.beforeAll(async () => {
  db = siteDatabase()
  rows = await createSearchCrib(db, await signedInAs('cribManager'))
})
test.afterAll(() => db.destroy())

const asked = () => `crib=${rows.cribId}`
const optionOf = (page: Page, code: string) => page.getByRole('listitem').filter({ hasText: `${code} in ` })
const depth = (page: Page) => page.getByRole('textbox', { name: /^Depth/ })

test('by the keyboard alone: the feature, the answer, and on to the reach check', async ({ page }) => {
  const { necked } = rows
  await signIn(page, 'machinist')
  await page.goto(`/search?${asked()}`)
  await depth(page).focus()
  await page.keyboard.type('25')
  await page.keyboard.press('Enter')
  await expect(page).toHaveURL(/depth=25/)
  const status = page.getByRole('status').filter({ hasText: 'assemblies' })
  await expect(status).toContainText('2 of 3 assemblies reach.')
  const option = optionOf(page, necked.cutterCode)
  await expect(option).toContainText('a cutter of 3.175 mm, not 4 mm')
  // From the answer, where the keyboard now is, to the check of the second option.
  const check = option.getByRole('link', { name: /^Check and draw/ })
  for (let steps = 0; steps < 40; steps += 1) {
    if (await check.evaluate((link) => link === document.activeElement)) break
    await page.keyboard.press('Tab')
  }
  await expect(check).toBeFocused()
  await page.keyboard.press('Enter')
  await expect(page.getByTestId('verdict')).toContainText('Reaches 25 mm at 39.5 mm stick-out')
})

test('a link says the same to everyone, in their own unit', async ({ page }) => {
  const { necked } = rows
  await signIn(page, 'estimator')
  await page.goto(`/search?depth=25.4&corner=1.6&for=roughing&${asked()}`)
  await expect(page.getByRole('button', { name: 'Rough' })).toHaveAttribute('aria-pressed', 'true')
  await expect(page.getByText(/^For roughing, the inside corner’s radius is left/)).toBeVisible()
  await expect(optionOf(page, necked.cutterCode)).toContainText('39.5 mm')
  await page.getByRole('button', { name: 'Inches' }).click()
  await expect(depth(page)).toHaveValue('1')
  await expect(optionOf(page, necked.cutterCode)).toContainText('1.5551 in')
})

test('what is chosen asks again at once: rank, stock, and one cutter’s other holders', async ({ page }) => {
  const { necked, thickCode } = rows
  await signIn(page, 'machinist')
  await page.goto(`/search?depth=25&${asked()}`)
  const options = page.getByRole('listitem').filter({ hasText: 'Stick-out to set' })
  await expect(options.first()).toContainText(thickCode)
  await page.getByRole('combobox', { name: 'First comes' }).selectOption('In stock now')
  await expect(page).toHaveURL(/rank=stock/)
  await expect(options.first()).toContainText('Every part is in stock.')
  await page.getByRole('link', { name: `Everything that could hold ${necked.cutterCode}` }).click()
  await expect(page.getByText(`Only with cutter ${necked.cutterCode}`)).toBeVisible()
  await expect(options).toHaveCount(1)
})

test('two stand side by side in one drawing, with their figures', async ({ page }) => {
  const { necked, thickCode } = rows
  await signIn(page, 'machinist')
  await page.goto(`/search?depth=25&${asked()}`)
  for (const code of [thickCode, necked.cutterCode])
    await optionOf(page, code)
      .getByRole('checkbox', { name: /^Compare/ })
      .check()
  await page.getByRole('button', { name: 'Side by side' }).click()
  const compared = page.getByRole('region', { name: 'Side by side' })
  await expect(compared.getByRole('img')).toHaveAccessibleName(
    new RegExp(`${thickCode} in .*${necked.cutterCode} in `),
  )
  await expect(compared.getByRole('row', { name: /^Stick-out to set .* 39\.5 mm$/ })).toBeVisible()
  await expectAccessible(page, 'two assemblies side by side')
  await compared.getByRole('button', { name: 'Close' }).click()
  await expect(compared).toBeHidden()
})

test('a cut is estimated for every option, with what the spindle has for it, and side by side', async ({
  page,
}) => {
  const { thickCode, necked } = rows
  const crib = await signedInAs('cribManager')
  const taper = uniqueCode('BT')
  const { version } = (await crib.get(`/api/holders/${necked.holderId}`)).body
  await crib.patch(`/api/holders/${necked.holderId}`, { version, taper })
  const machine = { code: uniqueCode('M'), name: 'Weak mill', taper, gaugeLineToTableMm: 600, zTravelMm: 450 }
  const spindlePoints = [{ rpm: 12_000, torqueNm: 0.01 }]
  const made = await crib.post('/api/machines', { ...machine, maximumRpm: 12_000, spindlePoints })
  await signIn(page, 'machinist')
  await page.goto(`/search?depth=25&${asked()}`)
  await page.getByText('Cut, to estimate load, speed and power').click()
  await page.getByRole('textbox', { name: /^Cut depth/ }).fill('2')
  await page.getByRole('button', { name: 'Find', exact: true }).click()
  await expect(page.getByText('Choose the material too, or leave the cut blank.')).toBeVisible()
  await page.getByRole('combobox', { name: 'Material cut' }).selectOption('22')
  await page.getByRole('textbox', { name: /^Cut width/ }).fill('1')
  await page.getByRole('textbox', { name: /^Feed a tooth/ }).fill('0.04')
  await page.getByRole('textbox', { name: /^Cutting speed/ }).fill('100')
  await page.getByRole('button', { name: 'Find', exact: true }).click()
  await expect(page).toHaveURL(/cut=22&.*ap=2/)
  // 100 m/min on 4 mm are 7958 rpm; a quarter of the diameter wide, the feed goes up 1.15 times.
  const estimate = optionOf(page, thickCode).getByRole('region', { name: 'The cut, estimated' })
  await expect(estimate).toContainText('7 958 rpm')
  await expect(estimate).toContainText('1.15 × for thin chips')
  await expect(estimate).toContainText('what a spindle gives is not known')
  await expect(optionOf(page, necked.cutterCode)).toContainText('The cut is not estimated.')
  await page.getByRole('combobox', { name: 'Machine and set-up' }).selectOption(`machine:${made.body.id}`)
  await expect(estimate).toContainText('The spindle does not drive this cut, by estimate')
  await expectAccessible(page, 'options with a cut estimated')
  for (const code of [thickCode, necked.cutterCode])
    await optionOf(page, code)
      .getByRole('checkbox', { name: /^Compare/ })
      .check()
  await page.getByRole('button', { name: 'Side by side' }).click()
  const compared = page.getByRole('region', { name: 'Side by side' })
  await expect(compared.getByRole('row', { name: /^Side load, estimated .* N/ })).toBeVisible()
  await expect(compared.getByRole('row', { name: /^Power and torque, estimated/ })).toContainText(
    'the spindle does not drive it',
  )
})

test('what reaches is kept as an assembly, with the stick-out it was found at', async ({ page }) => {
  const { necked } = rows
  await signIn(page, 'machinist')
  await page.goto(`/search?depth=25&${asked()}`)
  await optionOf(page, necked.cutterCode)
    .getByRole('button', { name: /^Keep / })
    .click()
  await page.getByRole('dialog').getByLabel('Name').fill('Slot of the bracket')
  await page.getByRole('dialog').getByRole('button', { name: 'Keep it' }).click()
  await expect(page).toHaveURL(/\/assemblies\/\d+$/)
  await expect(page.getByText('39.5 mm').first()).toBeVisible()
  await expect(page.getByText(necked.cutterCode).first()).toBeVisible()
})

test('a machine’s taper and its set-up’s window leave what goes in', async ({ page }) => {
  const crib = await signedInAs('cribManager')
  const taper = uniqueCode('BT')
  const machine = { code: uniqueCode('M'), name: 'Vertical mill', taper, gaugeLineToTableMm: 600 }
  const made = await crib.post('/api/machines', {
    ...machine,
    zTravelMm: 450,
    maximumRpm: 12_000,
    spindleNoseDiameterMm: 80,
  })
  // Over 436 with 25 to spare a tool may be 139 long; what reaches is 139.5 and more.
  const heights = { highestMm: 436, lowestTipMm: 20, retractClearanceMm: 25 }
  const setUp = await crib.post('/api/set-ups', { machineId: made.body.id, name: 'Tall vise', ...heights })
  expect(setUp.status).toBe(201)
  await signIn(page, 'machinist')
  await page.goto(`/search?depth=25&${asked()}`)
  const choice = page.getByRole('combobox', { name: 'Machine and set-up' })
  await choice.selectOption(`machine:${made.body.id}`)
  await expect(page.getByText('No holder passes what you filter by.')).toBeVisible()
  const { version } = (await crib.get(`/api/holders/${rows.necked.holderId}`)).body
  await crib.patch(`/api/holders/${rows.necked.holderId}`, { version, taper })
  await page.reload()
  await expect(optionOf(page, rows.thickCode)).toContainText('Stick-out to set')
  const check = optionOf(page, rows.thickCode).getByRole('link', { name: /^Check and draw/ })
  await expect(check).toHaveAttribute('href', /h\.spindle=80&/)
  await choice.selectOption(`setup:${setUp.body.id}`)
  await expect(page).toHaveURL(/setup=\d+/)
  await expect(page.getByRole('region', { name: 'Falls short' })).toContainText(
    'outside what the machine takes',
  )
})

test('costs are ranked by and seen only by those who may', async ({ page, elsewhere }) => {
  await signIn(page, 'machinist')
  await page.goto(`/search?depth=25&${asked()}`)
  await expect(optionOf(page, rows.thickCode)).toBeVisible()
  await expect(page.getByRole('option', { name: 'Least cost' })).toHaveCount(0)
  await expect(page.getByText('Cost of its parts')).toHaveCount(0)
  await signIn(elsewhere, 'estimator')
  await elsewhere.goto(`/search?depth=25&rank=cost&${asked()}`)
  await expect(optionOf(elsewhere, rows.thickCode)).toContainText('What a part of it costs is not known.')
  await expect(elsewhere.getByText('Cost of its parts')).toHaveCount(2)
})

test('what falls short says what stops it, and leads back from a check that falls short', async ({
  page,
}) => {
  const { necked } = rows
  await signIn(page, 'machinist')
  await page.goto(
    `/reach?depth=45&cutter=${necked.cutterId}&holder=${necked.holderId}&collet=${necked.colletId}`,
  )
  await expect(page.getByTestId('verdict')).toContainText('short')
  await page.getByRole('link', { name: 'Find what in the crib reaches this' }).click()
  await expect(page).toHaveURL(/\/search\?depth=45$/)
  await page.goto(`/search?depth=45&${asked()}`)
  await expect(page.getByText('None of the 3 assemblies the crib could build reaches.')).toBeVisible()
  const short = page.getByRole('region', { name: 'Falls short' })
  await expect(short).toContainText(
    'The transition of the cutter itself stops it 6.84 mm before the depth, whatever the stick-out.',
  )
  await expectAccessible(page, 'what falls short')
})

test('a question that cannot be asked is said at its field, and nothing is lost', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.goto('/search')
  await page.getByRole('button', { name: 'Find', exact: true }).click()
  await expect(page.getByText('Enter the depth.')).toBeVisible()
  await expect(depth(page)).toBeFocused()
  await depth(page).fill('25 cubits')
  await page.getByRole('button', { name: 'Find', exact: true }).click()
  await expect(depth(page)).toBeFocused()
  await expect(depth(page)).toHaveAttribute('aria-invalid', 'true')
  await depth(page).fill('25')
  await page.getByRole('textbox', { name: /^Draft/ }).fill('75')
  await page.getByRole('button', { name: 'Find', exact: true }).click()
  await expect(page.getByRole('textbox', { name: /^Draft/ })).toHaveAttribute('aria-invalid', 'true')
  await expect(depth(page)).toHaveValue('25')
  await expect(page.getByText(/^The crib could not be searched\./)).toBeVisible()
  await expectAccessible(page, 'a search that is refused')
})

test('a slow answer says so and can be stopped, and asked for again', async ({ page }) => {
  await signIn(page, 'machinist')
  let isHeldBack = true
  await page.route('**/api/reach/search', async (route) => {
    if (isHeldBack) await new Promise((resolve) => setTimeout(resolve, 5000))
    await route.continue().catch(() => undefined)
  })
  await page.goto(`/search?depth=25&${asked()}`)
  await expect(page.getByText('this takes longer than a second')).toBeVisible()
  await page.getByRole('button', { name: 'Stop the search' }).click()
  await expect(page.getByText('The search was stopped before it was done')).toBeVisible()
  await expectAccessible(page, 'a search that was stopped')
  isHeldBack = false
  await page.getByRole('button', { name: 'Search again' }).click()
  await expect(optionOf(page, rows.thickCode)).toBeVisible()
})

test('nothing that passes the filters leads back to everything', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.goto(`/search?depth=25&forms=threadMill&${asked()}`)
  await expect(page.getByText('No cutter passes what you filter by.')).toBeVisible()
  await page.getByRole('button', { name: 'Look through everything' }).click()
  await expect(page).toHaveURL(/\/search\?depth=25$/)
  await expect(page.getByRole('status').filter({ hasText: 'assemblies reach.' })).toBeVisible()
})
