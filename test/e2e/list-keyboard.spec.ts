import { signedInAs, uniqueCode } from '../support/api'
import { createCutter } from '../support/api-stock'
import { chooseMore, expect, signIn, test } from '../support/browser'

test('a list is worked from the keyboard alone: search, down to the second row, open, back', async ({
  page,
}) => {
  const crib = await signedInAs('cribManager')
  const mark = uniqueCode('KEYS')
  const ids: string[] = []
  for (const at of [1, 2, 3]) ids.push(await createCutter(crib, { maker: mark, code: `${mark}-${at}` }))
  await signIn(page, 'machinist')
  await page.goto(`/cutters?maker=${mark}&sort=code`)
  await expect(page.getByText('3 found')).toBeVisible()
  await page.keyboard.press('/')
  await expect(page.getByRole('searchbox')).toBeFocused()
  await page.keyboard.press('ArrowDown')
  await expect(page.locator(`[row-id="${ids[0]}"] [col-id="code"]`)).toBeFocused()
  await page.keyboard.press('ArrowDown')
  await expect(page.locator(`[row-id="${ids[1]}"] [col-id="code"]`)).toBeFocused()
  await page.keyboard.press('ArrowRight')
  await page.keyboard.press('Enter')
  await expect(page).toHaveURL(`/cutters/${ids[1]}`)
  await page.goBack()
  await expect(page).toHaveURL(`/cutters?maker=${mark}&sort=code`)
  await expect(page.getByText('3 found')).toBeVisible()
})

test('a view that was put together by hand survives a reload and opens for someone else', async ({
  page,
  elsewhere,
}) => {
  const crib = await signedInAs('cribManager')
  const mark = uniqueCode('VIEW')
  for (const diameter of [4, 12, 8])
    await createCutter(crib, { maker: mark, cuttingDiameterMm: diameter, shankDiameterMm: 12 })
  await signIn(page, 'machinist')
  await page.goto(`/cutters?maker=${mark}`)
  await page.getByLabel('Cutting diameter from').fill('5 mm')
  await expect(page.getByText('2 found')).toBeVisible()
  await page.getByRole('columnheader', { name: /Cutting diameter/ }).click()
  await expect(page).toHaveURL(/sort=cuttingDiameterMm/)
  await chooseMore(page, 'Columns')
  await page.getByRole('checkbox', { name: 'Maker' }).click()
  await page.keyboard.press('Escape')
  await expect(page).toHaveURL(/columns=/)
  const address = page.url()
  await signIn(elsewhere, 'estimator')
  await elsewhere.goto(address)
  await page.reload()
  for (const each of [page, elsewhere]) {
    await expect(each.getByText('2 found')).toBeVisible()
    await expect(each.locator('[row-id] [col-id="cuttingDiameterMm"]')).toHaveText(['8', '12'])
    await expect(each.getByRole('columnheader', { name: 'Maker' })).toHaveCount(0)
    expect(each.url()).toBe(address)
  }
})

test('an address nobody can read says so and offers the whole list', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.goto('/cutters?cuttingDiameterMm.min=wide')
  await page.getByRole('button', { name: 'Show the whole list' }).click()
  await expect(page).toHaveURL('/cutters')
  await expect(page.locator('[row-id]').first()).toBeVisible()
})

test('a column ticked by key keeps the keyboard, though it moves to the other list', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.goto('/cutters')
  await page.getByRole('button', { name: 'More', exact: true }).press('Enter')
  await expect(page.getByRole('menu')).toBeVisible()
  await page.keyboard.type('Col')
  await page.keyboard.press('Enter')
  const maker = page.getByRole('list', { name: 'Shown', exact: true }).getByLabel('Maker', { exact: true })
  await maker.focus()
  await page.keyboard.press('Space')
  const hidden = page.getByRole('list', { name: 'Not shown' }).getByLabel('Maker', { exact: true })
  await expect(hidden).toBeFocused()
  await page.keyboard.press('Space')
  await expect(maker).toBeFocused()
  await page.keyboard.press('Escape')
  await expect(page.getByRole('button', { name: 'More', exact: true })).toBeFocused()
})
