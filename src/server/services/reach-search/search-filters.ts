import type { SearchMasks, SearchPenalties, SearchTableName } from '@/core/search/types'
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

/** Ranks after every assembly whose parts all have a cost, however dear. */
export const unknownCostPenalty = 1e13

export interface SearchFilters {
  masks: SearchMasks
  penalties: SearchPenalties
  piecePlaces: Map<string, PiecePlace>
}

type Table = SearchTableName

/** What the person's filters leave out, and what ranks before stiffness: read anew for every search. */
export async function searchFilters(
  { tables, cutterSources }: CribTables,
  body: ReachSearchRequest,
): Promise<SearchFilters> {
  const cribId = body.where?.cribId ?? null
  const pieceIds = cutterSources.flatMap(({ piece }) => piece?.id ?? [])
  const [stock, piecePlaces, kept, costs] = await Promise.all([
    readAvailability(db(), cribId),
    readPiecePlaces(db(), pieceIds, cribId),
    cribId === null ? null : readKeptItems(db(), cribId),
    body.rankBy === 'cost' ? readUnitCosts(db()) : null,
  ])
  const available = withoutMeasuredPieces(stock, piecePlaces)
  const { tooling } = tables
  const isAvailable = (table: Table, index: number) => {
    const piece = table === 'cutters' ? cutterSources[index]?.piece : null
    if (piece) return (piecePlaces.get(piece.id)?.stock.available ?? 0) > 0
    return (available.get(itemIdAt(table, index)) ?? 0) > 0
  }
  const itemIdAt = (table: Table, index: number) =>
    (table === 'cutters' ? cutterSources[index]?.itemId : tooling[table][index]?.id) ?? ''
  const isOffered = (table: Table, index: number) =>
    (body.where?.inStockOnly ? isAvailable(table, index) : true) &&
    (kept === null || kept.has(itemIdAt(table, index))) &&
    (table !== 'cutters' || isCutterOffered(tables, cutterSources, piecePlaces, body, index))
  const penaltyAt = (table: Table, index: number) => {
    if (costs) return costs.get(itemIdAt(table, index)) ?? unknownCostPenalty
    return isAvailable(table, index) ? 0 : 1
  }
  const length = (table: Table) => tooling[table].length
  const maskOf = (table: Table) =>
    Uint8Array.from({ length: length(table) }, (_, index) => (isOffered(table, index) ? 1 : 0))
  const penaltiesOf = (table: Table) =>
    Float64Array.from({ length: length(table) }, (_, index) => penaltyAt(table, index))
  return {
    masks: everyTable(maskOf),
    penalties: body.rankBy === 'stock' || body.rankBy === 'cost' ? everyTable(penaltiesOf) : {},
    piecePlaces,
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

function isCutterOffered(
  { tooling }: CribTables['tables'],
  cutterSources: CribTables['cutterSources'],
  piecePlaces: Map<string, PiecePlace>,
  { where }: ReachSearchRequest,
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
      (geometry.substrate != null && substrates.includes(geometry.substrate)))
  )
}
