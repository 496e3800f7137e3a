import { setTimeout as sleep } from 'node:timers/promises'
import type { BenchSite } from './lab'

const lookMs = 50
const patienceMs = 10 * 60_000

/** Uploads a file, has it checked and committed as a person would, and answers how long that took. */
export async function importFile(
  site: BenchSite,
  cookie: string,
  kind: 'cutters' | 'stock',
  content: string,
): Promise<{ checkedSeconds: number; committedSeconds: number }> {
  const form = new FormData()
  form.set('kind', kind)
  form.set('unit', 'mm')
  form.set('file', new File([content], `${kind}.csv`))
  const startedAt = performance.now()
  const seconds = () => (performance.now() - startedAt) / 1000
  const { id } = await send(site, cookie, '/api/imports', { method: 'POST', body: form })
  await importIn(site, cookie, id, 'checked')
  const checkedSeconds = seconds()
  await send(site, cookie, `/api/imports/${id}/commit`, {
    method: 'POST',
    body: '{}',
    headers: { 'content-type': 'application/json' },
  })
  await importIn(site, cookie, id, 'committed')
  return { checkedSeconds, committedSeconds: seconds() }
}

interface ImportAnswer {
  id: string
  state: string
  rejectedCount: number
}

async function importIn(site: BenchSite, cookie: string, id: string, state: string): Promise<void> {
  for (const end = Date.now() + patienceMs; Date.now() < end; await sleep(lookMs)) {
    const found = await send(site, cookie, `/api/imports/${id}`)
    if (found.state === 'failed' || found.rejectedCount > 0)
      throw new Error(`The import is ${found.state}, with ${found.rejectedCount} rejected.`)
    if (found.state === state) return
  }
  throw new Error(`The import did not become ${state}.`)
}

async function send(
  { address }: BenchSite,
  cookie: string,
  path: string,
  request: { method?: string; body?: BodyInit; headers?: Record<string, string> } = {},
): Promise<ImportAnswer> {
  const answer = await fetch(`${address}${path}`, { ...request, headers: { cookie, ...request.headers } })
  if (!answer.ok) throw new Error(`${path} answered ${answer.status}: ${await answer.text()}`)
  return (await answer.json()) as ImportAnswer
}
