import type { Browser, BrowserContext } from '@playwright/test'
import type { BenchSite } from './lab'

/** The demo shop's crib manager, who sees every page that is measured. */
const person = { email: 'crib@leadline.example', password: 'leadline-demo' }

/** Signs in and answers the cookie as a browser would send it. */
export async function sessionCookie({ address }: BenchSite): Promise<string> {
  const answer = await fetch(`${address}/api/session`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(person),
  })
  if (answer.status !== 200) throw new Error(`Signing in answered ${answer.status}.`)
  return answer.headers
    .getSetCookie()
    .map((line) => line.split(';')[0])
    .join('; ')
}

/** A browser that knows nothing but, where it is signed in, its session. */
export async function deskContext(browser: Browser, cookie = '', address = ''): Promise<BrowserContext> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } })
  const cookies = cookie.split('; ').filter(Boolean)
  await context.addCookies(
    cookies.map((pair) => {
      const at = pair.indexOf('=')
      return { name: pair.slice(0, at), value: pair.slice(at + 1), url: address }
    }),
  )
  return context
}
