import type { PartPoint } from '@/core/reach/placement'
import { draftingFontSize, draftingTextWidth, lineWidths } from '../drawing/drafting-style'
import { onSheet, type SectionLayout } from './section-layout'

export interface TouchMarkProps {
  at: PartPoint
  layout: SectionLayout
  text: string
  tone: 'collision' | 'next' | 'asked'
}

const colours = { collision: 'var(--collision)', next: 'var(--ink)', asked: 'var(--accent)' } as const
const arm = 7

/** A cross where a part of the tool first touches, and a leader with its name and height in words. */
export function TouchMark({ at, layout, text, tone }: TouchMarkProps) {
  const point = onSheet(layout, at.uMm, at.hMm)
  const isSeen = point.y > 8 && point.y < layout.sheet.height && point.x > 0 && point.x < layout.sheet.width
  if (!isSeen) return null
  const width = draftingTextWidth(text) + 8
  const goesRight = point.x + 34 + width < layout.sheet.width - 6
  const side = goesRight ? 1 : -1
  const shoulder = { x: point.x + side * 26, y: Math.max(20, point.y - 26) }
  const isWide = shoulder.x + side * width > 0
  const end = isWide ? shoulder.x + side * width : 4
  const colour = colours[tone]
  return (
    <g stroke={colour} fill="none" strokeLinecap="round">
      <path strokeWidth={lineWidths.thin} d={`M${point.x} ${point.y}L${shoulder.x} ${shoulder.y}H${end}`} />
      <path
        strokeWidth={2.6}
        d={`M${point.x - arm} ${point.y - arm}l${2 * arm} ${2 * arm}M${point.x + arm} ${point.y - arm}l${-2 * arm} ${2 * arm}`}
      />
      <text
        x={(shoulder.x + end) / 2}
        y={shoulder.y - 5}
        textAnchor="middle"
        fontSize={draftingFontSize + 0.5}
        fontWeight={700}
        fill={colour}
        stroke="var(--sheet)"
        strokeWidth={4}
        paintOrder="stroke"
      >
        {text}
      </text>
    </g>
  )
}
