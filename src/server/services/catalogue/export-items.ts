import { can } from '@/core/policies/permissions'
import type { CatalogueKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import { type ExportQuery, exportColumnIds } from '@/schemas/catalogue-export'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { readAllCatalogueKeys } from '../../db/read-models/catalogue-keys'
import { readCatalogueRows } from '../../db/read-models/catalogue-rows'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { CatalogueFile } from '../../imports/catalogue-file'
import { kindWords } from './kind-words'
import { refuseHiddenCosts } from './visible-item'

const rowsAPiece = 500

export interface CatalogueDownload {
  fileName: string
  /** UTF-8, piece by piece as it is asked for. */
  body: ReadableStream<Uint8Array>
}

/** All rows a list shows, in its order, as CSV in the person's own unit: the columns asked for, or all of them. */
export async function exportItems(
  actor: Actor,
  kind: CatalogueKind,
  { columns: asked, ...query }: ExportQuery,
): Promise<CatalogueDownload> {
  refuseHiddenCosts(actor, query)
  const columns = exportedColumns(actor, kind, asked)
  const shop = await readShopSettings(db())
  const file = new CatalogueFile(kind, columns, {
    unit: actor.lengthUnit ?? shop.lengthUnit,
    decimalComma: shop.decimalComma,
    currency: shop.currency,
  })
  // Which rows and in what order is settled at once; what is in them is read as the download goes on.
  const ids = await readAllCatalogueKeys(db(), kind, query)
  return { fileName: `${kindWords[kind].many}.csv`, body: fileStream(file, kind, ids, query.cribId ?? null) }
}

function exportedColumns(actor: Actor, kind: CatalogueKind, asked: readonly string[] | undefined) {
  const maySeeCosts = can(actor.role, 'seeCosts')
  if (asked?.includes('unitCost') && !maySeeCosts) {
    throw new AppError('not-allowed', 'Your role does not see costs.', {
      errors: [{ path: 'columns', message: 'Your role does not see costs.' }],
    })
  }
  if (asked && asked.length > 0) return asked
  return exportColumnIds[kind].filter((id) => id !== 'unitCost' || maySeeCosts)
}

function fileStream(
  file: CatalogueFile,
  kind: CatalogueKind,
  ids: readonly string[],
  cribId: string | null,
): ReadableStream<Uint8Array> {
  const encoder = new TextEncoder()
  let done = 0
  return new ReadableStream<Uint8Array>({
    start: (controller) => controller.enqueue(encoder.encode(file.headings())),
    pull: async (controller) => {
      const rows = await readCatalogueRows(db(), kind, ids.slice(done, done + rowsAPiece), cribId)
      done += rowsAPiece
      if (rows.length > 0) controller.enqueue(encoder.encode(rows.map((row) => file.row(row)).join('')))
      if (done >= ids.length) controller.close()
    },
  })
}
