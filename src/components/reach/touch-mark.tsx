import type { PartPoint } from '@/core/reach/placement'
import { draftingFontSize, draftingTextWidth, lineWidths, type Point } from '../drawing/drafting-style'
import { isNarrow, onSheet, type SectionLayout } from './section-layout'

export interface TouchMarkProps {
  at: PartPoint
  layout: SectionLayout
  text: string
  tone: TouchTone
  /** How far below the cross the words stand, where the holder would be in their way above it; else null. */
  dropPx: number | null
}

type TouchTone = 'collision' | 'next' | 'asked'

const colours = { collision: 'var(--collision)', next: 'var(--ink)', asked: 'var(--accent)' } as const
const arm = 7

/**
 * A cross where a part of the tool first touches, and a leader with its name and height in words. A phone has no room
 * for words between the figures: they stand at the foot of the sheet, or at its head, behind a cross of their own.
 */
export function TouchMark({ at, layout, text, tone, dropPx }: TouchMarkProps) {
  const point = onSheet(layout, at.uMm, at.hMm)
  const isSeen = point.y > 8 && point.y < layout.sheet.height && point.x > 0 && point.x < layout.sheet.width
  if (!isSeen) return null
  if (isNarrow(layout.sheet)) {
    return (
      <>
        <Cross at={point} armPx={arm} tone={tone} />
        <Caption layout={layout} text={text} tone={tone} />
      </>
    )
  }
  const shoulder = shoulderOf(point, draftingTextWidth(text) + 8, layout.sheet.width, dropPx)
  const colour = colours[tone]
  return (
    <g stroke={colour} fill="none" strokeLinecap="round">
      <path
        strokeWidth={lineWidths.thin}
        d={`M${point.x} ${point.y}L${shoulder.x} ${shoulder.y}H${shoulder.endX}`}
      />
      <Cross at={point} armPx={arm} tone={tone} />
      <Words x={(shoulder.x + shoulder.endX) / 2} y={shoulder.y - 5} text={text} tone={tone} />
    </g>
  )
}

/** The cross alone, where there is no room for words. */
export function TouchCross({ at, layout, tone }: Pick<TouchMarkProps, 'at' | 'layout' | 'tone'>) {
  return <Cross at={onSheet(layout, at.uMm, at.hMm)} armPx={arm} tone={tone} />
}

function Cross({ at: { x, y }, armPx, tone }: { at: Point; armPx: number; tone: TouchTone }) {
  const [out, across] = [armPx, 2 * armPx]
  return (
    <path
      stroke={colours[tone]}
      strokeWidth={2.6}
      strokeLinecap="round"
      d={`M${x - out} ${y - out}l${across} ${across}M${x + out} ${y - out}l${-across} ${across}`}
    />
  )
}

interface WordsProps {
  x: number
  y: number
  text: string
  tone: TouchTone
  anchor?: 'start' | 'middle'
}

function Words({ x, y, text, tone, anchor = 'middle' }: WordsProps) {
  return (
    <text
      x={x}
      y={y}
      textAnchor={anchor}
      fontSize={draftingFontSize + 0.5}
      fontWeight={700}
      fill={colours[tone]}
      stroke="var(--sheet)"
      strokeWidth={4}
      paintOrder="stroke"
    >
      {text}
    </text>
  )
}

/** What limits stands at the foot of the sheet, the part asked about beside the scale. */
function Caption({ layout, text, tone }: Pick<TouchMarkProps, 'layout' | 'text' | 'tone'>) {
  const isAsked = tone === 'asked'
  const width = draftingTextWidth(text) + captionCross
  const x = isAsked ? layout.sheet.width - rim - width : captionCross
  const y = isAsked ? 24 : layout.sheet.height - rim - 4
  return (
    <g>
      <Cross at={{ x: x + 2, y: y - 5 }} armPx={5} tone={tone} />
      <Words x={x + captionCross} y={y} text={text} tone={tone} anchor="start" />
    </g>
  )
}

const reachOut = 26
const rim = 6
const captionCross = 14

/** To the right where the words fit there, else to the left, else as far right as the sheet goes. */
function shoulderOf(point: Point, width: number, sheetWidth: number, dropPx: number | null) {
  const y = dropPx === null ? Math.max(20, point.y - reachOut) : point.y + dropPx
  const [right, left] = [point.x + reachOut, point.x - reachOut]
  if (right + width <= sheetWidth - rim) return { x: right, endX: right + width, y }
  if (left - width >= rim) return { x: left, endX: left - width, y }
  const x = Math.max(rim, sheetWidth - rim - width)
  return { x, endX: x + width, y }
}
