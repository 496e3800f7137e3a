import type { FieldValues } from 'react-hook-form'

/**
 * A body drawn before its form is full: segments that are typed whole, as long as they are together where the length
 * is not given yet, and some bore.
 */
export function withWholeSegments(
  body: FieldValues,
  lengthField: 'gaugeLengthMm' | 'projectionMm',
): FieldValues {
  const segments: FieldValues[] = (body.segments ?? []).filter(
    (segment: FieldValues) => segment.lengthMm && segment.noseDiameterMm && segment.spindleDiameterMm,
  )
  const sumMm = segments.reduce((sum, segment) => sum + segment.lengthMm, 0)
  const isBoreKnown = body.bore?.kind === 'fixed' ? body.bore.diameterMm : body.bore?.series
  return {
    ...body,
    segments,
    [lengthField]: body[lengthField] ?? sumMm,
    bore: isBoreKnown ? body.bore : { kind: 'collet', series: '–' },
  }
}
