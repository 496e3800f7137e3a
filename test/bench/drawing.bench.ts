import { type Browser, expect, type Page } from '@playwright/test'
import type { Bench, FigureUnit } from './runner/bench'
import { type StepTime, stepTimes, traceCategories } from './runner/drag-trace'
import type { Lab } from './runner/lab'
import { deskContext, sessionCookie } from './runner/session'
import { percentile } from './runner/statistics'

const limitMs = 8
const warmUpSteps = 100
const measuredSteps = 400
/** About two frames, so that what a step brings about is done before the next. */
const pauseMs = 32

const ball = 'c.form=ball&c.DC=6&c.APMX=12&c.LCF=12&c.DMM=6&c.OAL=80'
const chuck = 'h.A=100&h.depth=75&h.grip=10&h.segments=nut:18x28'
const check = `/reach?depth=30&stickout=40&${ball}&${chuck}`

/**
 * The stick-out dragged up and down on the real page by real pointer events. A step is all that the page's main thread
 * does from one pointer move to the next: the handler, React, layout and paint. Its processor time is held to the limit,
 * which on a machine with time to spare is what the step takes; the time by the clock is reported beside it.
 */
export const bench: Bench = {
  name: 'drawing',
  run: async (lab) => {
    const site = await lab.demoSite()
    const context = await deskContext(await lab.browser(), await sessionCookie(site), site.address)
    try {
      const page = await context.newPage()
      await page.goto(`${site.address}${check}`)
      const steps = await dragStickOut(lab, await lab.browser(), page)
      const figure = (name: string, of: (step: StepTime) => number, share: number) => ({
        name,
        value: percentile(steps.map(of), share),
        unit: 'ms' as FigureUnit,
        samples: steps.length,
      })
      return [
        { ...figure('a step, p95', (step) => step.processorMs, 0.95), limit: { atMost: limitMs } },
        { ...figure('a step, median', (step) => step.processorMs, 0.5), limit: null },
        { ...figure('a step by the clock, p95', (step) => step.clockMs, 0.95), limit: null },
      ]
    } finally {
      await context.close()
    }
  },
}

async function dragStickOut(lab: Lab, browser: Browser, page: Page): Promise<StepTime[]> {
  const handle = page.getByRole('slider', { name: 'Stick-out', exact: true })
  const box = await handle.boundingBox()
  if (!box) throw new Error('The handle of the stick-out is not on the page.')
  const [x, y] = [box.x + box.width / 2, box.y + box.height / 2]
  await page.mouse.move(x, y)
  await page.mouse.down()
  const drag = async (count: number) => {
    for (let at = 1; at <= count && !lab.signal.aborted; at += 1) {
      await page.mouse.move(x, y - sweepPx(at))
      await page.waitForTimeout(pauseMs)
    }
  }
  await drag(warmUpSteps)
  await browser.startTracing(page, { categories: [...traceCategories] })
  await drag(measuredSteps)
  const trace = await browser.stopTracing()
  const dragged = Number(await handle.getAttribute('aria-valuenow'))
  await page.mouse.up()
  expect(dragged, 'the stick-out that was dragged').toBeGreaterThan(40)
  return stepTimes(trace.toString())
}

/** Up and down again between 6 and 66 px, 6 px a step, so that every step changes the drawing. */
function sweepPx(step: number): number {
  const place = step % 20
  return 6 * (place <= 10 ? place + 1 : 21 - place)
}
