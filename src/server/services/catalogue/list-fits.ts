import type { z } from 'zod'
import { colletHolds } from '@/core/holding/holds'
import { AppError } from '@/lib/app-error'
import type { FitsItem, FitsQuery, fitsListQuerySchema } from '@/schemas/fits'
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

/** One block of what fits a shank, a fixed bore or a series of collets that is in nobody's catalogue yet. */
export async function listFitsOf(query: FitsQuery): Promise<FitsList> {
  const { ids, ...page } = await readFitsKeys(db(), askedFitting(query), query)
  const rows = await readFitsRows(db(), ids)
  const shankDiameterMm = query.shankDiameterMm ?? null
  return {
    rows: rows.map((row) => ({ ...row, placeInRange: placeInRange({ ...noItem, shankDiameterMm }, row) })),
    ...page,
  }
}

const noItem = { kind: null, shankDiameterMm: null, minimumMm: null, maximumMm: null, series: null }

function askedFitting({ shankDiameterMm, boreDiameterMm, series }: FitsQuery): Fitting {
  if (shankDiameterMm !== undefined) return { shankMm: shankDiameterMm }
  if (boreDiameterMm !== undefined) return { bore: { kind: 'fixed', diameterMm: boreDiameterMm } }
  return { bore: { kind: 'collet', series: series ?? '' } }
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

type Ranged = Pick<FitsRow, 'shankDiameterMm' | 'minimumMm' | 'maximumMm' | 'series'> & {
  kind: FitsRow['kind'] | null
}

function placeInRange(one: Ranged, other: Ranged): number | null {
  const shankMm = one.shankDiameterMm ?? other.shankDiameterMm
  const collet = [one, other].find((item) => item.kind === 'collet')
  if (shankMm === null || collet?.minimumMm == null || collet.maximumMm === null) return null
  const { minimumMm, maximumMm } = collet
  return colletHolds({ series: collet.series ?? '', minimumMm, maximumMm }, shankMm).positionRatio
}
