'use client'

import { boreWords } from '@/components/catalogue/bore-words'
import { attemptedOutline } from '@/components/drawing/attempted-outline'
import { NoDrawing } from '@/components/drawing/no-drawing'
import { SegmentedBodyDrawing } from '@/components/drawing/segmented-body-drawing'
import { useShop } from '@/components/layout/shop-context'
import { holderOutline } from '@/core/outline/holder-outline'
import type { Bore, HolderGeometry } from '@/core/tooling'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'

export interface HolderDrawingProps {
  code: string
  holder: HolderGeometry & { bore: Bore }
}

/** The holder lying, nose to the right, the gauge line to the left. */
export function HolderDrawing({ code, holder }: HolderDrawingProps) {
  const { unit } = useShop()
  const { parts, reason } = attemptedOutline(() => holderOutline(holder))
  if (parts === null) return <NoDrawing reason={reason} />
  return (
    <SegmentedBodyDrawing
      code={code}
      unit={unit}
      sentence={holderSentence(holder, unit)}
      parts={parts.filter((part) => part.part !== 'spindle')}
      segments={holder.segments}
      length={{ symbol: 'A', mm: holder.gaugeLengthMm }}
      datum="Gauge line"
      bore={{
        diameterMm: holder.bore.kind === 'fixed' ? holder.bore.diameterMm : null,
        depthMm: holder.boreDepthMm ?? null,
        words: boreWords(holder.bore, unit),
      }}
    />
  )
}

function holderSentence(holder: HolderDrawingProps['holder'], unit: LengthUnit): string {
  const length = (mm: number) => formatLength(mm, unit)
  const segments = holder.segments.map(
    (segment) =>
      `${segment.part === 'nut' ? 'nut' : 'body'} ${length(segment.lengthMm)} long, diameter ${length(segment.noseDiameterMm)} to ${length(segment.spindleDiameterMm)}`,
  )
  return `Drawing to scale: holder, gauge length ${length(holder.gaugeLengthMm)}, ${boreWords(holder.bore, unit)}; from the nose: ${segments.join('; ')}.`
}
