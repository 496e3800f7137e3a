import type { CutterGeometry } from '@/core/tooling'
import type { LengthUnit } from '@/core/units/length-unit'
import { cutterFormNames } from '@/lib/cutter-words'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'

/** The drawing of a cutter in words, for those who hear it. */
export function cutterSentence(cutter: CutterGeometry, unit: LengthUnit): string {
  const length = (name: string, mm: number | null | undefined) =>
    mm == null ? [] : [`${name} ${formatLength(mm, unit)}`]
  const angle = (name: string, deg: number | null | undefined) =>
    deg == null ? [] : [`${name} ${formatAngle(deg)}`]
  const facts = [
    ...length('cutting diameter', cutter.cuttingDiameterMm),
    ...length('corner radius', cutter.cornerRadiusMm),
    ...angle('taper a side', cutter.taperHalfAngleDeg),
    ...angle('point angle', cutter.pointAngleDeg),
    ...length('length of cut', cutter.lengthOfCutMm),
    ...length('fluted length', cutter.fluteLengthMm),
    ...length('neck diameter', cutter.neckDiameterMm),
    ...length('reach length', cutter.reachLengthMm),
    ...length('shank diameter', cutter.shankDiameterMm),
    ...length('overall length', cutter.overallLengthMm),
  ]
  return `Drawing to scale: ${cutterFormNames[cutter.form].toLowerCase()}, ${facts.join(', ')}.`
}
