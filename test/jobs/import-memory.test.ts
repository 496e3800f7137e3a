import { type ChildProcess, spawn } from 'node:child_process'
import { readFileSync } from 'node:fs'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { createImportSite, type ImportSite } from '../support/import-site'

const rowCount = 100_000
const growthLimitMb = 250
const patienceMs = 180_000

let site: ImportSite
let worker: ChildProcess

beforeAll(async () => {
  site = await createImportSite()
  const argv = ['--conditions=react-server', '--import', 'tsx', 'src/server/worker.ts']
  worker = spawn(process.execPath, argv, {
    env: { ...process.env, LOG_LEVEL: 'info' },
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  await new Promise<void>((resolve) => {
    worker.stdout?.on('data', (text: Buffer) => {
      if (text.includes('worker ready')) resolve()
    })
  })
})
afterAll(async () => {
  worker.kill('SIGKILL')
  await site.close()
})

/** Resident memory now and at its highest, from Linux itself. */
function memoryMb(): { now: number; highest: number } {
  const status = readFileSync(`/proc/${worker.pid}/status`, 'utf8')
  const of = (name: string) => Number(new RegExp(`${name}:\\s+(\\d+)`).exec(status)?.[1]) / 1024
  return { now: of('VmRSS'), highest: of('VmHWM') }
}

function* bigFile(): Generator<string> {
  const notes = Array.from({ length: 8 }, (_, at) => `Note ${at + 1}`)
  yield `Tool #,Description,Mfr,Mfr P/N,Type,Dia (mm),Corner Rad.,LOC,Flute Len,Neck Dia,LU,OAL,Shank Dia,# Flutes,Material,Price,RPMX,${notes.join()}`
  for (let at = 0; at < rowCount; at += 1) {
    yield `\r\nBIG-${at},"End mill, number ${at} of a long list",Norrhult,N-${at},Corner radius,${6 + (at % 7)},0.5,12.5,14,5.5,30,72,6,4,Carbide,18.50,18000,${at},b,c,d,e,f,g,a longer note about ${at}`
  }
}

it(`it reads ${rowCount} rows of 25 columns while the worker grows by at most ${growthLimitMb} MB`, async () => {
  const before = memoryMb()
  const id = await site.upload({ kind: 'cutters', unit: 'mm', content: [...bigFile()].join('') })
  const end = Date.now() + patienceMs
  while ((await site.get(id)).state === 'reading' && Date.now() < end) {
    await new Promise((resolve) => setTimeout(resolve, 500))
  }
  expect(await site.get(id)).toMatchObject({
    state: 'checked',
    rows: rowCount,
    added: rowCount,
    rejectedCount: 0,
  })
  expect(memoryMb().highest - before.now).toBeLessThan(growthLimitMb)
  process.stdout.write(`worker grew by ${Math.round(memoryMb().highest - before.now)} MB\n`)
}, 200_000)
