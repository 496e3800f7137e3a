import { execFile } from 'node:child_process'
import { mkdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { promisify } from 'node:util'
import { type Bench, ratioFigure } from './runner/bench'
import { cutterCsv } from './runner/big-catalogue'
import { importFile } from './runner/import-file'
import type { Lab } from './runner/lab'
import { sessionCookie } from './runner/session'
import { median } from './runner/statistics'

const cutterCount = 100_000
const rounds = 3
const ratioLimit = 4
const growthLimitMb = 250
/** What an import of cutters writes for good; the words of the search are kept by a trigger of the items on both sides. */
const finalTables = ['items', 'cutters']

interface Round {
  importSeconds: number
  checkedSeconds: number
  copySeconds: number
  growthMb: number
}

/**
 * 100,000 cutters in 25 columns, uploaded, checked by the worker and committed, against psql's \copy of the very rows it
 * made, already split by table, into the same tables of a fresh database, with all their indexes, checks and triggers.
 */
export const bench: Bench = {
  name: 'import',
  run: async (lab) => {
    const csv = cutterCsv(cutterCount)
    const done: Round[] = []
    for (let at = 0; at < rounds; at += 1) done.push(await measureRound(lab, csv, at))
    const middle = (of: (round: Round) => number) => median(done.map(of))
    const reading = middle(({ checkedSeconds }) => checkedSeconds).toFixed(1)
    return [
      ratioFigure(
        `${cutterCount.toLocaleString('en')} cutters, from file to committed`,
        {
          ours: middle(({ importSeconds }) => importSeconds),
          other: middle(({ copySeconds }) => copySeconds),
          unit: 's',
        },
        ratioLimit,
        rounds,
        `read and checked after ${reading} s`,
      ),
      {
        name: 'memory the worker grows by',
        value: Math.max(...done.map(({ growthMb }) => growthMb)),
        unit: 'MB',
        limit: { atMost: growthLimitMb },
        samples: rounds,
      },
    ]
  },
}

async function measureRound(lab: Lab, csv: string, at: number): Promise<Round> {
  const site = await lab.startSite(await lab.createDatabase())
  const cookie = await sessionCookie(site)
  const before = residentMb(site.workerPid)
  const { checkedSeconds, committedSeconds } = await importFile(site, cookie, 'cutters', csv)
  const growthMb = residentMb(site.workerPid).highest - before.now
  await site.stop()
  const copySeconds = await copySplitRows(lab, site.databaseUrl, at)
  lab.say(`round ${at + 1}: ${committedSeconds.toFixed(1)} s, \\copy ${copySeconds.toFixed(1)} s`)
  return { importSeconds: committedSeconds, checkedSeconds, copySeconds, growthMb }
}

async function copySplitRows(lab: Lab, importedUrl: string, round: number): Promise<number> {
  const folder = join(lab.folder, `copy-${round}`)
  mkdirSync(folder, { mode: 0o700 })
  const freshUrl = await lab.createDatabase()
  const copies: string[] = []
  for (const table of finalTables) {
    const file = join(folder, table)
    const columns = await writtenColumns(importedUrl, table)
    const id = table === 'items' ? 'id' : 'item_id'
    const rows = `select ${columns} from ${table} where ${id} > ${await lastItem(freshUrl)} order by ${id}`
    await psql(importedUrl, `\\copy (${rows}) to '${file}'`)
    copies.push(`\\copy ${table} (${columns}) from '${file}'`)
  }
  const startedAt = performance.now()
  await psql(freshUrl, ...copies)
  const seconds = (performance.now() - startedAt) / 1000
  const copied = await psql(freshUrl, "select count(*) from cutters where item_kind = 'cutter'")
  if (Number(copied) < cutterCount) throw new Error(`\\copy brought ${copied} cutters.`)
  return seconds
}

const lastItem = (url: string) => psql(url, 'select max(id) from items')

/** All columns but those the database works out by itself. */
function writtenColumns(url: string, table: string): Promise<string> {
  return psql(
    url,
    `select string_agg(attname, ', ' order by attnum) from pg_attribute
      where attrelid = '${table}'::regclass and attnum > 0 and not attisdropped and attgenerated = ''`,
  )
}

/** Runs commands in one transaction. */
async function psql(url: string, ...commands: string[]): Promise<string> {
  const argv = ['--no-psqlrc', '--quiet', '--tuples-only', '--no-align', '--single-transaction']
  for (const command of commands) argv.push('--command', command)
  const { stdout } = await promisify(execFile)('psql', [...argv, '--set', 'ON_ERROR_STOP=1', url])
  return stdout.trim()
}

/** A process's memory now and at its highest, as Linux counts it. */
function residentMb(pid: number): { now: number; highest: number } {
  const status = readFileSync(`/proc/${pid}/status`, 'utf8')
  const of = (name: string) => Number(new RegExp(`${name}:\\s+(\\d+)`).exec(status)?.[1]) / 1024
  return { now: of('VmRSS'), highest: of('VmHWM') }
}
