import { findingsOf } from '../support/accessibility'
import { deskStates } from '../support/accessible-states'
import { expect, test } from '../support/browser'
import { testEveryState } from '../support/walk-states'

testEveryState(deskStates)

test('the checker sees a fault that is put on a page, in both schemes', async ({ page }) => {
  await page.goto('/sign-in')
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible()
  await page.evaluate(() => {
    const [field, text] = [document.createElement('input'), document.createElement('p')]
    text.textContent = 'Hardly to be read'
    text.style.cssText = 'color: light-dark(#eee, #222); background: light-dark(#fff, #111)'
    document.querySelector('main')?.append(field, text)
  })
  expect((await findingsOf(page, 'light')).map((finding) => finding.split(':')[0])).toEqual([
    'color-contrast',
    'label',
  ])
  expect((await findingsOf(page, 'dark')).map((finding) => finding.split(':')[0])).toEqual(['color-contrast'])
})
