import type { HolderSegmentPart } from '@/core/tooling'
import type { FieldGroup, ToolSlot } from './reach-fields'

/** A segment of an outline as it is being typed. */
export interface SegmentDraft {
  /** Tells the rows apart while they come and go. */
  key: number
  part: HolderSegmentPart
  length: string
  nose: string
  spindle: string
}

export interface ObstacleDraft {
  key: number
  setback: string
  rise: string
}

type GroupTexts = Readonly<Record<string, string>>

/**
 * A check as the person has it: what is picked, what is typed, nothing worked out. A text that is there, though empty,
 * was typed and stands before the catalogue's figure; segments of null are the catalogue's.
 */
export interface ReachDraft {
  featureKind: 'wall' | 'hole'
  picks: Readonly<Record<ToolSlot, string | null>>
  texts: Readonly<Record<FieldGroup, GroupTexts>>
  obstacles: readonly ObstacleDraft[]
  segments: { holder: readonly SegmentDraft[] | null; extension: readonly SegmentDraft[] | null }
}

/** A key no row of the list has. */
export function newRowKey(rows: readonly { key: number }[]): number {
  return Math.max(0, ...rows.map(({ key }) => key)) + 1
}

/** What of a draft concerns the tools alone: it stays the same object while the feature is dragged. */
export interface ToolDraft {
  picks: ReachDraft['picks']
  texts: Readonly<Record<ToolSlot, GroupTexts>>
  segments: ReachDraft['segments']
}

const noTexts: GroupTexts = {}

export const emptyDraft: ReachDraft = {
  featureKind: 'wall',
  picks: { cutter: null, holder: null, collet: null, extension: null },
  texts: {
    feature: noTexts,
    cutter: noTexts,
    holder: noTexts,
    collet: noTexts,
    extension: noTexts,
    check: noTexts,
  },
  obstacles: [],
  segments: { holder: null, extension: null },
}

export type DraftChange =
  | { type: 'text'; group: FieldGroup; name: string; text: string }
  /** Back to the catalogue's figure, or to what the shop or the answer says. */
  | { type: 'forget'; group: FieldGroup; name: string }
  | { type: 'featureKind'; kind: ReachDraft['featureKind'] }
  | { type: 'pick'; slot: ToolSlot; id: string | null }
  | { type: 'obstacles'; obstacles: readonly ObstacleDraft[] }
  | { type: 'segments'; owner: 'holder' | 'extension'; segments: readonly SegmentDraft[] | null }
  | { type: 'replace'; draft: ReachDraft }

/** The draft after one change; groups that did not change stay the same object, so that only one column is drawn anew. */
export function changedDraft(draft: ReachDraft, change: DraftChange): ReachDraft {
  switch (change.type) {
    case 'text':
      return withTexts(draft, change.group, { ...draft.texts[change.group], [change.name]: change.text })
    case 'forget': {
      const { [change.name]: _, ...rest } = draft.texts[change.group]
      return withTexts(draft, change.group, rest)
    }
    case 'featureKind':
      return { ...draft, featureKind: change.kind }
    case 'pick':
      return picked(draft, change.slot, change.id)
    case 'obstacles':
      return { ...draft, obstacles: change.obstacles }
    case 'segments':
      return { ...draft, segments: { ...draft.segments, [change.owner]: change.segments } }
    case 'replace':
      return change.draft
  }
}

function withTexts(draft: ReachDraft, group: FieldGroup, texts: GroupTexts): ReachDraft {
  return { ...draft, texts: { ...draft.texts, [group]: texts } }
}

/** A newly picked tool comes as the catalogue has it: what was typed for another is not its own. */
function picked(draft: ReachDraft, slot: ToolSlot, id: string | null): ReachDraft {
  const cleared = withTexts({ ...draft, picks: { ...draft.picks, [slot]: id } }, slot, noTexts)
  if (slot !== 'holder' && slot !== 'extension') return cleared
  return { ...cleared, segments: { ...cleared.segments, [slot]: null } }
}

/** Whether anything of a tool was picked or typed. */
export function isSlotUsed(draft: ToolDraft, slot: ToolSlot): boolean {
  const hasSegments = (slot === 'holder' || slot === 'extension') && draft.segments[slot] !== null
  const isTyped = Object.values(draft.texts[slot]).some((text) => text.trim() !== '')
  return draft.picks[slot] !== null || isTyped || hasSegments
}

export function isDraftEmpty(draft: ReachDraft): boolean {
  const slots: readonly ToolSlot[] = ['cutter', 'holder', 'collet', 'extension']
  const hasFeature = Object.values(draft.texts.feature).some((text) => text.trim() !== '')
  return !hasFeature && draft.obstacles.length === 0 && !slots.some((slot) => isSlotUsed(draft, slot))
}
