import { expect, personOf, signIn, test } from '../support/browser'

const pages = ['/sign-in', '/reach', '/cutters', '/settings', '/no-such-page']

test('every page carries a policy that runs our own scripts alone, and may stand in no frame', async ({
  page,
}) => {
  await signIn(page, 'admin')
  for (const path of pages) {
    const answer = await page.request.get(path)
    const { 'content-security-policy': policy = '', ...headers } = answer.headers()
    const scripts = policy.split('; ').find((part) => part.startsWith('script-src')) ?? ''
    const nonce = /'nonce-([^']+)'/.exec(scripts)?.[1]
    expect(nonce?.length, path).toBeGreaterThanOrEqual(22)
    expect(scripts, path).not.toContain('unsafe-')
    expect(policy, path).toContain("frame-ancestors 'none'")
    expect(policy, path).toContain("object-src 'none'")
    expect(policy, path).toContain("base-uri 'none'")
    expect(headers['x-content-type-options'], path).toBe('nosniff')
    const inline = (await answer.text()).match(/<script\b[^>]*>/g) ?? []
    expect(inline.length, path).toBeGreaterThan(0)
    for (const tag of inline) expect(tag, path).toContain(`nonce="${nonce}"`)
  }
})

test('a nonce is used once', async ({ page }) => {
  const policyOf = async () => (await page.request.get('/sign-in')).headers()['content-security-policy']
  expect(await policyOf()).not.toBe(await policyOf())
})

test('a script without the nonce does not run', async ({ browser }) => {
  const page = await browser.newPage()
  await page.route('**/sign-in', async (route) => {
    const answer = await route.fetch()
    const body = (await answer.text()).replace(
      '</body>',
      '<script>document.title = "Taken over"</script></body>',
    )
    await route.fulfill({ response: answer, body })
  })
  const refused: string[] = []
  await page.exposeFunction('reportRefusal', (directive: string) => refused.push(directive))
  await page.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (event) => {
      ;(window as unknown as { reportRefusal: (directive: string) => void }).reportRefusal(
        event.effectiveDirective,
      )
    })
  })
  await page.goto('/sign-in')
  await expect.poll(() => refused).toContain('script-src-elem')
  await expect(page).toHaveTitle(/Sign in/)
  await page.close()
})

test('the session cookie is out of reach of scripts and of other sites', async ({ page, context }) => {
  const { email, password } = await personOf('machinist')
  const answer = await page.request.post('/api/session', { data: { email, password } })
  const line = answer.headers()['set-cookie'] ?? ''
  expect(line).toMatch(/; HttpOnly/i)
  expect(line).toMatch(/; SameSite=(lax|strict)/i)
  expect(line).toMatch(/; Path=\//i)
  const [cookie] = await context.cookies()
  expect(cookie).toMatchObject({ httpOnly: true })
  await page.goto('/reach')
  expect(await page.evaluate(() => document.cookie)).toBe('')
})

test('an answer of the API is not kept and not guessed at', async ({ page }) => {
  await signIn(page, 'machinist')
  for (const path of ['/api/cutters', '/api/cutters/0']) {
    const headers = (await page.request.get(path)).headers()
    expect(headers['x-content-type-options'], path).toBe('nosniff')
    expect(headers['cache-control'], path).toContain('no-store')
  }
})

test('redirects, files and answers of the API are what they say they are', async ({ request }) => {
  for (const path of ['/reach', '/examples/collets.csv', '/api/no-such-call', '/api/session']) {
    const answer = await request.get(path, { maxRedirects: 0 })
    expect(answer.headers()['x-content-type-options'], path).toBe('nosniff')
  }
})
