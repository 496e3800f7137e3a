import { uniqueCode } from '../support/api'
import { squareCutter } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'

test.beforeEach(async ({ page }) => {
  await signIn(page, 'cribManager')
})

test('the list is read and narrowed with a thumb, and loads no grid', async ({ page }) => {
  const mark = uniqueCode('PHONE')
  for (const cuttingDiameterMm of [5, 6])
    await page.request.post('/api/cutters', { data: squareCutter({ maker: mark, cuttingDiameterMm }) })
  await page.goto(`/cutters?maker=${mark}`)
  const uncounted: string[] = []
  page.on('response', (answer) => {
    if (answer.url().includes('/counts') && !answer.ok()) uncounted.push(answer.url())
  })
  const rows = page.getByRole('main').getByRole('listitem')
  await expect(rows).toHaveCount(2)
  await expect(page.locator('.ag-root')).toHaveCount(0)
  for (const row of await rows.getByRole('link').all())
    expect((await row.boundingBox())?.height).toBeGreaterThanOrEqual(44)
  await page.getByRole('button', { name: 'Filters (1)' }).click()
  await page.getByLabel('Cutting diameter from').fill('5.5 mm')
  await page.getByRole('button', { name: 'Show 1', exact: true }).click()
  expect(uncounted, 'counts refused').toEqual([])
  await expect(rows).toHaveCount(1)
  await expect(page).toHaveURL(/cuttingDiameterMm\.min=5\.5/)
})

test('an item’s page and its form run off no side', async ({ page }) => {
  const answer = await page.request.post('/api/cutters', { data: squareCutter() })
  await page.goto(`/cutters/${(await answer.json()).id}`)
  await expect(page.getByRole('img', { name: /^Drawing to scale/ })).toBeVisible()
  const overflow = () => page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)
  expect(await overflow()).toBeLessThanOrEqual(0)
  await page.getByRole('button', { name: 'Edit' }).click()
  await expect(page.getByRole('dialog').getByLabel('Code')).toBeVisible()
  expect(await overflow()).toBeLessThanOrEqual(0)
})
