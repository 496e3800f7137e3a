import type { Knex } from 'knex'
import { cutterPlans } from './cutters'
import { colletPlans, extensionPlans, holderPlans, type Segment } from './holders'

export interface Item {
  id: string
  kind: 'cutter' | 'holder' | 'collet' | 'extension'
  code: string
  isInch: boolean
  isHoleTool: boolean
  /** How often it is taken from the drawer, relative to the others. */
  use: number
}

interface Plan {
  code: string
  maker: string
  description: string
  unitCostMinor: number
}

const holeToolForms = ['drill', 'reamer', 'tap', 'thread_mill']

/** Puts every item into the catalogue with its geometry. */
export async function loadCatalogue(trx: Knex): Promise<Item[]> {
  const cutters = cutterPlans()
  const cutterIds = await insertItems(trx, 'cutter', cutters)
  await trx('cutters').insert(
    cutters.map(({ geometry }, index) => ({ item_id: cutterIds[index], ...geometry })),
  )

  const holders = holderPlans()
  const holderIds = await insertItems(trx, 'holder', holders)
  await trx('holders').insert(
    holders.map(({ geometry }, index) => ({ item_id: holderIds[index], ...geometry })),
  )
  await insertSegments(trx, 'holder_segments', holderIds, holders)

  const collets = colletPlans()
  const colletIds = await insertItems(trx, 'collet', collets)
  await trx('collets').insert(
    collets.map(({ geometry }, index) => ({ item_id: colletIds[index], ...geometry })),
  )

  const extensions = extensionPlans()
  const extensionIds = await insertItems(trx, 'extension', extensions)
  await trx('extensions').insert(
    extensions.map(({ geometry }, index) => ({ item_id: extensionIds[index], ...geometry })),
  )
  await insertSegments(trx, 'extension_segments', extensionIds, extensions)

  const steady = (kind: Item['kind'], plans: Plan[], ids: string[], use: number): Item[] =>
    plans.map(({ code }, index) => ({ id: ids[index]!, kind, code, isInch: false, isHoleTool: false, use }))
  return [
    ...cutters.map(({ code, isInch, use, geometry }, index) => ({
      id: cutterIds[index]!,
      kind: 'cutter' as const,
      code,
      isInch,
      isHoleTool: holeToolForms.includes(String(geometry.form)),
      use,
    })),
    ...steady('holder', holders, holderIds, 0.15),
    ...steady('collet', collets, colletIds, 0.3),
    ...steady('extension', extensions, extensionIds, 0.1),
  ]
}

async function insertItems(trx: Knex, kind: Item['kind'], plans: Plan[]): Promise<string[]> {
  const rows = await trx('items')
    .insert(
      plans.map((plan, index) => ({
        kind,
        code: plan.code,
        maker: plan.maker,
        part_number: partNumber(plan, index),
        description: plan.description,
        unit_cost_minor: plan.unitCostMinor,
      })),
    )
    .returning(['id', 'code'])
  const idByCode = new Map(rows.map((row: { id: string; code: string }) => [row.code, row.id]))
  return plans.map((plan) => idByCode.get(plan.code)!)
}

/** A maker's number of the maker's own make: two letters and five digits. */
function partNumber(plan: Plan, index: number): string {
  const digits = String(10_007 + ((index * 7919 + plan.code.charCodeAt(0) * 271) % 89_989))
  return `${plan.maker.slice(0, 2).toUpperCase()}-${digits}`
}

async function insertSegments(
  trx: Knex,
  table: string,
  ids: string[],
  plans: { segments: Segment[] }[],
): Promise<void> {
  await trx(table).insert(
    plans.flatMap(({ segments }, index) =>
      segments.map((segment, order) => ({
        item_id: ids[index],
        position: order + 1,
        ...(segment.part ? { part: segment.part } : {}),
        length_mm: segment.length,
        nose_diameter_mm: segment.nose,
        spindle_diameter_mm: segment.spindle,
      })),
    ),
  )
}
