import AxeBuilder from '@axe-core/playwright'
import type { Page } from '@playwright/test'
import { uniqueCode } from '../support/api'
import { squareCutter } from '../support/api-stock'
import { chooseMore, expect, signIn, test } from '../support/browser'

const dialog = (page: Page) => page.getByRole('dialog')

/** More than one block of the list, so that some of it is never loaded. */
async function makeCutters(page: Page, maker: string, count: number): Promise<void> {
  const wide = squareCutter({ maker })
  for (let done = 0; done < count; done += 15) {
    const made = Array.from({ length: Math.min(15, count - done) }, () =>
      page.request.post('/api/cutters', { data: { ...wide, code: uniqueCode('FND') } }),
    )
    for (const answer of await Promise.all(made)) expect(answer.status()).toBe(201)
  }
}

/** How many cutters of a maker have this description. */
async function described(page: Page, maker: string, description: string): Promise<number> {
  const query = new URLSearchParams({ maker, description })
  return (await (await page.request.get(`/api/cutters?${query}`)).json()).total
}

async function askFor(page: Page, field: string, value: string): Promise<void> {
  await dialog(page).getByLabel('Field').selectOption(field)
  await dialog(page).getByLabel(/^To/).fill(value)
  await dialog(page)
    .getByRole('button', { name: /^See what would change$|^Look again$/ })
    .click()
}

test.beforeEach(async ({ page }) => {
  await signIn(page, 'cribManager')
})

test('one field of everything found is changed, also what was never scrolled to, and taken back', async ({
  page,
}) => {
  const maker = uniqueCode('FOUND')
  await makeCutters(page, maker, 110)
  await page.goto(`/cutters?maker=${maker}`)
  await expect(page.getByText('110 found')).toBeVisible()
  await chooseMore(page, 'Change all found')
  await askFor(page, 'description', 'for steel')
  await expect(dialog(page).getByText('110 cutters found: 110 would change.')).toBeVisible()
  expect(await described(page, maker, 'for steel')).toBe(0)
  expect((await new AxeBuilder({ page }).analyze()).violations.map(({ id }) => id)).toEqual([])
  await dialog(page).getByRole('button', { name: 'Change 110 cutters' }).click()
  await expect(dialog(page).getByText('110 cutters changed.')).toBeVisible()
  expect(await described(page, maker, 'for steel')).toBe(110)
  await dialog(page).getByRole('button', { name: 'Take it back' }).click()
  await expect(dialog(page).getByText('as it was before')).toBeVisible()
  expect(await described(page, maker, 'for steel')).toBe(0)
})

test('rows that cannot be so are told with the reason, and nothing is changed', async ({ page }) => {
  const maker = uniqueCode('FOUND')
  await makeCutters(page, maker, 3)
  await page.goto(`/cutters?maker=${maker}`)
  await chooseMore(page, 'Change all found')
  await askFor(page, 'lengthOfCutMm', '900')
  await expect(dialog(page).getByText('3 cutters found; 3 of them cannot be so')).toBeVisible()
  await expect(dialog(page).getByRole('listitem').filter({ hasText: 'Length of cut' })).toContainText('FND-')
  await expect(dialog(page).getByRole('button', { name: /^Change \d/ })).toHaveCount(0)
  await askFor(page, 'lengthOfCutMm', 'half')
  await expect(dialog(page).getByLabel(/^To/)).toHaveAccessibleDescription(/is not a length/)
})

test('a change of what someone else changed since is refused in a sentence, and can be looked at again', async ({
  page,
}) => {
  const maker = uniqueCode('FOUND')
  await makeCutters(page, maker, 2)
  await page.goto(`/cutters?maker=${maker}`)
  await chooseMore(page, 'Change all found')
  await askFor(page, 'description', 'mine')
  await expect(dialog(page).getByRole('button', { name: 'Change 2 cutters' })).toBeVisible()
  await makeCutters(page, maker, 1)
  await dialog(page).getByRole('button', { name: 'Change 2 cutters' }).click()
  await expect(dialog(page).getByText('3 cutters are found now, not 2. Nothing was changed')).toBeVisible()
  await dialog(page).getByRole('button', { name: 'Look again' }).click()
  await expect(dialog(page).getByRole('button', { name: 'Change 3 cutters' })).toBeVisible()
})

test('while the list is edited, undo takes a change of everything found back as well', async ({ page }) => {
  const maker = uniqueCode('FOUND')
  await makeCutters(page, maker, 2)
  await page.goto(`/cutters?maker=${maker}&columns=code,description`)
  await page.getByRole('button', { name: 'Edit in the list' }).click()
  await page.getByRole('button', { name: 'Change all 2 found' }).click()
  await askFor(page, 'description', 'for steel')
  await dialog(page).getByRole('button', { name: 'Change 2 cutters' }).click()
  await dialog(page).getByRole('button', { name: 'Back to the list' }).click()
  const cells = page.locator('.ag-grid-scrolling-container .ag-row [col-id="description"]')
  await expect(cells).toHaveText(['for steel', 'for steel'])
  await page.getByRole('button', { name: 'Undo: Description of 2 cutters' }).click()
  await expect(cells).toHaveText(['', ''])
})
