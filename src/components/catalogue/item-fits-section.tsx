'use client'

import Link from 'next/link'
import { useState } from 'react'
import { useShop } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { type CatalogueKind, type ToolingKind, toolingKinds } from '@/core/stock/kinds'
import type { LengthUnit } from '@/core/units/length-unit'
import { itemFitsUrl, useFits } from '@/hooks/use-fits'
import { itemPagePath } from '@/lib/catalogue-paths'
import { formatLength } from '@/lib/format-length'
import type { FitsItem } from '@/schemas/fits'
import { cellClass, ItemSection } from './item-section'
import { SectionState } from './section-state'
import { StockWord } from './stock-word'

const kindTitles: Readonly<Record<ToolingKind, string>> = {
  cutter: 'Cutters',
  holder: 'Holders',
  collet: 'Collets',
  extension: 'Extensions',
}

const firstFew = 8
const asManyAsAnswered = 500

/** What can be put together with it, a list for each kind that any fits of. */
export function ItemFitsSection({ itemId, kind }: { itemId: string; kind: CatalogueKind }) {
  return (
    <ItemSection title="What fits it">
      <div className="grid gap-x-8 gap-y-5 pt-3 md:grid-cols-2 xl:grid-cols-3">
        {toolingKinds
          .filter((candidate) => candidate !== kind || kind === 'extension')
          .map((candidate) => (
            <FitsList key={candidate} url={itemFitsUrl(itemId)} kind={candidate} />
          ))}
      </div>
    </ItemSection>
  )
}

/** What of one kind fits what `url` asks about, with how it fits and what is on hand. */
export function FitsList({ url, kind }: { url: string; kind: ToolingKind }) {
  const [isAll, setIsAll] = useState(false)
  const fits = useFits(url, kind, isAll ? asManyAsAnswered : firstFew)
  const title = kindTitles[kind]
  if (fits.error)
    return (
      <SectionState
        sentence={`The ${title.toLowerCase()} that fit could not be loaded. ${fits.error.message}`}
        onRetry={fits.retry}
      />
    )
  if (fits.isLoading) return <SectionState sentence={`Looking for ${title.toLowerCase()} that fit …`} />
  const total = fits.total ?? fits.rows.length
  return (
    <div className="min-w-0">
      <h3 className="flex items-baseline gap-2">
        {title} <span className="text-ink-soft text-sm font-normal">{total === 0 ? 'none fits' : total}</span>
      </h3>
      {total === 0 ? null : (
        <table className="w-full table-fixed">
          <colgroup>
            <col className="w-[34%]" />
            <col />
            <col className="w-18" />
          </colgroup>
          <thead className="sr-only">
            <tr>
              <th scope="col">Code</th>
              <th scope="col">How it fits</th>
              <th scope="col">On hand</th>
            </tr>
          </thead>
          <tbody>
            {fits.rows.map((row) => (
              <FitsRow key={row.id} row={row} />
            ))}
          </tbody>
        </table>
      )}
      {total > fits.rows.length && !isAll ? (
        <Button variant="quiet" size="compact" className="-ml-3 print:hidden" onClick={() => setIsAll(true)}>
          Show all {total}
        </Button>
      ) : null}
    </div>
  )
}

function FitsRow({ row }: { row: FitsItem }) {
  const { unit } = useShop()
  return (
    <tr className="border-hairline border-b align-baseline">
      <th scope="row" className={`${cellClass} truncate text-left font-normal`}>
        <Link
          href={itemPagePath(row.kind, row.id)}
          prefetch={false}
          className="text-accent inline-flex items-center font-semibold hover:underline pointer-coarse:min-h-11"
        >
          {row.code}
        </Link>
      </th>
      <td className={`${cellClass} text-sm`}>{fitWords(row, unit)}</td>
      <td className={`${cellClass} text-right whitespace-nowrap`}>
        <StockWord stock={{ onHand: row.onHand, isLow: false }} className="text-sm" /> {row.onHand}
      </td>
    </tr>
  )
}

/** What makes it fit; where in a collet's range the shank sits, since the small end grips worst. */
function fitWords(row: FitsItem, unit: LengthUnit): string {
  const length = (mm: number) => formatLength(mm, unit)
  const parts: string[] = []
  if (row.series) parts.push(row.series)
  if (row.minimumMm !== null && row.maximumMm !== null)
    parts.push(`${formatLength(row.minimumMm, unit, { withUnit: false })} to ${length(row.maximumMm)}`)
  if (row.boreDiameterMm !== null) parts.push(`bore ${length(row.boreDiameterMm)}`)
  if (row.shankDiameterMm !== null) parts.push(`shank ${length(row.shankDiameterMm)}`)
  if (row.placeInRange !== null) parts.push(rangeWords(row.placeInRange))
  if (row.kind !== 'collet' && row.description) parts.push(row.description)
  return parts.join(' · ')
}

function rangeWords(place: number): string {
  if (place <= 0.25) return 'at its small end: grips worst'
  return place >= 0.75 ? 'at its large end' : 'within its range'
}
