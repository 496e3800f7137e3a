import { CoreInputError } from '@/core/core-input-error'
import { notNegative, positive } from '@/core/outline/checked-number'
import { type CutterDimensions, cutterDimensions } from '@/core/outline/cutter-dimensions'
import { extensionCheckParts, holderCheckParts } from '@/core/reach/check-parts'
import { refuseBadSettings } from '@/core/reach/reach-case'
import { clampingOf } from '@/core/reach/stick-out-bounds'
import type { ReachSettings } from '@/core/reach/types'
import { extensionBeam, holderBeam } from '@/core/stiffness/compliance'
import type { ColletGeometry, HolderGeometry } from '@/core/tooling'
import { type Body, type BodyTable, packBodies } from './body-table'
import { type ClampDepths, type ClampTable, clampDepths, packClamps } from './clamp-table'
import { type CutterTable, packCutters } from './cutter-table'
import { eachTable } from './each-table'
import { type HoldClasses, type HoldingWay, holdClasses } from './hold-classes'
import type { CribTooling, SearchExtension, SearchRefusal, SearchTableName } from './types'

/** A crib packed for searching. What is not named in `types.ts` is the search's own. */
export interface SearchTables {
  tooling: CribTooling
  settings: ReachSettings
  /** Records the reach check refuses, once each. */
  refusals: SearchRefusal[]
  /** 1 where a record of the table is not refused. */
  isAccepted: Record<SearchTableName, Uint8Array>
  cutters: CutterTable
  holders: BodyTable
  extensions: BodyTable
  /** Ways to clamp a cutter's shank, by its class. */
  inHolders: ClampTable[]
  inExtensions: ClampTable[]
  /** Ways to hold an extension's shank, by its class: nothing is asked of bore depth or grip. */
  holdingExtension: HoldingWay[][]
  /** Class of an extension's own shank; -1 where it is not known. */
  extensionClass: Int32Array
  /** Place of every record's id among the ids of its table. */
  idOrder: Record<SearchTableName, Int32Array>
}

/**
 * Packs a crib's tooling once, for any number of searches.
 *
 * Assumes ids unique within a table. A record the reach check refuses is left out and said in `refusals`; it is never
 * thrown.
 *
 * Units      Millimetres, degrees.
 * Errors     CoreInputError for settings no answer can be worked out with: as `refuseBadSettings`.
 *
 * @example
 * searchTables({ cutters: [{ id: 'a', geometry: { ...squareCutter, overallLengthMm: -1 } }], holders: [], collets: [], extensions: [] }, defaultReachSettings).refusals[0].code // => 'not-positive'
 */
export function searchTables(tooling: CribTooling, settings: ReachSettings): SearchTables {
  refuseBadSettings(settings)
  const refused = new Refusals()
  const dimensions = tooling.cutters.map(({ geometry }, index) =>
    refused.ask('cutters', index, () => cutterDimensions(geometry)),
  )
  const holders = packBodies(
    tooling.holders.map(({ geometry }, index) =>
      refused.ask('holders', index, () => holderBody(geometry, settings)),
    ),
  )
  const extensions = packBodies(
    tooling.extensions.map((extension, index) =>
      refused.ask('extensions', index, () => extensionBody(extension, settings)),
    ),
  )
  const collets = tooling.collets.map(({ geometry }, index) =>
    refused.ask('collets', index, () => checkedCollet(geometry)),
  )
  const classes = classesOf(tooling, dimensions, collets)
  const clampIn = clampAsker(tooling, refused)
  return {
    tooling,
    settings,
    cutters: packCutters(acceptedCutters(tooling, dimensions, classes.classOf), settings),
    holders,
    extensions,
    inHolders: classes.byHolder.map((ways) => packClamps(ways, holders, clampIn.holder)),
    inExtensions: classes.byExtension.map((ways) => packClamps(ways, extensions, clampIn.extension)),
    holdingExtension: classes.byHolder,
    extensionClass: Int32Array.from(tooling.extensions, ({ shankDiameterMm }, index) =>
      shankDiameterMm === null ? -1 : (classes.classOf[tooling.cutters.length + index] ?? -1),
    ),
    idOrder: eachTable((table) => idOrder(tooling[table])),
    isAccepted: eachTable((table) => refused.accepted(table, tooling[table].length)),
    refusals: refused.list,
  }
}

/** What the reach check refuses, gathered instead of thrown. */
class Refusals {
  readonly list: SearchRefusal[] = []
  private readonly known = new Set<string>()

  /** null where the record is refused. */
  ask<Value>(table: SearchTableName, index: number, answer: () => Value): Value | null {
    try {
      return answer()
    } catch (error) {
      if (!(error instanceof CoreInputError)) throw error
      this.add(table, index, error)
      return null
    }
  }

