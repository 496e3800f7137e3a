import { isSameTaper } from '@/core/machine/taper'
import type { SearchHolder, SearchMasks, SearchPenalties, SearchTableName } from '@/core/search/types'
import type { ReachSearchRequest } from '@/schemas/reach-search'
import { db } from '../../db/connection'
import {
  type PiecePlace,
  readAvailability,
  readKeptItems,
  readPiecePlaces,
  readUnitCosts,
} from '../../db/read-models/tooling-stock'
import type { CribTables } from './crib-tables'
import { type MachineLimits, machineLimits } from './machine-limits'
import { type MaterialSpeeds, materialSpeeds } from './material-speeds'

/** Ranks after every assembly whose parts all have a cost, however dear. */
export const unknownCostPenalty = 1e13

type Table = SearchTableName

export interface SearchFilters {
  masks: SearchMasks
  penalties: SearchPenalties
  /** What crib, machine and the question's own filters leave, whether it is in a bin now or not. */
  suits: Pick<Record<Table, Uint8Array>, 'cutters' | 'holders'>
  limits: MachineLimits
  speeds: MaterialSpeeds | null
  piecePlaces: Map<string, PiecePlace>
}

/** What the person's filters leave out, and what ranks before stiffness: read anew for every search. */
export async function searchFilters(crib: CribTables, body: ReachSearchRequest): Promise<SearchFilters> {
  const cribId = body.where?.cribId ?? null
  const pieceIds = crib.cutterSources.flatMap(({ piece }) => piece?.id ?? [])
  const [limits, speeds, stock, piecePlaces, kept, costs] = await Promise.all([
    machineLimits(body),
    materialSpeeds(body),
    readAvailability(db(), cribId),
    readPiecePlaces(db(), pieceIds, cribId),
    cribId === null ? null : readKeptItems(db(), cribId),
    body.rankBy === 'cost' ? readUnitCosts(db()) : null,
  ])
  const { tooling } = crib.tables
  const itemIdAt = (table: Table, index: number) =>
    (table === 'cutters' ? crib.cutterSources[index]?.itemId : tooling[table][index]?.id) ?? ''
  const isAvailable = availabilityOf(crib, withoutMeasuredPieces(stock, piecePlaces), piecePlaces, itemIdAt)
  const isKept = (table: Table, index: number) => kept === null || kept.has(itemIdAt(table, index))
  const suits = {
    cutters: columnOf(
      tooling.cutters,
      (index) => isKept('cutters', index) && isCutterSuited(crib, piecePlaces, body, limits, index),
    ),
    holders: columnOf(
      tooling.holders,
      (index) => isKept('holders', index) && isHolderSuited(tooling.holders[index], limits),
    ),
  }
  const isOffered = (table: Table, index: number) =>
    (!body.where?.inStockOnly || isAvailable(table, index)) &&
    (table === 'cutters' || table === 'holders' ? suits[table][index] === 1 : isKept(table, index))
  const penaltyAt = (table: Table, index: number) =>
    costs ? (costs.get(itemIdAt(table, index)) ?? unknownCostPenalty) : isAvailable(table, index) ? 0 : 1
  return {
    masks: everyTable((table) => columnOf(tooling[table], (index) => isOffered(table, index))),
    penalties:
      body.rankBy === 'stock' || body.rankBy === 'cost'
        ? everyTable((table) =>
            Float64Array.from({ length: tooling[table].length }, (_, index) => penaltyAt(table, index)),
          )
        : {},
    suits,
    limits,
    speeds,
    piecePlaces,
  }
}

function columnOf({ length }: { length: number }, isIn: (index: number) => boolean): Uint8Array {
  return Uint8Array.from({ length }, (_, index) => (isIn(index) ? 1 : 0))
}

function availabilityOf(
  { cutterSources }: CribTables,
  available: Map<string, number>,
  piecePlaces: Map<string, PiecePlace>,
  itemIdAt: (table: Table, index: number) => string,
) {
  return (table: Table, index: number): boolean => {
    const piece = table === 'cutters' ? cutterSources[index]?.piece : null
    if (piece) return (piecePlaces.get(piece.id)?.stock.available ?? 0) > 0
    return (available.get(itemIdAt(table, index)) ?? 0) > 0
  }
}

function everyTable<Column>(columnOf: (table: Table) => Column): Record<Table, Column> {
  return {
    cutters: columnOf('cutters'),
    holders: columnOf('holders'),
    collets: columnOf('collets'),
    extensions: columnOf('extensions'),
  }
}

/** Of a tagged item the catalogue's figures stand for the pieces nobody measured. */
function withoutMeasuredPieces(
  stock: Map<string, number>,
  piecePlaces: Map<string, PiecePlace>,
): Map<string, number> {
  const available = new Map(stock)
  for (const { itemId, stock: ofPiece } of piecePlaces.values()) {
    if (ofPiece.available > 0)
      available.set(itemId, Math.max(0, (available.get(itemId) ?? 0) - ofPiece.available))
  }
  return available
}

function isCutterSuited(
  { tables: { tooling }, cutterSources }: CribTables,
  piecePlaces: Map<string, PiecePlace>,
  { where }: ReachSearchRequest,
  { widestToolMm }: MachineLimits,
  index: number,
): boolean {
  const geometry = tooling.cutters[index]?.geometry
  const piece = cutterSources[index]?.piece
  if (!geometry || (piece && piecePlaces.get(piece.id)?.isGone !== false)) return false
  const { cutterId, forms, substrates } = where ?? {}
  return (
    (cutterId == null || cutterSources[index]?.itemId === cutterId) &&
    (!forms || forms.length === 0 || forms.includes(geometry.form)) &&
    (!substrates ||
      substrates.length === 0 ||
      (geometry.substrate != null && substrates.includes(geometry.substrate))) &&
    (widestToolMm === null || geometry.cuttingDiameterMm <= widestToolMm)
  )
}

/** A holder whose taper was never entered is left out where a machine is named: that it goes in is not known. */
function isHolderSuited(holder: SearchHolder | undefined, { taper, widestToolMm }: MachineLimits): boolean {
  if (!holder) return false
  const widthsMm = holder.geometry.segments.flatMap((segment) => [
    segment.noseDiameterMm,
    segment.spindleDiameterMm,
  ])
  return (
    (taper === null || (holder.taper !== null && isSameTaper(holder.taper, taper))) &&
    (widestToolMm === null || Math.max(...widthsMm) <= widestToolMm)
  )
}
