import type { Knex } from 'knex'
import { loadMachines } from './machines'

export interface Bin {
  id: string
  code: string
  cabinet: string
}

export interface Places {
  mainCribId: string
  eastCribId: string
  mainBins: Bin[]
  eastBins: Bin[]
  machineIds: string[]
  inTransitId: string
  supplierId: string
  scrapId: string
}

/** Cabinet letter, what it holds, drawers, bins a drawer. */
const mainCabinets = [
  ['A', 'Inch end mills', 6, 12],
  ['B', 'Metric end mills', 6, 12],
  ['C', 'Drills, reamers, taps', 5, 12],
  ['D', 'Chucks and holders', 5, 10],
  ['E', 'Collets and extensions', 3, 24],
] as const
const eastCabinets = [['K', 'Cell stock', 3, 10]] as const

export async function loadPlaces(trx: Knex): Promise<Places> {
  const [main, east] = await trx('cribs')
    .insert([
      { code: 'MAIN', name: 'Main crib', time_zone: 'Europe/Dublin' },
      { code: 'EAST', name: 'East cell crib', time_zone: 'Europe/Dublin' },
    ])
    .returning('id')
  const machineIds = await loadMachines(trx)
  const [inTransit] = await trx('locations')
    .insert({ kind: 'in_transit', code: 'TRANSIT-1', name: 'Main crib to east cell' })
    .returning('id')
  await trx('locations').insert({ kind: 'regrind', code: 'REGRIND', name: 'Out for regrinding' })
  const outside = await trx('locations').whereIn('kind', ['supplier', 'scrap']).select('id', 'kind')
  return {
    mainCribId: main.id,
    eastCribId: east.id,
    mainBins: await loadCabinets(trx, main.id, mainCabinets),
    eastBins: await loadCabinets(trx, east.id, eastCabinets),
    machineIds,
    inTransitId: inTransit.id,
    supplierId: outside.find((row: { kind: string }) => row.kind === 'supplier').id,
    scrapId: outside.find((row: { kind: string }) => row.kind === 'scrap').id,
  }
}

type Cabinet = readonly [letter: string, name: string, drawers: number, bins: number]

async function loadCabinets(trx: Knex, cribId: string, cabinets: readonly Cabinet[]): Promise<Bin[]> {
  const root = await trx('locations').where({ kind: 'crib', crib_id: cribId }).first('id')
  const bins: Bin[] = []
  for (const [letter, name, drawerCount, binCount] of cabinets) {
    const [cabinet] = await trx('locations')
      .insert({ kind: 'cabinet', code: letter, name, crib_id: cribId, parent_id: root.id })
      .returning('id')
    const drawers = await trx('locations')
      .insert(
        Array.from({ length: drawerCount }, (_, index) => ({
          kind: 'drawer',
          code: `${letter}${index + 1}`,
          name: `${name}, drawer ${index + 1}`,
          crib_id: cribId,
          parent_id: cabinet.id,
        })),
      )
      .returning(['id', 'code'])
    const made = await trx('locations')
      .insert(
        drawers.flatMap((drawer: { id: string; code: string }) =>
          Array.from({ length: binCount }, (_, index) => {
            const code = `${drawer.code}-${String(index + 1).padStart(2, '0')}`
            return { kind: 'bin', code, name: `Bin ${code}`, crib_id: cribId, parent_id: drawer.id }
          }),
        ),
      )
      .returning(['id', 'code'])
    bins.push(...made.map((bin: { id: string; code: string }) => ({ ...bin, cabinet: letter })))
  }
  return bins.sort((one, other) => (one.code < other.code ? -1 : 1))
}
