import { AppError } from '@/lib/app-error'
import type { MergeItemsRequest, MergePreview } from '@/schemas/duplicate'
import { type Database, db } from '../../db/connection'
import { readEarlierCodes, readMergedReordering } from '../../db/read-models/merge-preview'
import { type MergeablePair, mergeablePair } from './mergeable-pair'

/** What a merge of these two would do as things stand, or the sentence that refuses it. Nothing is changed. */
export async function previewMerge(request: MergeItemsRequest): Promise<MergePreview> {
  const found = await pairOrRefusal(db(), request)
  if (typeof found === 'string') {
    return { refusal: found, held: [], tagsNowhere: [], cribs: [], earlierCodes: [] }
  }
  const { kept, merged, held, tagsNowhere } = found
  return {
    refusal: null,
    held,
    tagsNowhere,
    cribs: await readMergedReordering(db(), kept.id, merged.id),
    earlierCodes: await readEarlierCodes(db(), merged.id),
  }
}

async function pairOrRefusal(
  database: Database,
  request: MergeItemsRequest,
): Promise<MergeablePair | string> {
  try {
    return await mergeablePair(database, request)
  } catch (error) {
    if (error instanceof AppError) return error.detail
    throw error
  }
}
