import type { Bore, ColletGeometry, CutterGeometry, ExtensionGeometry, HolderGeometry } from '@/core/tooling'
import { AppError } from '@/lib/app-error'
import type { ReachRequestBody } from '@/schemas/reach'
import type { Database } from '../../db/connection'
import { findPieceMeasurements } from '../../db/read-models/piece-measurements'
import { readItem } from '../catalogue/get-item'
import { measuredCutter } from './measured-cutter'

/** The tools of a check with their geometry, whether written out or named. */
export interface ReachTooling {
  cutter: CutterGeometry
  holder: HolderGeometry
  collet: ColletGeometry | null
  extension: ExtensionGeometry | null
  /** What whatever holds the shank takes; null where that was not said. */
  bore: Bore | null
}

/** Reads what is named from the crib, archived or not: a link to a check goes on meaning the same. */
export async function findReachTooling(db: Database, body: ReachRequestBody): Promise<ReachTooling> {
  const [cutter, holder, collet, extension] = await Promise.all([
    findCutter(db, body.cutter),
    findNamed(db, 'holder', body.holder),
    body.collet ? findNamed(db, 'collet', body.collet) : null,
    body.extension ? findNamed(db, 'extension', body.extension) : null,
  ])
  return { cutter, holder, collet, extension, bore: (extension ?? holder).bore ?? null }
}

async function findCutter(db: Database, cutter: ReachRequestBody['cutter']): Promise<CutterGeometry> {
  if (!('pieceId' in cutter)) return findNamed(db, 'cutter', cutter)
  const piece = await findPieceMeasurements(db, cutter.pieceId)
  if (!piece) throw notFoundAt('cutter.pieceId', 'There is no such piece.')
  const row = await answeringAt('cutter.pieceId', readItem(db, 'cutter', piece.itemId))
  return measuredCutter(row, piece)
}

async function findNamed<Kind extends 'cutter' | 'holder' | 'collet' | 'extension', Inline extends object>(
  db: Database,
  kind: Kind,
  given: Inline | { id: string },
) {
  if ('id' in given) return answeringAt(`${kind}.id`, readItem(db, kind, given.id))
  return given
}

/** What isn't there is said at the place it was named. */
async function answeringAt<Row>(path: string, reading: Promise<Row>): Promise<Row> {
  try {
    return await reading
  } catch (error) {
    if (error instanceof AppError && error.code === 'not-found') throw notFoundAt(path, error.detail)
    throw error
  }
}

function notFoundAt(path: string, message: string): AppError {
  return new AppError('not-found', message, { errors: [{ path, message }] })
}
