import type { PartPoint } from '@/core/reach/placement'
import { draftingFontSize, draftingTextWidth, lineWidths, type Point } from '../drawing/drafting-style'
import { onSheet, type SectionLayout } from './section-layout'

export interface TouchMarkProps {
  at: PartPoint
  layout: SectionLayout
  text: string
  tone: 'collision' | 'next' | 'asked'
  /** How far below the cross the words stand, where the holder would be in their way above it; else null. */
  dropPx: number | null
}

const colours = { collision: 'var(--collision)', next: 'var(--ink)', asked: 'var(--accent)' } as const
const arm = 7

/** A cross where a part of the tool first touches, and a leader with its name and height in words. */
export function TouchMark({ at, layout, text, tone, dropPx }: TouchMarkProps) {
  const point = onSheet(layout, at.uMm, at.hMm)
  const isSeen = point.y > 8 && point.y < layout.sheet.height && point.x > 0 && point.x < layout.sheet.width
  if (!isSeen) return null
  const shoulder = shoulderOf(point, draftingTextWidth(text) + 8, layout.sheet.width, dropPx)
  const colour = colours[tone]
  return (
    <g stroke={colour} fill="none" strokeLinecap="round">
      <path
        strokeWidth={lineWidths.thin}
        d={`M${point.x} ${point.y}L${shoulder.x} ${shoulder.y}H${shoulder.endX}`}
      />
      <TouchCross at={at} layout={layout} tone={tone} />
      <text
        x={(shoulder.x + shoulder.endX) / 2}
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

/** The cross alone, where there is no room for words. */
export function TouchCross({ at, layout, tone }: Pick<TouchMarkProps, 'at' | 'layout' | 'tone'>) {
  const point = onSheet(layout, at.uMm, at.hMm)
  return (
    <path
      stroke={colours[tone]}
      strokeWidth={2.6}
      strokeLinecap="round"
      d={`M${point.x - arm} ${point.y - arm}l${2 * arm} ${2 * arm}M${point.x + arm} ${point.y - arm}l${-2 * arm} ${2 * arm}`}
    />
  )
}

const reachOut = 26
const rim = 6

/** To the right where the words fit there, else to the left, else as far right as the sheet goes. */
function shoulderOf(point: Point, width: number, sheetWidth: number, dropPx: number | null) {
  const y = dropPx === null ? Math.max(20, point.y - reachOut) : point.y + dropPx
  const [right, left] = [point.x + reachOut, point.x - reachOut]
  if (right + width <= sheetWidth - rim) return { x: right, endX: right + width, y }
  if (left - width >= rim) return { x: left, endX: left - width, y }
  const x = Math.max(rim, sheetWidth - rim - width)
  return { x, endX: x + width, y }
}