  /** As `ask`, the collet's fault where the path says so. */
  askWay<Value>(table: SearchTableName, way: HoldingWay, answer: () => Value): Value | null {
    try {
      return answer()
    } catch (error) {
      if (!(error instanceof CoreInputError)) throw error
      if (error.path.startsWith('collet.')) this.add('collets', way.collet, error)
      else this.add(table, way.owner, error)
      return null
    }
  }

  private add(table: SearchTableName, index: number, { code, path, message }: CoreInputError): void {
    const key = `${table} ${index}`
    if (!this.known.has(key)) this.list.push({ table, index, code, path, message })
    this.known.add(key)
  }

  accepted(table: SearchTableName, count: number): Uint8Array {
    return Uint8Array.from({ length: count }, (_, index) => (this.known.has(`${table} ${index}`) ? 0 : 1))
  }
}

function holderBody(holder: HolderGeometry, settings: ReachSettings): Body {
  const parts = holderCheckParts(holder, null)
  return {
    parts: parts.filter(({ part }) => part !== 'spindle'),
    lengthMm: holder.gaugeLengthMm,
    spindleRadiusMm:
      holder.spindleNoseDiameterMm == null ? Number.POSITIVE_INFINITY : holder.spindleNoseDiameterMm / 2,
    beam: holderBeam(holder, 0, settings),
  }
}

function extensionBody({ geometry, shankDiameterMm }: SearchExtension, settings: ReachSettings): Body {
  if (shankDiameterMm !== null) positive(shankDiameterMm, 'extension.shankDiameterMm', 'The shank diameter')
  return {
    parts: extensionCheckParts(geometry),
    lengthMm: geometry.projectionMm,
    spindleRadiusMm: null,
    beam: extensionBeam(geometry, 0, settings),
  }
}

/** A collet that names no figures holds nothing; one that names impossible ones is refused. */
function checkedCollet(collet: ColletGeometry): ColletGeometry {
  notNegative(collet.minimumMm, 'collet.minimumMm', 'The least diameter')
  positive(collet.maximumMm, 'collet.maximumMm', 'The largest diameter')
  return collet
}

function classesOf(
  { cutters, holders, extensions }: CribTooling,
  dimensions: readonly (CutterDimensions | null)[],
  collets: readonly (ColletGeometry | null)[],
): HoldClasses {
  const shanksMm = cutters.map(({ geometry }, index) =>
    dimensions[index] ? geometry.shankDiameterMm : Number.NaN,
  )
  const extensionShanksMm = extensions.map(({ shankDiameterMm }) => shankDiameterMm ?? Number.NaN)
  return holdClasses(
    [...shanksMm, ...extensionShanksMm],
    holders.map(({ bore }) => bore),
    extensions.map(({ bore }) => bore),
    collets,
  )
}

function acceptedCutters(
  { cutters }: CribTooling,
  dimensions: readonly (CutterDimensions | null)[],
  classOf: Int32Array,
) {
  return cutters.flatMap(({ geometry }, index) => {
    const of = dimensions[index]
    return of ? [{ index, geometry, dimensions: of, shankClass: classOf[index] ?? -1 }] : []
  })
}

/** Asks how deep each way clamps, once however many shanks it holds. */
function clampAsker({ holders, extensions, collets }: CribTooling, refused: Refusals) {
  const asker = (table: 'holders' | 'extensions', depthsOf: (way: HoldingWay) => ClampDepths) => {
    const known = new Map<number, ClampDepths | null>()
    return (way: HoldingWay): ClampDepths | null => {
      const key = way.owner * (collets.length + 1) + way.collet + 1
      const found = known.get(key)
      if (found !== undefined) return found
      const depths = refused.askWay(table, way, () => depthsOf(way))
      known.set(key, depths)
      return depths
    }
  }
  const colletOf = ({ collet }: HoldingWay) => collets[collet]?.geometry ?? null
  return {
    holder: asker('holders', (way) => {
      const { geometry } = holders[way.owner]!
      return clampDepths(clampingOf('holder', geometry, geometry.sideLockInsertionMm, colletOf(way)))
    }),
    extension: asker('extensions', (way) =>
      clampDepths(clampingOf('extension', extensions[way.owner]!.geometry, null, colletOf(way))),
    ),
  }
}

/** Place of every id among all of them; of two alike, the first first. */
function idOrder(records: readonly { id: string }[]): Int32Array {
  const places = new Int32Array(records.length)
  records
    .map(({ id }, index) => ({ id, index }))
    .sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : a.index - b.index))
    .forEach(({ index }, place) => {
      places[index] = place
    })
  return places
}
