import { uniqueCode } from '../support/api'
import { expect, signIn, test } from '../support/browser'

/** What the worker brings about, on a machine that is busy with other tests. */
const byWorker = { timeout: 30_000 }

test('a file goes in from a phone, nothing runs off the side, and every target takes a finger', async ({
  page,
}) => {
  await signIn(page, 'cribManager')
  await page.goto('/imports/new')
  const content = `Tool #,Type,Dia,LOC,OAL,Shank Dia,Shelf\n${uniqueCode('E2E')},Square,6,12,57,6,top\n,,,,,,\nx,Square,6,99,57,6,\n`
  await page
    .getByLabel('Choose a CSV file')
    .setInputFiles({ name: 'list.csv', mimeType: 'text/csv', buffer: Buffer.from(content) })
  await page.getByLabel('Bare numbers are in').selectOption('mm')
  const isWithin = () => page.evaluate(() => document.documentElement.scrollWidth <= window.innerWidth)
  expect(await isWithin()).toBe(true)
  await page.getByRole('button', { name: 'Upload and check' }).tap()
  await expect(page.getByText('This file would add 1; 1 is rejected.')).toBeVisible(byWorker)
  for (const tab of await page.getByRole('tab').all()) {
    await tab.tap()
    expect((await tab.boundingBox())?.height).toBeGreaterThanOrEqual(44)
    expect(await isWithin(), (await tab.textContent()) ?? '').toBe(true)
  }
  for (const name of [/^Bring in/, /^Cancel the import/]) {
    const target = await page.getByRole('button', { name }).boundingBox()
    expect(target?.height).toBeGreaterThanOrEqual(44)
  }
  await page.getByText('Leave out the 1 rejected').tap()
  await page.getByRole('button', { name: 'Bring in 1' }).tap()
  await expect(page.getByText('Committed: 1 added, 1 rejected.')).toBeVisible(byWorker)
})
