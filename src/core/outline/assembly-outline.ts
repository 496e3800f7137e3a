import type { CutterGeometry, ExtensionGeometry, HolderGeometry } from '@/core/tooling'
import { cutterOutline } from './cutter-outline'
import { extensionOutline, holderOutline } from './holder-outline'
import { strokesBetween } from './stroke-chain'
import type { OutlinePart, OutlineStroke } from './types'

/**
 * Outline of what hangs from the spindle, for a section drawing: the cutter as far as it sticks out, the extension,
 * the holder and the spindle's face.
 *
 * Units      Millimetres; z from the tool tip.
 * Result     Parts from the tip up. The spindle's face ends at Infinity where its width is not known.
 * Errors     As `cutterOutline`, `extensionOutline`, `holderOutline`.
 *
 * @example
 * assemblyOutline({ form: 'square', cuttingDiameterMm: 6, lengthOfCutMm: 12, shankDiameterMm: 6, overallLengthMm: 60 }, { gaugeLengthMm: 80, segments: [{ part: 'holder', lengthMm: 80, noseDiameterMm: 20, spindleDiameterMm: 30 }] }, null, 30).at(-1).segments[0].fromZMm // => 110
 */
export function assemblyOutline(
  cutter: CutterGeometry,
  holder: HolderGeometry,
  extension: ExtensionGeometry | null | undefined,
  stickOutMm: number,
): OutlinePart[] {
  const holderNoseMm = stickOutMm + (extension?.projectionMm ?? 0)
  const exposed = cutterOutline(cutter)
    .map(({ part, segments }) => ({ part, segments: strokesBetween(segments, 0, stickOutMm) }))
    .filter(({ segments }) => segments.length > 0)
  return [
    ...exposed,
    ...(extension ? extensionOutline(extension) : []).map((part) => raised(part, stickOutMm)),
    ...holderOutline(holder).map((part) => raised(part, holderNoseMm)),
  ]
}

function raised({ part, segments }: OutlinePart, byMm: number): OutlinePart {
  return { part, segments: segments.map((stroke) => raisedStroke(stroke, byMm)) }
}

function raisedStroke(stroke: OutlineStroke, byMm: number): OutlineStroke {
  const ends = { fromZMm: stroke.fromZMm + byMm, toZMm: stroke.toZMm + byMm }
  return stroke.kind === 'arc'
    ? { ...stroke, ...ends, centreZMm: stroke.centreZMm + byMm }
    : { ...stroke, ...ends }
}
