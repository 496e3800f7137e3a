'use client'

import Link from 'next/link'
import { useId, useState } from 'react'
import type { CatalogueKind } from '@/core/stock/kinds'
import { itemPagePath } from '@/lib/catalogue-paths'
import type { DuplicateItem } from '@/schemas/duplicate'
import { Button } from '../ui/button'
import type { MergePair } from './merge-dialog'

export interface DuplicateGroupProps {
  kind: CatalogueKind
  /** What they all measure, in words. */
  size: string
  /** The one most worth keeping first. */
  items: readonly DuplicateItem[]
  onMerge: (pair: MergePair) => void
}

/** Items of one geometry: which to keep is chosen, the others are merged into it one by one. */
export function DuplicateGroup({ kind, size, items, onMerge }: DuplicateGroupProps) {
  const groupId = useId()
  const [keptId, setKeptId] = useState(items[0]?.id)
  const kept = items.find(({ id }) => id === keptId) ?? items[0]
  if (!kept) return null
  return (
    <table className="border-ink w-full border-t-2 sm:table-fixed" aria-label={`The same as ${kept.code}`}>
      <caption className="pt-1.5 text-left font-semibold">{size}</caption>
      <thead className="max-sm:sr-only">
        <tr className="border-hairline text-ink-soft border-b text-left text-sm [&>th]:py-1.5 [&>th]:pr-3 [&>th]:font-normal">
          <th scope="col" className="w-24">
            Keep
          </th>
          <th scope="col">Item</th>
          <th scope="col">Maker and number</th>
          <th scope="col" className="w-24 text-right">
            On hand
          </th>
          <th scope="col" className="w-56 lg:w-72">
            <span className="sr-only">Merge</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {items.map((item) => (
          <tr
            key={item.id}
            className="border-hairline border-b align-baseline max-sm:grid max-sm:grid-cols-[auto_1fr_auto] max-sm:gap-x-3 max-sm:py-2 [&>td]:py-1.5 [&>td]:pr-3"
          >
            <td>
              <label className="flex min-h-8 items-center gap-2 pointer-coarse:min-h-11">
                <input
                  type="radio"
                  className="accent-accent size-5"
                  name={groupId}
                  checked={item.id === kept.id}
                  onChange={() => setKeptId(item.id)}
                />
                <span className="sr-only">Keep {item.code}</span>
              </label>
            </td>
            <td>
              <Link
                href={itemPagePath(kind, item.id)}
                prefetch={false}
                className="text-accent font-semibold hover:underline"
              >
                {item.code}
              </Link>
              <span className="text-ink-soft block text-sm">
                {[item.description, item.isTrackedByPiece ? 'tracked piece by piece' : '', pointText(item)]
                  .filter(Boolean)
                  .join(' · ')}
              </span>
            </td>
            <td className="max-sm:order-last max-sm:col-span-2 max-sm:col-start-2 max-sm:text-sm">
              {[item.maker, item.partNumber].filter(Boolean).join(' ') || 'No maker'}
            </td>
            <td className="text-right">{item.onHand}</td>
            <td className="text-right max-sm:order-last max-sm:col-span-3">
              {item.id === kept.id ? (
                <span className="text-ink-soft text-sm">is kept</span>
              ) : (
                <Button size="compact" onClick={() => onMerge({ kept, merged: item })}>
                  Merge into {kept.code}
                </Button>
              )}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}

function pointText({ reorderPoints }: DuplicateItem): string {
  if (reorderPoints === 0) return ''
  return reorderPoints === 1 ? 'has a reorder point' : `has ${reorderPoints} reorder points`
}
