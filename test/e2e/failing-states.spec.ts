import type { Page } from '@playwright/test'
import { signedInAs, uniqueCode } from '../support/api'
import { createCutter, siteDatabase } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'
import { createNeckedTool } from '../support/shop-rows'

const lists = [
  ['cutters', 'cutter'],
  ['holders', 'holder'],
  ['collets', 'collet'],
  ['extensions', 'extension'],
] as const

const unreachable = 'Leadline cannot be reached. Check the network and try again.'

/** The server is away for these calls until it is told to come back. */
async function takeAway(page: Page, pattern: RegExp): Promise<() => Promise<void>> {
  await page.route(pattern, (route) => route.abort())
  return () => page.unroute(pattern)
}

for (const [many, one] of lists) {
  test(`the list of ${many} says that it failed, that it is empty, that nothing was found, and goes on`, async ({
    page,
  }) => {
    await signIn(page, 'cribManager')
    const bringBack = await takeAway(page, new RegExp(`/api/${many}\\?`))
    await page.goto(`/${many}`)
    await expect(page.getByText(`The ${many} could not be loaded. ${unreachable}`)).toBeVisible()
    await bringBack()
    await page.getByRole('button', { name: 'Try again' }).click()
    await expect(page.locator('[row-id]').first()).toBeVisible()

    await page.route(new RegExp(`/api/${many}\\?`), (route) =>
      route.fulfill({ json: { rows: [], nextCursor: null, total: 0 } }),
    )
    await page.reload()
    await expect(
      page.getByText(`There are no ${many} yet. Bring them in from a file, or add the first by hand.`),
    ).toBeVisible()
    await expect(page.getByRole('link', { name: 'Import a file' })).toBeVisible()
    await expect(page.getByRole('button', { name: `Add a ${one}` }).last()).toBeVisible()
    await page.unrouteAll()

    const word = uniqueCode('nowhere')
    await page.getByRole('searchbox').fill(word)
    await expect(page.getByText(`No ${one} matches “${word}”.`)).toBeVisible()
    await page.getByRole('button', { name: 'Clear the search and filters' }).click()
    await expect(page.locator('[row-id]').first()).toBeVisible()
  })
}

test('an empty catalogue tells who may not fill it who does', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.route(/\/api\/cutters\?/, (route) =>
    route.fulfill({ json: { rows: [], nextCursor: null, total: 0 } }),
  )
  await page.goto('/cutters')
  await expect(page.getByText('There are no cutters yet. The crib manager adds them.')).toBeVisible()
})

test('each part of an item’s page fails by itself, and is asked again by itself', async ({ page }) => {
  const id = await createCutter(await signedInAs('cribManager'))
  await signIn(page, 'machinist')
  const bringBack = await takeAway(page, /\/api\/items\//)
  await page.goto(`/cutters/${id}`)
  await expect(page.getByText(`The stock could not be loaded. ${unreachable}`)).toBeVisible()
  await expect(page.getByText(`The movements could not be loaded. ${unreachable}`)).toBeVisible()
  await expect(page.getByText(`The holders that fit could not be loaded. ${unreachable}`)).toBeVisible()
  await expect(page.getByRole('img', { name: /^Drawing to scale/ })).toBeVisible()
  await bringBack()
  await page.getByRole('region', { name: 'Stock' }).getByRole('button', { name: 'Try again' }).click()
  await expect(page.getByText('No piece of it is in the shop.')).toBeVisible()
})

test('the locations say that they failed and are asked again', async ({ page }) => {
  await signIn(page, 'machinist')
  const bringBack = await takeAway(page, /\/api\/locations/)
  await page.goto('/locations')
  await expect(page.getByText(unreachable)).toBeVisible()
  await bringBack()
  await page.getByRole('button', { name: 'Try again' }).click()
  await expect(page.getByRole('button', { name: 'All that lies in it' }).first()).toBeVisible()
  await expect(page.getByText(unreachable)).toHaveCount(0)
})

test('a sheet of reach goes on without the crib: it says what it could not read, and typed sizes still answer', async ({
  page,
}) => {
  await signIn(page, 'machinist')
  await page.route(/\/api\/(cutters|holders)/, (route) => route.abort())
  await page.goto(
    '/reach?depth=25&c.form=square&c.DC=3.175&c.APMX=6.35&c.LCF=6.35&c.DN=3&c.LU=38.1&c.DMM=3.175&c.OAL=76.2&h.A=100&h.depth=75&h.grip=10&h.segments=nut:18x28',
  )
  await expect(page.getByTestId('verdict')).toContainText('Reaches 25 mm at 39.5 mm')
  await page
    .getByRole('region', { name: 'Cutter', exact: true })
    .getByRole('combobox', { name: 'Pick from the crib' })
    .click()
  await expect(page.getByText(unreachable)).toBeVisible()
})

test('what was typed stays in the form while the server is away', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto('/cutters')
  const code = uniqueCode('AWAY')
  await page.getByRole('button', { name: 'Add a cutter' }).click()
  const dialog = page.getByRole('dialog')
  for (const [name, text] of [
    ['Code', code],
    ['Cutting diameter', '6 mm'],
    ['Length of cut', '12 mm'],
    ['Shank diameter', '6 mm'],
    ['Overall length', '57 mm'],
  ] as const)
    await dialog.getByLabel(name).first().fill(text)
  const bringBack = await takeAway(page, /\/api\/cutters$/)
  await dialog.getByRole('button', { name: 'Add the cutter' }).click()
  await expect(dialog.getByRole('alert').filter({ hasText: unreachable })).toBeVisible()
  await expect(dialog.getByLabel('Code')).toHaveValue(code)
  await bringBack()
  await dialog.getByRole('button', { name: 'Add the cutter' }).click()
  await expect(page.getByRole('heading', { name: code })).toBeVisible()
})

test('an issue whose answer got lost is sent again and counts once', async ({ page }) => {
  const db = siteDatabase()
  const rows = await createNeckedTool(db, await signedInAs('cribManager')).finally(() => db.destroy())
  await signIn(page, 'machinist')
  await page.goto(`/cutters/${rows.cutterId}`)
  await expect(page.getByRole('row', { name: /^A-1 .* New 5$/ })).toBeVisible()
  let lost = 0
  await page.route('**/api/movements', async (route) => {
    await route.fetch()
    lost += 1
    await route.abort()
  })
  await page.getByRole('button', { name: 'Issue' }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByRole('button', { name: 'Issue' }).click()
  await expect(dialog.getByRole('alert').filter({ hasText: unreachable })).toBeVisible()
  expect(lost).toBe(1)
  await page.unroute('**/api/movements')
  await dialog.getByRole('button', { name: 'Issue' }).click()
  await expect(dialog).toHaveCount(0)
  await expect(page.getByRole('row', { name: /^A-1 .* New 4$/ })).toBeVisible()
  await expect(page.getByRole('row', { name: /Issue 1 / })).toHaveCount(1)
})
