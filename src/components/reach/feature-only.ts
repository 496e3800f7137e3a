import { emptyDraft, type ReachDraft } from './reach-draft'
import { draftQuery } from './reach-query'
import type { Reading } from './read-field'

/** Of a check the feature and its clearances alone: what a search of the crib asks, whatever tool was being tried. */
export function featureOnly(draft: ReachDraft): ReachDraft {
  const { clearanceShankMm, clearanceHolderMm } = draft.texts.check
  const check = {
    ...(clearanceShankMm === undefined ? {} : { clearanceShankMm }),
    ...(clearanceHolderMm === undefined ? {} : { clearanceHolderMm }),
  }
  return {
    ...emptyDraft,
    featureKind: draft.featureKind,
    obstacles: draft.obstacles,
    texts: { ...emptyDraft.texts, feature: draft.texts.feature, check },
  }
}

/** Where the crib is searched for what makes this feature. */
export function searchPath(draft: ReachDraft, reading: Reading): string {
  return `/search?${draftQuery(featureOnly(draft), reading)}`
}
