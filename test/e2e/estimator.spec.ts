import { signedInAs, uniqueCode } from '../support/api'
import { createCutter } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'

test.afterEach(async ({ page }) => {
  await page.request.patch('/api/me', { data: { lengthUnit: null } })
})

test('an estimator sees what a cutter costs, in the list and on its page, and is offered nothing to change', async ({
  page,
}) => {
  const maker = uniqueCode('MAKER')
  const id = await createCutter(await signedInAs('cribManager'), { maker, unitCost: 4321 })
  await signIn(page, 'estimator')
  await page.goto(`/cutters?maker=${maker}&columns=code,cuttingDiameterMm`)
  await expect(page.getByText('1 found')).toBeVisible()
  await expect(page.getByRole('button', { name: 'Edit in the list' })).toHaveCount(0)
  await page.getByRole('button', { name: 'More', exact: true }).click()
  for (const name of ['Change all found', 'Paste rows', 'Import a file'])
    await expect(page.getByRole('menuitem', { name }), name).toHaveCount(0)
  await page.getByRole('menuitem', { name: 'Columns' }).click()
  await page.getByRole('checkbox', { name: 'Unit cost (price)' }).click()
  await expect(page.locator(`[row-id="${id}"] [col-id="unitCost"]`)).toContainText('43.21')
  await page.keyboard.press('Escape')
  await expect(page.getByRole('button', { name: /^Add/ })).toHaveCount(0)

  await page.goto(`/cutters/${id}`)
  await expect(page.getByText('43.21')).toBeVisible()
  await expect(page.getByRole('link', { name: 'Check reach' })).toBeVisible()
  for (const name of ['Issue', 'Return', 'Edit', 'Archive'])
    await expect(page.getByRole('button', { name }), name).toHaveCount(0)
})

test('what an estimator may not do is refused whatever the page offers', async ({ page }) => {
  const id = await createCutter(await signedInAs('cribManager'))
  await signIn(page, 'estimator')
  const move = { kind: 'issue', itemId: id, quantity: 1, fromLocationId: '1', toLocationId: '2' }
  const refusals = [
    await page.request.post('/api/movements', {
      data: move,
      headers: { 'idempotency-key': uniqueCode('K') },
    }),
    await page.request.patch(`/api/cutters/${id}`, { data: { version: 1, description: 'Mine' } }),
    await page.request.get('/api/users'),
  ]
  expect(refusals.map((answer) => answer.status())).toEqual([403, 403, 403])
  for (const path of ['/imports', '/imports/new', '/people', '/settings']) {
    await page.goto(path)
    await expect(page, path).toHaveURL('/not-allowed')
  }
  await expect(page.getByRole('navigation', { name: 'Main' }).getByRole('link')).toHaveText([
    'Find a tool',
    'Reach',
    'Ball-end speed',
    'Speeds',
    'Cutters',
    'Holders',
    'Collets',
    'Extensions',
    'Fixtures',
    'Fits',
    'Assemblies',
    'Machines',
    'Locations',
    'Low stock',
  ])
})

test('inches are chosen once and hold on every page and the next day', async ({ page, elsewhere }) => {
  const id = await createCutter(await signedInAs('cribManager'), {
    cuttingDiameterMm: 12.7,
    lengthOfCutMm: 25.4,
    shankDiameterMm: 12.7,
    overallLengthMm: 76.2,
  })
  await signIn(page, 'estimator')
  await page.goto(`/cutters/${id}`)
  await expect(page.getByRole('row', { name: 'APMX Length of cut 25.4 mm' })).toBeVisible()
  await page.getByRole('button', { name: 'Inches' }).click()
  await expect(page.getByRole('row', { name: /^APMX Length of cut 1(\.0+)? in$/ })).toBeVisible()
  await expect(page.getByRole('button', { name: 'Inches' })).toHaveAttribute('aria-pressed', 'true')
  await page.goto('/reach?depth=25.4')
  await expect(page.getByRole('textbox', { name: /^Depth/ })).toHaveValue('1')
  await signIn(elsewhere, 'estimator')
  await elsewhere.goto(`/cutters/${id}`)
  await expect(elsewhere.getByRole('row', { name: /^OAL Overall length 3(\.0+)? in$/ })).toBeVisible()
})
