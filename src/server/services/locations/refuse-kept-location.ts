import type { LocationKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import type { LocationRecord } from '../../db/stores/location-store'

const changedByHand: readonly LocationKind[] = ['crib', 'cabinet', 'drawer', 'bin', 'regrind', 'inTransit']

/** The location, where a person may change it: hands and machines follow theirs, the far ends of the books are nobody's. */
export function refuseKeptLocation(location: LocationRecord | null): LocationRecord {
  if (!location || ['supplier', 'scrap', 'countAdjustment'].includes(location.kind)) {
    throw new AppError('not-found', 'There is no such location.')
  }
  if (changedByHand.includes(location.kind)) return location
  throw new AppError('impossible', `This location follows its ${location.kind}: change that.`)
}
