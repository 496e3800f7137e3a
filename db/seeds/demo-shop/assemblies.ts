import type { Knex } from 'knex'
import { assemblyGaugeLengthMm, reachRequestOf } from '@/core/assemblies/assembly-figures'
import type { AssemblyPartKind } from '@/core/assemblies/types'
import { reachAnswer } from '@/core/reach/reach-answer'
import type { Feature } from '@/core/reach/types'
import {
  createAssembly,
  createMeasurement,
  findLockedAssembly,
  markAssemblyBuilt,
} from '@/server/db/stores/assembly-store'
import { createMovements } from '@/server/db/stores/movement-store'
import { readShopSettings } from '@/server/db/stores/shop-settings-store'
import { readPartSizes, toolsOf } from '@/server/services/assemblies/assembly-tools'
import { recheckAssembly } from '@/server/services/assemblies/recheck-assembly'
import type { Item } from './catalogue'
import type { People } from './people'

interface AssemblyPlan {
  name: string
  parts: Readonly<Partial<Record<AssemblyPartKind, string>>>
  feature: Feature
  toolNumber: number
  /** A machine's code and a pocket of it; null in the hands of the first machinist; absent where it is only planned. */
  built?: { machine: string; pocket: number } | null
  /** How far the presetter found it from the calculated gauge length. */
  measuredOffMm?: number
  /** What the catalogue said of the cutter when it was kept: corrected since, it marks the assembly. */
  keptCutter?: Readonly<Record<string, number>>
}

const plans: readonly AssemblyPlan[] = [
  {
    name: 'Rib core, finishing the walls',
    parts: { cutter: 'B-020', collet: 'C-022', holder: 'H-006' },
    feature: { kind: 'wall', depthMm: 40 },
    toolNumber: 3,
    built: { machine: 'M1', pocket: 3 },
    measuredOffMm: 0.012,
  },
  {
    name: 'Housing, deep pocket',
    parts: { cutter: 'B-018', collet: 'C-006', holder: 'H-002' },
    feature: { kind: 'wall', depthMm: 31, openingWidthMm: 12 },
    toolNumber: 4,
    built: { machine: 'M1', pocket: 4 },
    keptCutter: { reachLengthMm: 32 },
  },
  {
    name: 'Cover, floor',
    parts: { cutter: 'B-021', collet: 'C-056', holder: 'H-004' },
    feature: { kind: 'wall', depthMm: 30, draftDeg: 1 },
    toolNumber: 8,
    built: null,
    measuredOffMm: 0.14,
  },
  {
    name: 'Rib core, roughing the corners',
    parts: { cutter: 'B-019', collet: 'C-013', holder: 'H-005' },
    feature: { kind: 'wall', depthMm: 28 },
    toolNumber: 5,
  },
]

/** A few assemblies as a shop has them: two in a machine, one of them marked, one in hand and off, one planned. */
export async function loadAssemblies(trx: Knex, items: readonly Item[], people: People): Promise<void> {
  const [machinist] = people.machinists
  if (!machinist) throw new Error('The demo shop has no machinist.')
  for (const plan of plans) {
    const parts = Object.entries(plan.parts).map(([kind, code]) => ({
      kind: kind as AssemblyPartKind,
      itemId: idOf(items, code),
      pieceId: null,
    }))
    const id = await keep(trx, plan, parts, people.cribManagerId)
    if (plan.built === undefined) continue
    await build(trx, id, plan.built, parts, machinist)
    const assembly = await findLockedAssembly(trx, id)
    if (!assembly) throw new Error('An assembly of the demo shop is not there.')
    if (plan.measuredOffMm !== undefined) {
      const tools = toolsOf(await readPartSizes(trx, parts))
      await createMeasurement(trx, {
        assemblyId: id,
        gaugeLengthMm: assembly.gaugeLengthMm + plan.measuredOffMm,
        diameterMm: null,
        expectedGaugeLengthMm: assembly.gaugeLengthMm,
        expectedDiameterMm: tools.cutter.cuttingDiameterMm,
        source: 'presetter',
        actorId: people.cribManagerId,
      })
    }
    await recheckAssembly(trx, assembly)
  }
  // What the plans themselves moved has just been looked at.
  await trx('assembly_rechecks').delete()
}

function idOf(items: readonly Item[], code: string): string {
  const item = items.find((candidate) => candidate.code === code)
  if (!item) throw new Error(`The demo shop has no ${code}.`)
  return item.id
}

type NamedPart = { kind: AssemblyPartKind; itemId: string; pieceId: null }

async function keep(trx: Knex, plan: AssemblyPlan, parts: readonly NamedPart[], createdBy: string) {
  const sizes = (await readPartSizes(trx, parts)).map((part) =>
    part.kind === 'cutter' ? { ...part, geometry: { ...part.geometry, ...plan.keptCutter } } : part,
  )
  const tools = toolsOf(sizes)
  const { reach } = await readShopSettings(trx)
  const check = { feature: plan.feature, clearances: null }
  const answer = reachAnswer(reachRequestOf(tools, check, null, reach))
  if (answer.verdict !== 'reaches') throw new Error(`${plan.name} of the demo shop does not reach.`)
  const stickOutMm = answer.stickOut.usedMm
  return createAssembly(
    trx,
    {
      name: plan.name,
      note: '',
      stickOutMm,
      gaugeLengthMm: assemblyGaugeLengthMm(tools, stickOutMm),
      toolNumber: plan.toolNumber,
      lengthOffsetNumber: plan.toolNumber,
      diameterOffsetNumber: plan.toolNumber,
      createdBy,
    },
    parts.map((part, index) => ({ ...part, geometry: sizes[index]?.geometry ?? {} })),
    { ...check, answer, createdBy },
  )
}

async function build(
  trx: Knex,
  id: string,
  spot: (AssemblyPlan['built'] & object) | null,
  parts: readonly NamedPart[],
  machinist: People['machinists'][number],
): Promise<void> {
  const machine = spot ? await trx('machines').where('code', spot.machine).first() : null
  const locationId: string = machine?.location_id ?? machinist.locationId
  const places = []
  for (const { kind, itemId } of parts) {
    const from = await fullestBin(trx, itemId)
    places.push({ kind, itemId, pieceId: null, locationId, ...from })
  }
  await createMovements(
    trx,
    places.map(({ itemId, homeLocationId, condition }) => ({
      kind: 'issue',
      itemId,
      pieceId: null,
      quantity: 1,
      fromLocationId: homeLocationId,
      fromCondition: condition,
      toLocationId: locationId,
      toCondition: condition,
      note: 'Assembly built',
      actorId: machinist.userId,
      reversesId: null,
    })),
  )
  await markAssemblyBuilt(trx, id, places, {
    machineId: machine?.id ?? null,
    pocket: spot?.pocket ?? null,
  })
}

async function fullestBin(trx: Knex, itemId: string) {
  const row = await trx('balances')
    .join('locations', 'locations.id', 'balances.location_id')
    .where('balances.item_id', itemId)
    .where('locations.kind', 'bin')
    .whereIn('balances.condition', ['new', 'used'])
    .where('balances.quantity', '>', 0)
    .orderBy('balances.quantity', 'desc')
    .orderBy(['balances.condition', 'balances.location_id'])
    .first('balances.location_id', 'balances.condition')
  if (!row) throw new Error('A part of a demo assembly lies in no bin.')
  return { homeLocationId: row.location_id as string, condition: row.condition as 'new' | 'used' }
}
