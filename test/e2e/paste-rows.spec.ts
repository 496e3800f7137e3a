import type { Page } from '@playwright/test'
import { uniqueCode } from '../support/api'
import { chooseMore, expect, signIn, test } from '../support/browser'

/** What the browser does at Ctrl+V with a block of a spreadsheet on the clipboard. */
function paste(page: Page, text: string): Promise<void> {
  return page.evaluate((pasted) => {
    const clipboardData = new DataTransfer()
    clipboardData.setData('text/plain', pasted)
    document.body.dispatchEvent(new ClipboardEvent('paste', { clipboardData, bubbles: true }))
  }, text)
}

test.beforeEach(async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.goto('/cutters')
  await expect(page.locator('.ag-grid-scrolling-container .ag-row').first()).toBeVisible()
})

test('a block pasted over the list goes through the checks of an import', async ({ page }) => {
  const code = uniqueCode('PST')
  await paste(page, `Tool #\tType\tDia\tLOC\tOAL\tShank Dia\r\n${code}\tSquare\t6\t12\t57\t6\r\n`)
  const dialog = page.getByRole('dialog')
  await expect(dialog.getByText('1 row, 6 columns.')).toBeVisible()
  await dialog.getByRole('button', { name: 'Check these rows' }).click()
  await expect(page).toHaveURL(/\/imports\/\d+/)
  await expect(page.getByText('pasted-rows.tsv').first()).toBeVisible()
  await expect(page.getByRole('button', { name: /^Bring in/ })).toBeEnabled()
  const list = await (await page.request.get(`/api/cutters?code=${code}`)).json()
  expect(list.total).toBe(0)
})

test('a block of 5,000 columns is refused in a sentence, and stays to be mended', async ({ page }) => {
  const wide = Array.from({ length: 5000 }, (_, index) => `c${index}`).join('\t')
  await chooseMore(page, 'Paste rows')
  const dialog = page.getByRole('dialog')
  const rows = dialog.getByRole('textbox', { name: 'Rows' })
  await rows.fill(`${wide}\n1\t2`)
  await dialog.getByRole('button', { name: 'Check these rows' }).click()
  await expect(rows).toHaveAccessibleDescription(/5,000 columns; at most 200/)
  await expect(rows).toHaveValue(/^c0\tc1/)
  const sent = await page.request.post('/api/imports', {
    multipart: {
      kind: 'cutters',
      file: { name: 'wide.tsv', mimeType: 'text/plain', buffer: Buffer.from(`${wide}\n1\t2\n`) },
    },
  })
  expect(sent.status()).toBe(422)
  expect((await sent.json()).detail).toBe('This file has more than 200 columns.')
})

test('ten thousand rows are taken at once and shown by their first, quotes and all', async ({ page }) => {
  const lines = Array.from({ length: 10_000 }, (_, row) => `X-${row}\tSquare\t6,35\t"1/2"" shank"`)
  await paste(page, `Tool #\tType\tDia\tNotes\n${lines.join('\n')}`)
  const dialog = page.getByRole('dialog')
  await expect(dialog.getByText('10,000 rows, 4 columns.')).toBeVisible()
  await expect(dialog.getByRole('row').nth(1).getByRole('cell')).toHaveText([
    'X-0',
    'Square',
    '6,35',
    '1/2" shank',
  ])
  await dialog.getByRole('button', { name: 'Paste other rows' }).click()
  await expect(dialog.getByRole('textbox', { name: 'Rows' })).toHaveValue('')
})

test('a line of headings alone is refused at the rows', async ({ page }) => {
  await chooseMore(page, 'Paste rows')
  const dialog = page.getByRole('dialog')
  const rows = dialog.getByRole('textbox', { name: 'Rows' })
  await dialog.getByRole('button', { name: 'Check these rows' }).click()
  await expect(rows).toHaveAccessibleDescription(/nothing here yet/)
  await rows.fill('Code\tDia\n')
  await expect(rows).toHaveAccessibleDescription(/only a line of headings/)
  await rows.fill('Code\tDia\nA\t6\tmore\n')
  await expect(dialog.getByText('1 row has more cells than there are headings')).toBeVisible()
})

test('rows pasted without headings are all tools, and the choice can be changed', async ({ page }) => {
  await paste(
    page,
    `${uniqueCode('PST')}\tSquare\t6\t12\t57\t6\r\n${uniqueCode('PST')}\tSquare\t8\t19\t63\t8\r\n`,
  )
  const dialog = page.getByRole('dialog')
  await expect(dialog.getByRole('radio', { name: 'a row of the list' })).toBeChecked()
  await expect(dialog.getByText('2 rows, 6 columns.')).toBeVisible()
  await dialog.getByRole('radio', { name: 'headings' }).check()
  await expect(dialog.getByText('1 row, 6 columns.')).toBeVisible()
})
