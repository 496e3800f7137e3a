import { chromium as playwright } from '@playwright/test'
import lighthouse, { desktopConfig } from 'lighthouse'
import { findFreePort } from '@/server/launch/ports'
import { chromium } from '../support/chromium'
import type { Bench, Figure } from './runner/bench'
import { sessionCookie } from './runner/session'
import { median } from './runner/statistics'

const runs = 5
const limit = { atLeast: 95 }
const pages = [
  { path: '/sign-in', isOpen: true },
  { path: '/cutters', isOpen: false },
  { path: '/reach', isOpen: false },
]
/** The categories a limit stands for; the others are reported. */
const limited = ['accessibility', 'best-practices']

/** Lighthouse as for a desk, the median of five runs a page; it measures with Debian's browser and calls nobody. */
export const bench: Bench = {
  name: 'lighthouse',
  run: async (lab) => {
    const site = await lab.demoSite()
    const cookie = await sessionCookie(site)
    const port = await findFreePort()
    const browser = await playwright.launch({
      ...chromium,
      args: [...chromium.args, `--remote-debugging-port=${port}`],
    })
    try {
      const figures: Figure[] = []
      for (const { path, isOpen } of pages) {
        const headers: Record<string, string> = isOpen ? {} : { Cookie: cookie }
        const scores = new Map<string, number[]>()
        for (let run = 0; run < runs && !lab.signal.aborted; run += 1) {
          for (const [category, score] of await scoresOf(`${site.address}${path}`, port, headers))
            scores.set(category, [...(scores.get(category) ?? []), score])
        }
        figures.push(...pageFigures(path, scores))
      }
      return figures
    } finally {
      await browser.close()
    }
  },
}

async function scoresOf(
  url: string,
  port: number,
  extraHeaders: Record<string, string>,
): Promise<[string, number][]> {
  const result = await lighthouse(url, { port, extraHeaders, logLevel: 'silent' }, desktopConfig)
  const report = result?.lhr
  if (!report || report.runtimeError)
    throw new Error(`${url}: ${report?.runtimeError?.message ?? 'no report'}`)
  if (new URL(report.finalDisplayedUrl).pathname !== new URL(url).pathname)
    throw new Error(`${url} led to ${report.finalDisplayedUrl}.`)
  return Object.values(report.categories).map(({ id, score }) => [id, (score ?? 0) * 100])
}

function pageFigures(path: string, scores: ReadonlyMap<string, number[]>): Figure[] {
  return [...scores].map(([category, values]) => ({
    name: `${path}, ${category}`,
    value: Math.round(median(values)),
    unit: 'points',
    limit: limited.includes(category) ? limit : null,
    samples: values.length,
  }))
}
