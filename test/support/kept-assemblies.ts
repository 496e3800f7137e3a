import { randomUUID } from 'node:crypto'
import type { Knex } from 'knex'
import { type Answer, type ApiClient, uniqueCode } from './api'
import { putOnShelf } from './api-stock'
import { createNeckedTool, type NeckedToolRows } from './shop-rows'

export interface AssemblyRows extends NeckedToolRows {
  /** A wall 25 mm deep: by hand the stick-out it needs is 39.5 mm, the gauge length 139.5 mm. */
  request: Record<string, unknown>
}

/** The necked end mill, chuck and collet of the hand cases, with stock of each in bin A-1. */
export async function createAssemblyRows(db: Knex, crib: ApiClient): Promise<AssemblyRows> {
  const rows = await createNeckedTool(db, crib)
  const { binId } = rows.shelf
  await putOnShelf(db, crib, { itemId: rows.holderId, binId, quantity: 2 })
  await putOnShelf(db, crib, { itemId: rows.colletId, binId, quantity: 2 })
  return {
    ...rows,
    request: {
      feature: { kind: 'wall', depthMm: 25 },
      cutter: { id: rows.cutterId },
      holder: { id: rows.holderId },
      collet: { id: rows.colletId },
    },
  }
}

/** Keeps it; the answer is the whole assembly. */
export function keepAssembly(
  who: ApiClient,
  rows: AssemblyRows,
  change: Record<string, unknown> = {},
): Promise<Answer> {
  return who.post('/api/assemblies', { ...rows.request, ...change })
}

/** Builds it from bin A-1. */
export function buildAssembly(
  who: ApiClient,
  rows: AssemblyRows,
  assembly: { id: string; version: number },
  change: Record<string, unknown> = {},
  key: string = randomUUID(),
): Promise<Answer> {
  const parts = ['cutter', 'collet', 'holder'].map((kind) => ({ kind, fromLocationId: rows.shelf.binId }))
  const body = { version: assembly.version, parts, ...change }
  return who.post(`/api/assemblies/${assembly.id}/build`, body, key)
}

/** A machine of the test's own, with so many pockets. */
export async function createMachine(
  db: Knex,
  pocketCount: number | null = 20,
): Promise<{ id: string; code: string; locationId: string }> {
  const code = uniqueCode('MILL')
  const [row] = await db('machines')
    .insert({
      code,
      name: `Mill ${code}`,
      taper: 'BT30',
      gauge_line_to_table_mm: 600,
      z_travel_mm: 450,
      maximum_rpm: 12_000,
      pocket_count: pocketCount,
    })
    .returning(['id', 'location_id'])
  return { id: row.id, code, locationId: row.location_id }
}

/** Waits until the worker has looked at what was asked of it. */
export async function untilRechecked(db: Knex, assemblyId: string): Promise<void> {
  for (let tries = 0; tries < 200; tries += 1) {
    if (!(await db('assembly_rechecks').where('assembly_id', assemblyId).first('id'))) return
    await new Promise((resolve) => setTimeout(resolve, 100))
  }
  throw new Error('The worker did not look at the assembly within twenty seconds.')
}

export interface ShownAssemblies {
  plannedId: string
  /** Built, and measured so short that what it was kept for fails. */
  markedId: string
}

/** One that is planned and one that is marked, both of these parts. */
export async function createShownAssemblies(crib: ApiClient, rows: AssemblyRows): Promise<ShownAssemblies> {
  const planned = await keepAssembly(crib, rows, { name: 'Deep pocket' })
  const built = await buildAssembly(crib, rows, (await keepAssembly(crib, rows)).body)
  const marked = await crib.post(`/api/assemblies/${built.body.id}/measure`, {
    version: built.body.version,
    gaugeLengthMm: 139,
  })
  if (marked.body.isMarked !== true) throw new Error(`It is not marked: ${JSON.stringify(marked.body)}`)
  return { plannedId: planned.body.id, markedId: marked.body.id }
}
