import AxeBuilder from '@axe-core/playwright'
import type { Page } from '@playwright/test'
import { uniqueCode } from '../support/api'
import { expect, signIn, test } from '../support/browser'

/** What the worker brings about, on a machine that is busy with other tests. */
const byWorker = { timeout: 30_000 }

const head = 'Tool #,Type,Dia,LOC,OAL,Shank Dia,Shelf\n'
const row = (code: string, oal = '3') => `${code},Square,1/2,1,${oal},1/2,top\n`

test.beforeEach(({ page }) => signIn(page, 'cribManager'))

async function upload(page: Page, content: string, name = 'list.csv'): Promise<void> {
  await page.goto('/imports/new')
  await page.getByLabel('Bare numbers are in').selectOption('in')
  await page
    .getByLabel('Choose a CSV file')
    .setInputFiles({ name, mimeType: 'text/csv', buffer: Buffer.from(content) })
  await page.getByRole('button', { name: 'Upload and check' }).click()
}

async function expectNoFaults(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze()
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual([])
}

test('a file is checked, its rejects stand with line, column, value and reason, and it goes in without them', async ({
  page,
}) => {
  const [good, bad] = [uniqueCode('E2E'), uniqueCode('E2E')]
  await upload(page, head + row(good) + row(bad, 'long'))
  await expect(page.getByText('This file would add 1; 1 is rejected.')).toBeVisible(byWorker)
  await expect(page.getByText('One column is left out: Shelf.')).toBeVisible()
  const reject = page.getByRole('row').filter({ hasText: 'long' })
  await expect(reject.getByRole('cell')).toHaveText([/3/, 'OAL', 'long', /is not a length/])
  await expectNoFaults(page)

  const download = page.waitForEvent('download')
  await page.getByRole('link', { name: 'Rejected rows as CSV' }).click()
  expect((await download).suggestedFilename()).toBe('list-rejects.csv')

  const commit = page.getByRole('button', { name: 'Bring in 1' })
  await expect(commit).toBeDisabled()
  await page.getByLabel('Leave out the 1 rejected').check()
  await commit.click()
  await expect(page.getByText('Committed: 1 added, 1 rejected.')).toBeVisible(byWorker)
  await page.getByRole('link', { name: 'See the cutters' }).click()
  await expect(page).toHaveURL(/\/cutters(?:\?|$)/, byWorker)
})

test('a heading nobody knows is said once, checked again, and known the next time', async ({ page }) => {
  const heading = uniqueCode('Heading')
  const content = (code: string) => `${heading},form,dc,apmx,oal,dmm\n${code},square,1/2,1,3,1/2\n`
  await upload(page, content(uniqueCode('E2E')))
  await expect(page.getByText('No column gives the own code')).toBeVisible(byWorker)
  await page.getByLabel(heading, { exact: true }).selectOption({ label: 'Own code' })
  await expectNoFaults(page)
  await page.getByRole('button', { name: 'Check again' }).click()
  await expect(page.getByText('This file would add 1.')).toBeVisible(byWorker)
  await page.getByRole('button', { name: 'Bring in 1' }).click()
  await expect(page.getByText('Committed: 1 added.')).toBeVisible(byWorker)

  await upload(page, content(uniqueCode('E2E')))
  await expect(page.getByText('This file would add 1.')).toBeVisible(byWorker)
  await page.getByRole('tab', { name: /^Columns/ }).click()
  await expect(page.getByRole('row').filter({ hasText: heading })).toContainText('kept from last time')
  await page.getByRole('button', { name: 'Cancel the import' }).click()
  await page.getByRole('dialog').getByRole('button', { name: 'Cancel the import' }).click()
  await expect(page.getByText('Cancelled. Nothing was changed.')).toBeVisible()
})

test('what would change stands with before and after', async ({ page }) => {
  const code = uniqueCode('E2E')
  await upload(page, head + row(code))
  await page.getByRole('button', { name: 'Bring in 1' }).click()
  await expect(page.getByText('Committed: 1 added.')).toBeVisible(byWorker)
  await upload(page, head + row(code, '3 1/2'))
  await expect(page.getByText('This file would change 1.')).toBeVisible(byWorker)
  const changed = page.getByRole('row').filter({ hasText: code })
  await expect(changed).toContainText('Overall length')
  await expect(changed.getByRole('insertion')).toHaveText(/3\.500 in|88\.9 mm/)
})

test('a file that is no CSV is refused beside the file, and the limits stand there', async ({ page }) => {
  await page.goto('/imports/new')
  await expect(page.getByText('At most 50 MB, 200 columns, 10,000 characters a cell.')).toBeVisible()
  await expectNoFaults(page)
  await upload(page, 'PK\x03\x04 a workbook', 'list.xlsx')
  await expect(page.getByText('This is a workbook or a zip archive, not CSV.')).toBeVisible()
  await expect(page).toHaveURL(/\/imports\/new$/)
})

test('the example files are there to take', async ({ page }) => {
  await page.goto('/imports/new')
  for (const link of await page.getByRole('region', { name: 'Example files' }).getByRole('link').all()) {
    const answer = await page.request.get((await link.getAttribute('href')) ?? '')
    expect(answer.status()).toBe(200)
  }
})

test('a crib list with decimal commas and no forms goes in without an admin', async ({ page }) => {
  const [flat, quarter, wrong] = [uniqueCode('BIG'), uniqueCode('BIG'), uniqueCode('BIG')]
  const content = [
    'Code;Ø;Corner R;Cut length;Total length;Shank;Price;Where;Qty',
    `${flat};3;0;8;38;3;12,50;A1;4`,
    `${quarter};1/4";0;19;64;1/4";22,00;A3;3`,
    `${wrong};10;6;22;72;10;x;A4;2`,
  ].join('\n')
  await page.goto('/imports/new')
  await page.getByLabel('Bare numbers are in').selectOption('mm')
  await page
    .getByLabel('Choose a CSV file')
    .setInputFiles({ name: 'crib.csv', mimeType: 'text/csv', buffer: Buffer.from(content) })
  await page.getByRole('button', { name: 'Upload and check' }).click()
  await expect(page.getByText('Its numbers have a decimal comma')).toBeVisible(byWorker)
  await expect(page.getByText('3 rows, Form: Choose a form.')).toBeVisible(byWorker)
  await expect(page.getByText('The corner radius is more than half the cutting diameter.')).toBeVisible()
  await expect(page.getByText('Where and Qty say what lies where.')).toBeVisible()
  await expectNoFaults(page)

  await page.getByLabel('Form for all rows').selectOption('square')
  await page.getByRole('button', { name: 'Check again with it' }).click()
  await expect(page.getByText('This file would add 2; 1 is rejected.')).toBeVisible(byWorker)
  await page.getByRole('tab', { name: /^Added/ }).click()
  await expect(page.getByRole('row').filter({ hasText: quarter })).toContainText(/Cutting diameter 6\.35/)
  await page.getByRole('tab', { name: /^Columns/ }).click()
  await expect(page.getByLabel('Decimals in this file')).toHaveValue('comma')
  await expectNoFaults(page)

  await page.getByLabel('Leave out the 1 rejected').check()
  await page.getByRole('button', { name: 'Bring in 2' }).click()
  await page.getByRole('link', { name: 'Bring in the opening stock' }).click(byWorker)
  await expect(page).toHaveURL(/\/imports\/new\?kind=stock$/, byWorker)
})
