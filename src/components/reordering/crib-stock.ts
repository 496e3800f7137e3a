import type { ItemStockResponse } from '@/schemas/stock'

export interface CribPieces {
  cribId: string
  cribCode: string
  pieces: number
}

/** Usable pieces by crib, the fullest first: worn ones do not count against a reorder point. */
export function piecesByCrib(stock: Pick<ItemStockResponse, 'balances'>): CribPieces[] {
  const cribs = new Map<string, CribPieces>()
  for (const { cribId, cribCode, condition, quantity } of stock.balances) {
    if (cribId === null || cribCode === null || condition === 'worn') continue
    const pieces = (cribs.get(cribId)?.pieces ?? 0) + quantity
    if (pieces > 0) cribs.set(cribId, { cribId, cribCode, pieces })
  }
  return [...cribs.values()].toSorted((one, other) => other.pieces - one.pieces)
}

/** The crib a first reorder point is most likely meant for; empty where nothing speaks for one and it must be chosen. */
export function likelyCribId(
  cribs: readonly { id: string }[],
  pieces: readonly CribPieces[],
  lookedAtId: string | undefined,
): string {
  const [only, ...others] = cribs
  return lookedAtId ?? pieces[0]?.cribId ?? (others.length === 0 ? (only?.id ?? '') : '')
}

export interface PointOutlook {
  sentence: string
  isCaution: boolean
}

/** Where the pieces are and whether the point typed makes the item low at once; null until there is a crib to speak of. */
export function pointOutlook(
  stock: ItemStockResponse,
  crib: { id: string; code: string } | undefined,
  reorderPoint: number | null,
): PointOutlook | null {
  if (!crib) return null
  const pieces = piecesByCrib(stock)
  const here = pieces.find(({ cribId }) => cribId === crib.id)?.pieces ?? 0
  const elsewhere = pieces.filter(({ cribId }) => cribId !== crib.id)
  const places = [
    `${here} in ${crib.code}`,
    ...elsewhere.map(({ cribCode, pieces: there }) => `${there} in ${cribCode}`),
  ].join(', ')
  if (reorderPoint === null) return { sentence: `Usable pieces: ${places}.`, isCaution: false }
  if (here + stock.coming <= reorderPoint) return { sentence: `${places}; low at once.`, isCaution: true }
  // What is reserved, and where what is coming goes, is known of the whole shop alone.
  if (here - stock.reserved <= reorderPoint)
    return { sentence: `${places}; perhaps low at once: pieces are reserved or coming.`, isCaution: true }
  return { sentence: `${places}; not low.`, isCaution: false }
}
