import { expect, type Page } from '@playwright/test'
import { expectAccessible } from './accessibility'
import { chooseMore, sidewaysOverrunPx, signIn, test } from './browser'

/** A state of a catalogue list: what is done on its page until it stands. */
export interface ListState {
  name: string
  path: string
  reach: (page: Page) => Promise<unknown>
  /** As wide as a sheet of paper, whatever the screen is. */
  isOnPaper?: true
}

const dialog = (page: Page) => page.getByRole('dialog')
const listRow = (page: Page) =>
  expect(page.locator('[row-id], main li a').filter({ visible: true }).first()).toBeVisible()

/** Opens one of the acts behind “More” and waits for its dialog. */
async function opened(page: Page, act: string): Promise<void> {
  await listRow(page)
  await chooseMore(page, act)
  await expect(dialog(page)).toBeVisible()
}

async function rehearsed(page: Page, field: string, value: string): Promise<void> {
  await opened(page, 'Change all cutters')
  await dialog(page).getByLabel('Field').selectOption(field)
  await dialog(page).getByLabel(/^To/).fill(value)
  await dialog(page).getByRole('button', { name: 'See what would change' }).click()
  await expect(dialog(page).getByText(/cutters found[:;]/)).toBeVisible()
}

async function pasted(page: Page, text: string): Promise<void> {
  await opened(page, 'Paste rows')
  await dialog(page).getByRole('textbox', { name: 'Rows' }).fill(text)
  await expect(dialog(page).getByRole('table')).toBeVisible()
}

/** What both a desk and a phone have. */
export const listStates: ListState[] = [
  {
    name: 'the menu of a list',
    path: '/cutters',
    reach: async (page) => {
      await listRow(page)
      await page.getByRole('button', { name: 'More', exact: true }).click()
      await expect(page.getByRole('menu')).toBeVisible()
    },
  },
  { name: 'views', path: '/cutters', reach: (page) => opened(page, 'Views') },
  { name: 'changing all', path: '/cutters', reach: (page) => opened(page, 'Change all cutters') },
  { name: 'changing all, rehearsed', path: '/cutters', reach: (page) => rehearsed(page, 'description', 'x') },
  {
    name: 'changing all, refused',
    path: '/cutters',
    reach: (page) => rehearsed(page, 'lengthOfCutMm', '900'),
  },
  { name: 'pasting', path: '/cutters', reach: (page) => pasted(page, 'Code\tDia\tLOC\tOAL\nA\t6\t12\t57\n') },
  { name: 'pasting, refused', path: '/cutters', reach: (page) => pasted(page, 'Code\tDia\n') },
  {
    name: 'a symbol’s name',
    path: '/cutters',
    reach: async (page) => {
      await listRow(page)
      await page.locator('[row-id] a, main li a').filter({ visible: true }).first().click()
      await page.getByRole('button', { name: 'OAL' }).click()
      await expect(page.locator('[popover]:popover-open')).toBeVisible()
    },
  },
  {
    name: 'a list printed',
    path: '/cutters',
    isOnPaper: true,
    reach: async (page) => {
      await listRow(page)
      await page.evaluate(() => window.dispatchEvent(new Event('beforeprint')))
      await page.emulateMedia({ media: 'print' })
      await expect(page.getByRole('region', { name: 'Cutters, printed' })).toBeVisible()
    },
  },
]

async function editing(page: Page): Promise<void> {
  await listRow(page)
  await page.getByRole('button', { name: 'Edit in the list' }).click()
  await expect(page.getByRole('button', { name: 'Done editing' })).toBeVisible()
}

/** What only a grid has. */
export const gridStates: ListState[] = [
  { name: 'editing in the list', path: '/cutters', reach: editing },
  {
    name: 'changing the rows selected',
    path: '/cutters',
    reach: async (page) => {
      await editing(page)
      await page.getByRole('checkbox', { name: /row/i }).first().check()
      await page.getByRole('button', { name: 'Change 1 selected' }).click()
      await expect(dialog(page)).toBeVisible()
    },
  },
  {
    name: 'all filters, with counts',
    path: '/cutters',
    reach: async (page) => {
      await listRow(page)
      await page.getByRole('button', { name: 'More filters' }).click()
      await page.getByLabel('Condition').focus()
      await expect(page.getByLabel('Condition').getByRole('option', { name: /\(/ }).first()).toBeAttached()
    },
  },
  {
    name: 'the name of a heading',
    path: '/cutters',
    reach: async (page) => {
      await listRow(page)
      await page.getByRole('columnheader', { name: 'Reach length (LU)' }).hover()
      await expect(page.locator('[popover]:popover-open')).toBeVisible()
    },
  },
  ...['/holders', '/collets', '/extensions'].map((path) => ({
    name: `${path.slice(1)}, all filters`,
    path,
    reach: async (page: Page) => {
      await listRow(page)
      await page.getByRole('button', { name: 'More filters' }).click()
      await expect(page.getByLabel('Archived')).toBeVisible()
    },
  })),
]

/** Holds every state to the rules of accessibility, light and dark, and to the width of the page. */
export function testListStates(states: readonly ListState[]): void {
  test('no rule of accessibility is broken in any state of a catalogue list', async ({ page }) => {
    test.setTimeout(300_000)
    await signIn(page, 'cribManager')
    for (const { name, path, reach, isOnPaper } of states) {
      await page.emulateMedia({ media: 'screen' })
      await page.goto(path)
      await reach(page)
      if (!isOnPaper) expect.soft(await sidewaysOverrunPx(page), name).toBe(0)
      await expectAccessible(page, name)
    }
  })
}
