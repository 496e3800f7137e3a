import type { Locator, Page } from '@playwright/test'
import { signedInAs, uniqueCode } from '../support/api'
import { createCutter } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'

const overrunOf = (page: Page) =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)

async function expectForFingers(target: Locator): Promise<void> {
  const box = await target.boundingBox()
  expect(box?.height ?? 0).toBeGreaterThanOrEqual(44)
}

test('on a phone nothing of these pages runs off the side', async ({ page }) => {
  await signIn(page, 'admin')
  for (const [path, text] of [
    ['/fits?insideCornerRadiusMm=4&depthMm=10', 'cutters could'],
    ['/fits?shankDiameterMm=6', 'A fixed bore takes'],
    ['/duplicates?kind=cutter', 'measure the same'],
    ['/starting-speeds', 'Titanium'],
    ['/first-day', 'Opening stock'],
    ['/ball-speed', 'The limits'],
    ['/locations', 'In no crib'],
  ] as const) {
    await page.goto(path)
    await expect(page.getByText(text).first()).toBeVisible()
    expect(await overrunOf(page), path).toBe(0)
  }
})

test('on a phone a merge is looked at and made with a finger', async ({ page }) => {
  const crib = await signedInAs('cribManager')
  const [kept, old] = [uniqueCode('AAKEEP'), uniqueCode('ABOLD')]
  const overallLengthMm = 800 + Math.floor(Math.random() * 1e7) / 1e5
  // Three of a kind stand before every pair.
  for (const code of [kept, old, uniqueCode('ACTHIRD')]) await createCutter(crib, { code, overallLengthMm })
  await signIn(page, 'cribManager')
  await page.goto('/duplicates?kind=cutter')
  await page.getByRole('radio', { name: `Keep ${kept}` }).check()
  const merge = page
    .getByRole('row', { name: new RegExp(old) })
    .getByRole('button', { name: `Merge into ${kept}` })
  await expectForFingers(merge)
  await merge.tap()
  const dialog = page.getByRole('dialog')
  await expect(dialog.getByText(`There is no piece of ${old} in the shop.`)).toBeVisible()
  expect(await overrunOf(page)).toBe(0)
  await expectForFingers(dialog.getByRole('button', { name: 'Merge them' }))
  await dialog.getByRole('button', { name: 'Merge them' }).tap()
  await expect(page.getByText(`${old} is merged into ${kept}; 0 pieces went over.`)).toBeVisible()
})

test('on a phone the holder is picked from the crib with a finger, and the cap is named', async ({
  page,
}) => {
  const crib = await signedInAs('cribManager')
  const code = uniqueCode('SLIM')
  await crib.post('/api/holders', {
    code,
    gaugeLengthMm: 100,
    bore: { kind: 'fixed', diameterMm: 6 },
    maximumRpm: 9000,
    segments: [{ part: 'holder', lengthMm: 40, noseDiameterMm: 20, spindleDiameterMm: 20 }],
  })
  await signIn(page, 'machinist')
  await page.goto('/ball-speed?cuttingDiameterMm=6&depthOfCutMm=0.3&tiltDeg=30&spindleRpm=20000')
  await page.getByRole('combobox', { name: 'Holder, from the crib' }).fill(code)
  const option = page.getByRole('listbox').getByRole('option', { name: new RegExp(code) })
  await expectForFingers(option)
  await option.tap()
  await expect(page.getByText(/Capped by the holder, at 9.000 rpm/)).toBeVisible()
  expect(await overrunOf(page)).toBe(0)
})

test('with the keyboard alone a pocket is asked about and a merge is opened and left', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto('/fits')
  await page.getByRole('textbox', { name: 'Inside corner radius' }).focus()
  await page.keyboard.type('4')
  await page.keyboard.press('Tab')
  await page.keyboard.type('10')
  await page.keyboard.press('Enter')
  await expect(page.getByText('cutters could')).toBeVisible()

  const crib = await signedInAs('cribManager')
  const overallLengthMm = 900 + Math.floor(Math.random() * 1e7) / 1e5
  for (const code of [uniqueCode('AA'), uniqueCode('AB'), uniqueCode('AC')])
    await createCutter(crib, { code, overallLengthMm })
  await page.goto('/duplicates?kind=cutter')
  const merge = page.getByRole('button', { name: /^Merge into/ }).first()
  await merge.focus()
  await page.keyboard.press('Enter')
  await expect(page.getByRole('dialog').getByRole('button', { name: 'Merge them' })).toBeVisible()
  await page.keyboard.press('Escape')
  await expect(page.getByRole('dialog')).toHaveCount(0)
  await expect(merge).toBeFocused()
})
