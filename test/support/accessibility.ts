import AxeBuilder from '@axe-core/playwright'
import { expect, type Page } from '@playwright/test'

const ruleTags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']

/** Those of these rules that look at colours, which are all that the dark scheme changes. */
const colourRules = ['color-contrast', 'link-in-text-block']

export type ColorScheme = 'light' | 'dark'

/** What breaks WCAG 2.2 AA on the page as it stands, each with the element it is about. Nothing is passed over. */
export async function findingsOf(page: Page, colorScheme: ColorScheme): Promise<string[]> {
  await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' })
  // Legacy mode spares a blank page for every check; it only matters where there are frames of another origin.
  const checker = new AxeBuilder({ page }).options({ resultTypes: ['violations'] }).setLegacyMode(true)
  const chosen = colorScheme === 'light' ? checker.withTags(ruleTags) : checker.withRules(colourRules)
  const { violations } = await chosen.analyze()
  return violations.flatMap(({ id, nodes }) =>
    nodes.map(({ html, failureSummary }) => `${id}: ${html} ${failureSummary ?? ''}`),
  )
}

/** Holds the page as it stands to the rules, light and dark. */
export async function expectAccessible(page: Page, state: string): Promise<void> {
  for (const colorScheme of ['light', 'dark'] as const)
    expect.soft(await findingsOf(page, colorScheme), `${state}, ${colorScheme}`).toEqual([])
}
