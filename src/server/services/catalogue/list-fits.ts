import type { z } from 'zod'
import { colletHolds } from '@/core/holding/holds'
import { AppError } from '@/lib/app-error'
import type { FitsItem, fitsListQuerySchema } from '@/schemas/fits'
import { db } from '../../db/connection'
import { type Fitting, readFitsKeys } from '../../db/read-models/fits-keys'
import { type FitsRow, readFitsRows } from '../../db/read-models/fits-rows'

export interface FitsList {
  rows: FitsItem[]
  nextCursor: string | null
  total?: number
}

/**
 * One block of what fits an item: what holds a cutter, what a holder, extension or collet holds, and which collets go
 * where. A holder with a collet bore fits every cutter that some collet of its series takes.
 */
export async function listFits(
  itemId: string,
  query: z.output<typeof fitsListQuerySchema>,
): Promise<FitsList> {
  const [asked] = await readFitsRows(db(), [itemId])
  if (!asked) throw new AppError('not-found', 'There is no such item.')
  const fitting = fittingOf(asked)
  if (!fitting) return { rows: [], nextCursor: null, total: 0 }
  const { ids, ...page } = await readFitsKeys(db(), fitting, query)
  const rows = await readFitsRows(db(), ids)
  return { rows: rows.map((row) => ({ ...row, placeInRange: placeInRange(asked, row) })), ...page }
}

/** Null for what has no geometry. */
function fittingOf(item: FitsRow): Fitting | null {
  if (item.shankDiameterMm !== null) return { shankMm: item.shankDiameterMm }
  if (item.minimumMm !== null && item.maximumMm !== null && item.series !== null) {
    return { colletSeries: item.series, minimumMm: item.minimumMm, maximumMm: item.maximumMm }
  }
  if (item.boreDiameterMm !== null) return { bore: { kind: 'fixed', diameterMm: item.boreDiameterMm } }
  return item.series === null ? null : { bore: { kind: 'collet', series: item.series } }
}

function placeInRange(one: FitsRow, other: FitsRow): number | null {
  const shankMm = one.shankDiameterMm ?? other.shankDiameterMm
  const collet = [one, other].find((item) => item.kind === 'collet')
  if (shankMm === null || collet?.minimumMm == null || collet.maximumMm === null) return null
  const { minimumMm, maximumMm } = collet
  return colletHolds({ series: collet.series ?? '', minimumMm, maximumMm }, shankMm).positionRatio
}
