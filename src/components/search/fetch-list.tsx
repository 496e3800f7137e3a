import { CircleX } from 'lucide-react'
import Link from 'next/link'
import { itemPagePath } from '@/lib/catalogue-paths'
import type { StockSummary } from '@/schemas/item'
import { partsOf, type SearchedAssembly } from './listed-assembly'

/** What to fetch and from where, part by part: the shopping list of an assembly. */
export function FetchList({ assembly }: { assembly: SearchedAssembly }) {
  return (
    <dl className="flex flex-col">
      {partsOf(assembly).map(({ word, row, tag }) => (
        <div
          key={`${word} ${row.id}`}
          className="border-hairline grid grid-cols-[4.75rem_minmax(0,1fr)] items-center gap-x-2 border-b py-1 last:border-b-0 pointer-coarse:py-0 lg:items-baseline"
        >
          <dt className="text-ink-soft text-sm">{word}</dt>
          <dd className="max-lg:flex max-lg:flex-wrap max-lg:items-center max-lg:gap-x-3">
            <Link
              href={itemPagePath(row.kind, row.id)}
              prefetch={false}
              className="text-accent font-semibold hover:underline pointer-coarse:inline-flex pointer-coarse:min-h-11 pointer-coarse:items-center"
            >
              {row.code}
            </Link>
            {tag ? <span> piece {tag}</span> : null}
            <Place stock={row.stock} />
          </dd>
        </div>
      ))}
    </dl>
  )
}

function Place({ stock }: { stock: StockSummary }) {
  const [fullest, ...others] = stock.locations
  if (!fullest) {
    return (
      <span className="text-collision block font-semibold">
        <CircleX aria-hidden="true" className="mr-1 inline size-4 align-[-0.15em]" />
        Not in a bin
      </span>
    )
  }
  const more = others.reduce((sum, { quantity }) => sum + quantity, 0)
  return (
    <span className="block">
      {fullest.cribCode}, bin <strong className="whitespace-nowrap">{fullest.code}</strong>:{' '}
      {fullest.quantity}
      {more > 0 ? <span className="text-ink-soft"> and {more} elsewhere</span> : null}
      {stock.available <= 0 ? <span className="text-caution font-semibold"> all reserved</span> : null}
    </span>
  )
}
