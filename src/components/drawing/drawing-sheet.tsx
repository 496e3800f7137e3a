'use client'

import type { ReactNode } from 'react'
import type { LengthUnit } from '@/core/units/length-unit'
import { DrawnNames } from './drawn-names'
import { useElementWidth } from './use-element-width'

export interface SheetContent {
  height: number
  scaleName: string
  body: ReactNode
}

export interface DrawingSheetProps {
  /** What the drawing shows, as one sentence. */
  sentence: string
  /** What the title block calls it, where it is an item of the crib. */
  code?: string
  unit: LengthUnit
  /** Lays the drawing out for a width in px. */
  draw: (width: number) => SheetContent
  note?: string
}

const firstWidth = 900

/** A drawing on its sheet: a thin frame, the drawing as large as the room allows, the title block at its foot. */
export function DrawingSheet({ sentence, code, unit, draw, note }: DrawingSheetProps) {
  const [ref, width] = useElementWidth<HTMLDivElement>(firstWidth)
  const { height, scaleName, body } = draw(width)
  return (
    <figure className="border-ink bg-sheet border">
      <div ref={ref} className="overflow-hidden">
        <DrawnNames>
          <svg
            role="img"
            aria-label={sentence}
            viewBox={`0 0 ${width} ${height}`}
            className="block h-auto w-full"
          >
            {body}
          </svg>
        </DrawnNames>
      </div>
      <figcaption className="border-ink flex flex-wrap justify-end border-t text-sm">
        {note ? <span className="text-ink-soft mr-auto px-3 py-1.5">{note}</span> : null}
        <TitleCell name="Scale" value={scaleName} className="print:hidden" />
        <TitleCell name="Unit" value={unit} />
        {code ? <TitleCell name="Code" value={code} /> : null}
      </figcaption>
    </figure>
  )
}

function TitleCell({ name, value, className = '' }: { name: string; value: string; className?: string }) {
  return (
    <span className={`border-hairline border-l px-3 py-1.5 first:border-l-0 ${className}`}>
      <span className="text-ink-soft">{name} </span>
      <span className="font-semibold">{value}</span>
    </span>
  )
}
