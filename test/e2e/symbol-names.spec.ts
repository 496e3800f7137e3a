import type { Page } from '@playwright/test'
import { signedInAs } from '../support/api'
import { createCutter } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'

const shownName = (page: Page) => page.locator('[popover]:popover-open')

test.beforeEach(async ({ page }) => {
  await signIn(page, 'cribManager')
})

test('a heading of the list tells its symbol’s name under the pointer and by keyboard, until Escape', async ({
  page,
}) => {
  await page.goto('/cutters')
  await expect(page.locator('[row-id]').first()).toBeVisible()
  const heading = page.getByRole('columnheader', { name: 'Reach length (LU)' })
  await heading.hover()
  await expect(shownName(page)).toHaveText('Reach length. LU: usable length (ISO 13399)')
  await shownName(page).hover()
  await page.waitForTimeout(500)
  await expect(shownName(page)).toBeVisible()
  await page.keyboard.press('Escape')
  await expect(shownName(page)).toHaveCount(0)
  await page.keyboard.press('/')
  await page.keyboard.press('ArrowDown')
  await page.keyboard.press('ArrowUp')
  for (let moves = 0; moves < 2; moves += 1) await page.keyboard.press('ArrowRight')
  await expect(shownName(page)).toHaveText('Cutting diameter. DC: cutting diameter (ISO 13399)')
})

test('a field tells its symbol’s name while the keyboard is in it; Escape takes the name away and not the form', async ({
  page,
}) => {
  await page.goto('/cutters')
  await page.getByRole('button', { name: 'Add a cutter' }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByRole('textbox', { name: /^Length of cut/ }).click()
  await expect(shownName(page)).toHaveCount(0)
  await page.keyboard.press('Tab')
  await expect(shownName(page)).toHaveText('LCF: length chip flute (ISO 13399)')
  await expect(dialog.getByRole('textbox', { name: /^Fluted length/ })).toHaveAccessibleDescription(
    /length chip flute/,
  )
  await page.keyboard.press('Escape')
  await expect(shownName(page)).toHaveCount(0)
  await expect(dialog).toBeVisible()
  await dialog.getByText('DC · mm').hover()
  await expect(shownName(page)).toHaveText('DC: cutting diameter (ISO 13399)')
})

test('the geometry of an item and its drawing tell the names of their symbols', async ({ page }) => {
  const id = await createCutter(await signedInAs('cribManager'))
  await page.goto(`/cutters/${id}`)
  const symbol = page.getByRole('button', { name: 'OAL' })
  await expect(symbol).toHaveAccessibleDescription('OAL: overall length (ISO 13399)')
  await symbol.focus()
  await page.keyboard.press('Shift+Tab')
  await page.keyboard.press('Tab')
  await expect(shownName(page)).toHaveText('OAL: overall length (ISO 13399)')
  await page.keyboard.press('Escape')
  await page.locator('svg [data-name]').first().hover()
  await expect(shownName(page)).toHaveText(/^[A-Z]+: .* \(ISO 13399\)$/)
})
