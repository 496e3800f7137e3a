import type { Bench, Figure } from './runner/bench'
import type { BenchSite, Lab } from './runner/lab'
import { gzippedKb, type ScriptFile } from './runner/script-weight'
import { deskContext, sessionCookie } from './runner/session'

const signInLimitKb = 150
const gridLimitKb = 420
const gridPages = ['/cutters', '/holders', '/collets', '/extensions', '/reorder-points']

/**
 * What a browser that comes for the first time loads of scripts: every script file asked for until the page is ready
 * (signed in: the first row shows) and the network is quiet. Not counted is what belongs to other pages, which Next
 * fetches ahead for the links in view: those requests are not let through.
 */
export const bench: Bench = {
  name: 'script-size',
  run: async (lab) => {
    const site = await lab.demoSite()
    const cookie = await sessionCookie(site)
    const figures = [
      await pageFigure(lab, site, { path: '/sign-in', ready: 'button[type=submit]', limitKb: signInLimitKb }),
    ]
    for (const path of gridPages)
      figures.push(await pageFigure(lab, site, { path, ready: '.ag-row', limitKb: gridLimitKb, cookie }))
    return figures
  },
}

interface MeasuredPage {
  path: string
  ready: string
  limitKb: number
  cookie?: string
}

async function pageFigure(lab: Lab, site: BenchSite, measured: MeasuredPage): Promise<Figure> {
  const { path, ready, limitKb, cookie } = measured
  const context = await deskContext(await lab.browser(), cookie, site.address)
  try {
    const page = await context.newPage()
    const files: Promise<ScriptFile>[] = []
    await page.route('**/*', (route) => {
      return route.request().headers()['next-router-prefetch'] ? route.abort() : route.continue()
    })
    page.on('response', (response) => {
      if (response.request().resourceType() !== 'script') return
      files.push(response.body().then((body) => ({ url: response.url(), body })))
    })
    await page.goto(`${site.address}${path}`)
    await page.locator(ready).first().waitFor()
    await page.waitForLoadState('networkidle')
    const loaded = await Promise.all(files)
    return {
      name: path,
      value: gzippedKb(loaded),
      unit: 'KB',
      limit: { atMost: limitKb },
      samples: 1,
      note: `${loaded.length} script files`,
    }
  } finally {
    await context.close()
  }
}
