'use client'

import { boreWords } from '@/components/catalogue/bore-words'
import { attemptedOutline } from '@/components/drawing/attempted-outline'
import { NoDrawing } from '@/components/drawing/no-drawing'
import { SegmentedBodyDrawing } from '@/components/drawing/segmented-body-drawing'
import { useShop } from '@/components/layout/shop-context'
import { extensionOutline } from '@/core/outline/holder-outline'
import type { Bore, ExtensionGeometry } from '@/core/tooling'
import { formatLength } from '@/lib/format-length'

export interface ExtensionDrawingProps {
  code: string
  extension: ExtensionGeometry & { bore: Bore }
}

/** The extension lying, its own nose to the right, the holder's nose face to the left. */
export function ExtensionDrawing({ code, extension }: ExtensionDrawingProps) {
  const { unit } = useShop()
  const { parts, reason } = attemptedOutline(() => extensionOutline(extension))
  if (parts === null) return <NoDrawing reason={reason} />
  const length = (mm: number) => formatLength(mm, unit)
  const segments = extension.segments.map(
    (segment) =>
      `${length(segment.lengthMm)} long, diameter ${length(segment.noseDiameterMm)} to ${length(segment.spindleDiameterMm)}`,
  )
  return (
    <SegmentedBodyDrawing
      code={code}
      unit={unit}
      sentence={`Drawing to scale: extension, projection ${length(extension.projectionMm)}, ${boreWords(extension.bore, unit)}; from the nose: ${segments.join('; ')}.`}
      parts={parts}
      segments={extension.segments}
      length={{ symbol: 'E', mm: extension.projectionMm }}
      datum="Holder's nose"
      bore={{
        diameterMm: extension.bore.kind === 'fixed' ? extension.bore.diameterMm : null,
        depthMm: extension.boreDepthMm ?? null,
        words: boreWords(extension.bore, unit),
      }}
    />
  )
}
