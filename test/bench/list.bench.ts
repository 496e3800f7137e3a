import pg from 'pg'
import { type Bench, type Figure, ratioFigure } from './runner/bench'
import { bigShop } from './runner/big-shop'
import type { BenchSite, Lab } from './runner/lab'
import { type ListView, listViews, type Statement } from './runner/list-statements'
import { answerTimes } from './runner/load'
import { sessionCookie } from './runner/session'
import { percentile } from './runner/statistics'

const share = 0.975
const ratioLimit = 1.5
const sqlLimitMs = 100
const rounds = 8
const roundSeconds = 3
const warmUpSeconds = 3
const sqlRuns = 200
const sqlWarmUps = 20

const viewNames: Readonly<Record<ListView, string>> = {
  plain: 'plain',
  filtered: 'filtered with search',
  jump: 'a jump to row 90,000',
}

/**
 * Views of the cutter list at 100,000 cutters, ten connections at once, against a bare route of the same server that
 * runs the same statements and answers their rows: what is between is session, permission, query, mapping and checked
 * answer. The two are asked in turn. Then the statements alone, one connection and nothing else going on.
 */
export const bench: Bench = {
  name: 'list',
  run: async (lab) => {
    const { site, statements } = await bigShop(lab)
    const cookie = await sessionCookie(site)
    const figures: Figure[] = []
    for (const view of Object.keys(listViews) as ListView[]) {
      figures.push(await routeFigure(lab, site, cookie, view))
      figures.push(await sqlFigure(site, view, statements[view]))
    }
    return figures
  },
}

async function routeFigure(lab: Lab, site: BenchSite, cookie: string, view: ListView): Promise<Figure> {
  const ours = `${site.address}/api/cutters?${listViews[view]}`
  const bare = `${site.address}/api/bench/list?view=${view}`
  const times: { ours: number[]; bare: number[] } = { ours: [], bare: [] }
  await answerTimes(ours, { cookie }, warmUpSeconds)
  await answerTimes(bare, { cookie }, warmUpSeconds)
  for (let round = 0; round < rounds && !lab.signal.aborted; round += 1) {
    times.ours.push(...(await answerTimes(ours, { cookie }, roundSeconds)))
    times.bare.push(...(await answerTimes(bare, { cookie }, roundSeconds)))
  }
  const sides = {
    ours: percentile(times.ours, share),
    other: percentile(times.bare, share),
    unit: 'ms' as const,
  }
  const perSecond = ({ length }: number[]) => Math.round(length / rounds / roundSeconds)
  const note = `${perSecond(times.ours)} answers a second, bare ${perSecond(times.bare)}`
  const samples = Math.min(times.ours.length, times.bare.length)
  return ratioFigure(`${viewNames[view]}, p97.5`, sides, ratioLimit, samples, note)
}

async function sqlFigure(site: BenchSite, view: ListView, statements: readonly Statement[]): Promise<Figure> {
  const database = new pg.Client({ connectionString: site.databaseUrl })
  await database.connect()
  const times: number[] = []
  for (let run = -sqlWarmUps; run < sqlRuns; run += 1) {
    const startedAt = performance.now()
    for (const { sql, bindings } of statements) await database.query(sql, bindings)
    if (run >= 0) times.push(performance.now() - startedAt)
  }
  await database.end()
  return {
    name: `${viewNames[view]}, its ${statements.length} statements alone, p97.5`,
    value: percentile(times, share),
    unit: 'ms',
    limit: { atMost: sqlLimitMs },
    samples: sqlRuns,
  }
}
