import { expectAccessible } from '../support/accessibility'
import { signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'

test('a supplier is added, changed, archived and restored', async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto('/suppliers')
  const name = uniqueCode('Tallow Supply')
  await page.getByRole('button', { name: 'Add a supplier' }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('Name').fill(name)
  await dialog.getByLabel('E-mail address').fill('no address')
  await dialog.getByLabel('Lead time, days').fill('2 weeks')
  await dialog.getByRole('button', { name: 'Add the supplier' }).click()
  await expect(dialog.getByText('“2 weeks” is not a whole number.')).toBeVisible()
  await dialog.getByLabel('Lead time, days').fill('14')
  await dialog.getByRole('button', { name: 'Add the supplier' }).click()
  await expect(dialog.getByText('This is no e-mail address.')).toBeVisible()
  await expectAccessible(page, 'a supplier, refused')
  await dialog.getByLabel('E-mail address').fill('desk@tallow.example')
  await dialog.getByRole('button', { name: 'Add the supplier' }).click()
  const row = page.getByRole('row').filter({ hasText: name })
  await expect(row).toContainText('14 days')

  await row.getByRole('button', { name }).click()
  await dialog.getByLabel('Telephone').fill('555-0199')
  await dialog.getByRole('button', { name: 'Save the changes' }).click()
  await expect(row).toContainText('555-0199')

  await row.getByRole('button', { name }).click()
  await dialog.getByRole('button', { name: 'Archive' }).click()
  await expect(row).toHaveCount(0)
  await page.getByLabel('Archived too').check()
  await expect(row).toContainText('Archived')
  await row.getByRole('button', { name }).click()
  await dialog.getByRole('button', { name: 'Restore' }).click()
  await expect(row).not.toContainText('Archived')
})

test('one that reorder points name is not archived, and leads to them', async ({ page }) => {
  const crib = await signedInAs('cribManager')
  const name = uniqueCode('Named')
  const { id } = (await crib.post('/api/suppliers', { name })).body
  const shelf = await createShelf(crib)
  const code = uniqueCode('SUP')
  const itemId = await createCutter(crib, { code })
  await crib.send('PUT', `/api/reorder-points/${itemId}/${shelf.cribId}`, {
    body: { reorderPoint: 1, orderUpTo: 3, supplierId: id },
  })
  await signIn(page, 'cribManager')
  await page.goto('/suppliers')
  await page.getByRole('button', { name }).click()
  await page.getByRole('button', { name: 'Archive' }).click()
  await expect(page.getByRole('alert')).toContainText(`One reorder point names ${name}.`)
  await page.getByRole('link', { name: 'See these reorder points' }).click()
  await expect(page.locator('[row-index="0"] [col-id="itemCode"]')).toHaveText(code)
  await expect(page.getByText('1 found')).toBeVisible()
})

test('of two who change one, the second keeps what was typed and sees what is there', async ({ page }) => {
  const crib = await signedInAs('cribManager')
  const name = uniqueCode('Twice')
  const { id } = (await crib.post('/api/suppliers', { name })).body
  await signIn(page, 'cribManager')
  await page.goto('/suppliers')
  await page.getByRole('button', { name }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('Telephone').fill('555-0102')
  await crib.patch(`/api/suppliers/${id}`, { version: 1, contactName: 'Ada Quill' })
  await dialog.getByRole('button', { name: 'Save the changes' }).click()
  await expect(dialog.getByRole('alert')).toContainText('whom to ask for Ada Quill')
  await expect(dialog.getByLabel('Telephone')).toHaveValue('555-0102')
  await dialog.getByRole('button', { name: 'Put mine over it' }).click()
  await expect(page.getByRole('row').filter({ hasText: name })).toContainText('555-0102')
})

test('the list says that it failed, and an estimator only reads it', async ({ page }) => {
  await signIn(page, 'estimator')
  await page.route(/\/api\/suppliers/, (route) => route.abort())
  await page.goto('/suppliers')
  await expect(page.getByText('The suppliers could not be read. Leadline cannot be reached.')).toBeVisible()
  await page.unrouteAll()
  await page.getByRole('button', { name: 'Try again' }).click()
  await expect(page.getByRole('row').nth(1)).toBeVisible()
  await expect(page.getByRole('main').getByRole('button')).toHaveCount(0)
})
