import type { OutlineSegment } from '@/core/tooling'

export interface PlacedSegment extends OutlineSegment {
  /** Its place and part of its key in a list. */
  key: string
  fromMm: number
  toMm: number
}

/** Segments with where each begins and ends above the nose face. */
export function placedSegments(segments: readonly OutlineSegment[]): PlacedSegment[] {
  let fromMm = 0
  return segments.map((segment, index) => {
    const placed = { ...segment, key: `segment-${index}`, fromMm, toMm: fromMm + segment.lengthMm }
    fromMm = placed.toMm
    return placed
  })
}
