import { type SearchTables, searchTables } from '@/core/search/search-tables'
import type { CribTooling } from '@/core/search/types'
import { db } from '../../db/connection'
import {
  type CribToolingRows,
  type MeasuredPieceRow,
  readCribTooling,
  readToolingRevision,
} from '../../db/read-models/crib-tooling'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { inTransaction } from '../../db/transaction'
import { measuredCutter } from '../reach/measured-cutter'

/** What a cutter of the tables is: a kind of item, or one tagged piece of it with measures of its own. */
export interface CutterSource {
  itemId: string
  piece: MeasuredPieceRow | null
}

export interface CribTables {
  tables: SearchTables
  /** One for every cutter of the tables. */
  cutterSources: CutterSource[]
}

interface HeldTables {
  revision: string
  loading: Promise<CribTables>
}

/** Of this process. Packing a large crib takes longer than searching it, so it is done once for each of its states. */
let held: HeldTables | undefined

/** The crib packed for searching, as it is now; several that ask at once wait for one reading. */
export async function cribTables(): Promise<CribTables> {
  const revision = await readToolingRevision(db())
  if (held?.revision !== revision) {
    const loading = loadTables()
    const mine = { revision, loading: loading.then(({ packed }) => packed) }
    held = mine
    // What was read may be newer than what was asked for; a reading that failed is not kept.
    loading.then(
      (loaded) => {
        mine.revision = loaded.revision
      },
      () => {
        if (held === mine) held = undefined
      },
    )
  }
  return held.loading
}

async function loadTables(): Promise<{ revision: string; packed: CribTables }> {
  const { revision, rows, settings } = await inTransaction(
    db(),
    async (trx) => ({
      revision: await readToolingRevision(trx),
      rows: await readCribTooling(trx),
      settings: await readShopSettings(trx),
    }),
    { isolation: 'repeatable read' },
  )
  const { tooling, cutterSources } = cribTooling(rows)
  return { revision, packed: { tables: searchTables(tooling, settings.reach), cutterSources } }
}

/** The rows as the search takes them. A measured piece is a cutter of its own beside the item it is one of. */
export function cribTooling(rows: CribToolingRows): { tooling: CribTooling; cutterSources: CutterSource[] } {
  const byItem = new Map(rows.cutters.map((cutter) => [cutter.itemId, cutter]))
  const ofPieces = rows.pieces.flatMap((piece) => {
    const catalogue = byItem.get(piece.itemId)
    return catalogue ? [{ piece, catalogue }] : []
  })
  return {
    tooling: {
      cutters: [
        ...rows.cutters.map(({ itemId, geometry, maximumRpm }) => ({ id: itemId, geometry, maximumRpm })),
        ...ofPieces.map(({ piece, catalogue }) => ({
          id: `${piece.itemId}-${piece.id}`,
          geometry: measuredCutter(catalogue.geometry, piece),
          maximumRpm: catalogue.maximumRpm,
        })),
      ],
      holders: rows.holders.map(({ itemId, ...holder }) => ({ id: itemId, ...holder })),
      collets: rows.collets.map(({ itemId, geometry }) => ({ id: itemId, geometry })),
      extensions: rows.extensions.map(({ itemId, ...extension }) => ({ id: itemId, ...extension })),
    },
    cutterSources: [
      ...rows.cutters.map(({ itemId }) => ({ itemId, piece: null })),
      ...ofPieces.map(({ piece }) => ({ itemId: piece.itemId, piece })),
    ],
  }
}
