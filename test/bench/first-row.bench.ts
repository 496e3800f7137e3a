import type { Page } from '@playwright/test'
import { type Bench, ratioFigure } from './runner/bench'
import { bigShop } from './runner/big-shop'
import { deskContext, sessionCookie } from './runner/session'
import { median } from './runner/statistics'

const ratioLimit = 1.5
const warmUps = 5
const samples = 25

/**
 * The cutters page at 100,000 cutters, from the start of its loading to the first row on the screen, scripts and server
 * warm, against a page with nothing but the same grid, its modules and a first block of the same size.
 */
export const bench: Bench = {
  name: 'first-row',
  run: async (lab) => {
    const { site } = await bigShop(lab)
    const context = await deskContext(await lab.browser(), await sessionCookie(site), site.address)
    try {
      const page = await context.newPage()
      await page.addInitScript({ content: noteFirstRow })
      const times: { ours: number[]; bare: number[] } = { ours: [], bare: [] }
      for (let at = -warmUps; at < samples && !lab.signal.aborted; at += 1) {
        const ours = await firstRowMs(page, `${site.address}/cutters`)
        const bare = await firstRowMs(page, `${site.address}/bench/grid`)
        if (at < 0) continue
        times.ours.push(ours)
        times.bare.push(bare)
      }
      const sides = { ours: median(times.ours), other: median(times.bare), unit: 'ms' as const }
      return [ratioFigure('cutters page, first row shown, median', sides, ratioLimit, samples)]
    } finally {
      await context.close()
    }
  },
}

/**
 * In the page: looks at every frame whether a row with its code is there, and notes when it first was. As text, since
 * what compiles this file would put names of its own into a function.
 */
const noteFirstRow = `
  const look = () => {
    const cell = document.querySelector('.ag-row .ag-cell[col-id="code"]')
    if (cell && /\\w/.test(cell.textContent ?? '')) window.firstRowMs = performance.now()
    else requestAnimationFrame(look)
  }
  requestAnimationFrame(look)
`

async function firstRowMs(page: Page, url: string): Promise<number> {
  await page.goto(url)
  await page.locator('.ag-row .ag-cell[col-id="code"]', { hasText: /\w/ }).first().waitFor()
  await page.waitForLoadState('networkidle')
  const time = await page.evaluate(() => (window as typeof window & { firstRowMs?: number }).firstRowMs)
  if (time === undefined) throw new Error(`${url} showed a row and noted no time.`)
  return time
}
