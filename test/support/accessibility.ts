import AxeBuilder from '@axe-core/playwright'
import { expect, type Page } from '@playwright/test'

const ruleTags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']

interface Exclusion {
  rule: string
  /** What the library makes; its own code is not ours to change. */
  within: string
  reason: string
}

/** The whole list of what the checker is told to pass over. */
const exclusions: readonly Exclusion[] = []

/** What the checker finds against WCAG 2.2 AA on the page as it stands, each with the element it is about. */
async function findingsOf(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).withTags(ruleTags).analyze()
  const found = violations.flatMap(({ id, nodes }) =>
    nodes.map(({ html, target, failureSummary }) => ({ id, html, selector: String(target), failureSummary })),
  )
  const counted: string[] = []
  for (const { id, html, selector, failureSummary } of found) {
    if (!(await isExcluded(page, id, selector))) counted.push(`${id}: ${html} ${failureSummary ?? ''}`)
  }
  return counted
}

async function isExcluded(page: Page, rule: string, selector: string): Promise<boolean> {
  for (const exclusion of exclusions) {
    if (exclusion.rule !== rule) continue
    const isWithin = await page
      .locator(selector)
      .first()
      .evaluate((element, within) => element.closest(within) !== null, exclusion.within)
    if (isWithin) return true
  }
  return false
}

/** Holds the page as it stands to the rules, light and dark. */
export async function expectAccessible(page: Page, state: string): Promise<void> {
  for (const colorScheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' })
    expect.soft(await findingsOf(page), `${state}, ${colorScheme}`).toEqual([])
  }
}
