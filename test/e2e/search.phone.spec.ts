import type { Locator, Page } from '@playwright/test'
import type { Knex } from 'knex'
import { expectAccessible } from '../support/accessibility'
import { signedInAs } from '../support/api'
import { siteDatabase } from '../support/api-stock'
import { expect, sidewaysOverrunPx, signIn, test } from '../support/browser'
import { createSearchCrib, type SearchCrib } from '../support/search-crib'

let db: Knex
let rows: SearchCrib

test.beforeAll(async () => {
  db = siteDatabase()
  rows = await createSearchCrib(db, await signedInAs('cribManager'))
})
test.afterAll(() => db.destroy())

const aMinuteMs = 60_000
const gloveTargetPx = 64

const optionOf = (page: Page, code: string) => page.getByRole('listitem').filter({ hasText: `${code} in ` })

async function expectGloveTarget(target: Locator): Promise<void> {
  expect((await target.boundingBox())?.height).toBeGreaterThanOrEqual(gloveTargetPx)
}

/** What was found of a feature: the first stick-out is in sight at once, and every part with its bin. */
async function expectFound(page: Page, cutterCode: string, stickOut: string, places: [string, string][]) {
  await expect(page.getByText('Stick-out to set').first()).toBeInViewport()
  const option = optionOf(page, cutterCode)
  await expect(option.getByText(stickOut, { exact: true })).toBeVisible()
  for (const [code, place] of places)
    await expect(option.getByRole('definition').filter({ hasText: code })).toContainText(place)
  expect(await sidewaysOverrunPx(page)).toBe(0)
}

test('at the machine: three features, each with what to fetch, from where, and the stick-out to set', async ({
  page,
}) => {
  const { cribCode, necked, thickCode, drillCode, drillColletCode } = rows
  await signIn(page, 'machinist')
  await page.goto('/reach')
  await page.getByRole('button', { name: 'Menu' }).tap()
  await page.getByRole('link', { name: 'Find a tool' }).tap()
  const find = page.getByRole('button', { name: 'Find', exact: true })
  const change = page.getByRole('button', { name: 'Change' })
  const depth = page.getByRole('textbox', { name: /^Depth/ })
  await expectGloveTarget(find)

  // A wall 25 deep: the hand case says 39.5 for the necked cutter.
  let startedAt = Date.now()
  await depth.fill('25')
  await find.tap()
  await page.getByRole('combobox', { name: 'Crib' }).selectOption(rows.cribId)
  await page.getByRole('checkbox', { name: 'Only what is in stock' }).check()
  await expectFound(page, necked.cutterCode, '39.5 mm', [
    [necked.cutterCode, `${cribCode}, bin A-1: 5`],
    [necked.colletCode, `${cribCode}, bin A-1: 1`],
    [necked.holderCode, `${cribCode}, bin A-2: 1`],
  ])
  expect(Date.now() - startedAt).toBeLessThan(aMinuteMs)
  await expectGloveTarget(change)
  await expectGloveTarget(optionOf(page, thickCode).getByRole('link', { name: /^Check and draw/ }))

  // A pocket with corners of 1.7: the thicker cutter does not go in.
  startedAt = Date.now()
  await change.tap()
  await depth.fill('20')
  await page.getByText('Opening, corners, obstacles').tap()
  await page.getByRole('textbox', { name: /^Opening at the floor/ }).fill('12')
  await page.getByRole('textbox', { name: /^Inside corner radius/ }).fill('1.7')
  await find.tap()
  await expect(page.getByText('Wall 20 mm deep, opening 12 mm, inside corner 1.7 mm')).toBeVisible()
  await expectFound(page, necked.cutterCode, '39.5 mm', [[necked.cutterCode, 'bin A-1: 5']])
  await expect(page.getByRole('region', { name: 'Falls short' })).toContainText(thickCode)
  expect(Date.now() - startedAt).toBeLessThan(aMinuteMs)

  // A hole of 6.5: only full shank is clamped, 1 behind the 40 of flutes.
  startedAt = Date.now()
  await change.tap()
  await page.getByRole('button', { name: 'Hole' }).tap()
  await page.getByRole('textbox', { name: /^Hole diameter/ }).fill('6.5')
  await depth.fill('20')
  await find.tap()
  await expectFound(page, drillCode, '41 mm', [
    [drillCode, 'bin A-1: 3'],
    [drillColletCode, 'bin A-1: 1'],
  ])
  expect(Date.now() - startedAt).toBeLessThan(aMinuteMs)
  await expectAccessible(page, 'what reaches, on a phone')
})
