import { expectAccessible } from '../support/accessibility'
import { type ApiClient, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, siteDatabase } from '../support/api-stock'
import { chooseMore, expect, signIn, test } from '../support/browser'

let crib: ApiClient

test.beforeAll(async () => {
  crib = await signedInAs('cribManager')
})

test('a pocket leads to its cutters and on to the reach check', async ({ page }) => {
  const code = uniqueCode('POCKET')
  await createCutter(crib, {
    code,
    cuttingDiameterMm: 93.21,
    shankDiameterMm: 90,
    lengthOfCutMm: 40,
    overallLengthMm: 200,
  })
  await signIn(page, 'machinist')
  await page.goto('/fits')
  await page.getByRole('button', { name: 'Find what fits' }).click()
  await expect(page.getByText('Enter inside corner radius.')).toBeVisible()
  await page.getByLabel('Inside corner radius').fill('46.605')
  await page.getByRole('textbox', { name: 'Depth' }).fill('40')
  await page.getByRole('button', { name: 'Find what fits' }).click()
  const row = page.getByRole('row', { name: new RegExp(code) })
  await expect(row).toContainText('93.21')
  await expectAccessible(page, 'the cutters for a pocket')
  await page.getByRole('link', { name: 'The same cutters in the cutters list' }).click()
  await expect(page).toHaveURL(/usableDepthMm.min=40/)
  await expect(page.getByRole('link', { name: code })).toBeVisible()
  await page.goBack()
  await page.getByRole('link', { name: `Check the reach of ${code}` }).click()
  await expect(page).toHaveURL(/\/reach\?.*cutter=\d+/)
  await expect(page.getByRole('textbox', { name: /^Depth/ })).toHaveValue('40')
  await expect(page.getByRole('img', { name: /inside corners of 46\.61 mm radius/ })).toBeVisible()
  await expect(page.getByText(code).first()).toBeVisible()
  await expect(page.getByRole('textbox', { name: /^Depth/ })).toHaveValue('40')
  await page.goBack()
  await page.getByRole('link', { name: /^Find a tool for this pocket/ }).click()
  await expect(page).toHaveURL(/\/search\?depth=40&corner=46\.605$/)
  await expect(page.getByText(/assemblies/).first()).toBeVisible()
})

test('a shank leads to what holds it, and the address keeps the question', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.goto('/fits?shankDiameterMm=6')
  await expect(page.getByLabel('Shank diameter')).toHaveValue('6')
  await expect(page.getByRole('heading', { name: /^Collets \d/ })).toBeVisible()
  await expect(page.getByRole('heading', { name: /^Holders \d/ })).toBeVisible()
  await expectAccessible(page, 'what holds a shank')
  await page.getByRole('radio', { name: 'A collet chuck' }).check()
  await page.getByLabel('Series of its collets').fill('ER16')
  await page.getByRole('button', { name: 'Find what fits' }).click()
  await expect(page).toHaveURL(/series=ER16/)
  await expect(page.getByRole('heading', { name: /^Cutters \d/ })).toBeVisible()
})

test('two of one geometry are made one, and the old code finds the one that is kept', async ({ page }) => {
  const db = siteDatabase()
  const shelf = await createShelf(crib)
  const [keptCode, oldCode] = [uniqueCode('KEEP'), uniqueCode('OLD')]
  const overallLengthMm = 500 + Math.floor(Math.random() * 1e6) / 1e4
  const ids: string[] = []
  // Three of a kind stand before every pair.
  for (const code of [keptCode, oldCode, uniqueCode('THIRD')]) {
    ids.push(await createCutter(crib, { code, overallLengthMm }))
  }
  await putOnShelf(db, crib, { itemId: ids[1] ?? '', binId: shelf.binId, quantity: 2 })
  await db.destroy()

  await signIn(page, 'cribManager')
  await page.goto('/cutters')
  await chooseMore(page, 'Duplicates')
  await expect(page).toHaveURL(/\/duplicates\?kind=cutter$/)
  await expect(page.getByRole('radio', { name: `Keep ${keptCode}` })).toBeVisible()
  // The one with pieces is kept unless another is chosen.
  await expect(page.getByRole('radio', { name: `Keep ${oldCode}` })).toBeChecked()
  await expectAccessible(page, 'the duplicates')
  await page.getByRole('radio', { name: `Keep ${keptCode}` }).check()
  await page
    .getByRole('row', { name: new RegExp(oldCode) })
    .getByRole('button', { name: `Merge into ${keptCode}` })
    .click()
  await expect(page.getByRole('row', { name: / A-1 New 2$/ })).toBeVisible()
  await expect(page.getByText('Neither has a reorder point.')).toBeVisible()
  await expectAccessible(page, 'a merge about to be made')
  await page.getByRole('button', { name: 'Merge them' }).click()
  await expect(page.getByText(`${oldCode} is merged into ${keptCode}; 2 pieces went over.`)).toBeVisible()

  await page.goto(`/cutters?q=${oldCode}`)
  await expect(page.getByRole('link', { name: keptCode })).toBeVisible()
  await page.goto(`/cutters/${ids[1]}`)
  await expect(page.getByText('It was merged into')).toBeVisible()
  await page.getByRole('main').getByRole('link', { name: keptCode }).click()
  await expect(page.getByText('It took in')).toBeVisible()
})
