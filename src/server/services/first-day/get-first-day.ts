import type { FirstDay } from '@/schemas/first-day'
import { db } from '../../db/connection'
import { readFirstDayCounts, readIsFirstDayOpen } from '../../db/read-models/first-day-counts'

/** Whether the shop still lacks bins, catalogue or stock. People alone keep nobody from working. */
export function isFirstDayOpen(): Promise<boolean> {
  return readIsFirstDayOpen(db())
}

/** Which steps of the first day are done. Nothing is ticked by hand: a step is done when what it brings is there. */
export async function getFirstDay(): Promise<FirstDay> {
  const { areSettingsSeen, ...counts } = await readFirstDayCounts(db())
  return {
    ...counts,
    isDone: {
      settings: areSettingsSeen,
      bins: counts.bins > 0,
      catalogue: counts.cutters > 0 && counts.holders > 0,
      stock: counts.piecesInBins > 0,
      people: counts.people > 1,
    },
  }
}
