import type { Obstacle } from '@/core/reach/types'
import type { HolderSegment } from '@/core/tooling'
import type { CheckContext } from './check-context'
import type { ObstacleDraft, ReachDraft, SegmentDraft } from './reach-draft'
import { type Reading, readField } from './read-field'

/** The obstacles that are typed in full; what is missing or can't be read goes into `unread`. */
export function readObstacles(
  drafts: readonly ObstacleDraft[],
  reading: Reading,
  unread: Record<string, string>,
): Obstacle[] {
  const figure = (text: string, path: string) => readFigure(text, path, reading, unread, true)
  return drafts.flatMap((draft, index) => {
    const setbackMm = figure(draft.setback, `feature.obstacles.${index}.setbackMm`)
    const riseMm = figure(draft.rise, `feature.obstacles.${index}.riseMm`)
    return setbackMm === null || riseMm === null ? [] : [{ setbackMm, riseMm }]
  })
}

/** The outline of a holder or extension: typed, or the catalogue's. */
export function readSegments(
  owner: 'holder' | 'extension',
  draft: ReachDraft,
  { rows, reading }: CheckContext,
  unread: Record<string, string>,
): HolderSegment[] {
  const typed = draft.segments[owner]
  if (typed === null) return [...(rows[owner]?.segments ?? [])].map((row) => ({ part: 'holder', ...row }))
  return typed.flatMap((segment, index) =>
    readSegment(segment, `${owner}.segments.${index}`, reading, unread),
  )
}

/** A row with nothing in it yet is no segment; one half filled says what it lacks. */
function readSegment(
  segment: SegmentDraft,
  path: string,
  reading: Reading,
  unread: Record<string, string>,
): HolderSegment[] {
  if (![segment.length, segment.nose, segment.spindle].some((text) => text.trim() !== '')) return []
  const lengthMm = readFigure(segment.length, `${path}.lengthMm`, reading, unread)
  const noseDiameterMm = readFigure(segment.nose, `${path}.noseDiameterMm`, reading, unread)
  // A cylinder is typed once.
  const spindleDiameterMm =
    segment.spindle.trim() === ''
      ? noseDiameterMm
      : readFigure(segment.spindle, `${path}.spindleDiameterMm`, reading, unread)
  if (lengthMm === null || noseDiameterMm === null || spindleDiameterMm === null) return []
  return [{ part: segment.part, lengthMm, noseDiameterMm, spindleDiameterMm }]
}

function readFigure(
  text: string,
  path: string,
  reading: Reading,
  unread: Record<string, string>,
  allowsZero = false,
): number | null {
  const read = readField(allowsZero ? 'lengthOrZero' : 'length', text, reading)
  if (read.ok && typeof read.value === 'number') return read.value
  unread[path] = read.ok ? 'Enter a length.' : read.message
  return null
}
