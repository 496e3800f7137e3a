'use client'

import type { ReactNode } from 'react'
import { useShop } from '../layout/shop-context'

export interface TitleBlockProps {
  /** ISO 8601, the day the sheet was made. */
  date: string
  className?: string
}

/** The foot of the sheet, as on any drawing: whose, when, by whom, at what scale, by which projection. */
export function TitleBlock({ date, className = '' }: TitleBlockProps) {
  const { shopName, actor, unit } = useShop()
  return (
    <dl className={`border-ink border-t text-sm ${className}`}>
      <Cell name="Reach check" isWide>
        {shopName || 'Leadline'}
      </Cell>
      <Cell name="Drawn for">{actor.name}</Cell>
      <Cell name="Date">{date}</Cell>
      <Cell name="Unit">{unit}</Cell>
      <Cell name="Projection">
        <FirstAngle />
      </Cell>
    </dl>
  )
}

function Cell({ name, isWide, children }: { name: string; isWide?: boolean; children: ReactNode }) {
  return (
    <div className={`border-hairline border-l px-3 py-1 first:border-l-0 ${isWide ? 'flex-1' : ''}`}>
      <dt className="text-ink-soft text-xs">{name}</dt>
      <dd className="font-semibold">{children}</dd>
    </div>
  )
}

/** First-angle projection, the sign of ISO 5456-2: the cone's end view stands on the far side of it. */
function FirstAngle() {
  return (
    <svg viewBox="0 0 48 20" className="h-5 w-12" role="img" aria-label="First angle">
      <g fill="none" stroke="var(--ink)">
        <path d="M3 6L21 2.5V17.5L3 14Z" strokeWidth={1.3} />
        <circle cx={36} cy={10} r={7.5} strokeWidth={1.3} />
        <circle cx={36} cy={10} r={4} strokeWidth={1.3} />
        <path d="M0 10H24M26.5 10H46M36 0.5V19.5" strokeWidth={0.6} strokeDasharray="5 1.5 1 1.5" />
      </g>
    </svg>
  )
}
