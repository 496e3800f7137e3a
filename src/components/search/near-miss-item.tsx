'use client'

import { CircleX } from 'lucide-react'
import Link from 'next/link'
import { itemPagePath } from '@/lib/catalogue-paths'
import type { SearchNearMissResponse } from '@/schemas/reach-search'
import { AssemblyItem } from './assembly-item'
import type { AssemblyListing } from './listed-assembly'

/** What falls short: what stops it, and the smallest changes that would make it reach. */
export function NearMissItem({ miss, listing }: { miss: SearchNearMissResponse; listing: AssemblyListing }) {
  return (
    <AssemblyItem assembly={miss} place={null} listing={listing}>
      <p className="flex gap-1.5">
        <CircleX aria-hidden="true" className="text-collision mt-0.5 size-4.5 shrink-0" />
        <span>{miss.reason}</span>
      </p>
      {miss.changes.length > 0 ? (
        <ul className="mt-1 list-disc pl-6" aria-label="What would help">
          {miss.changes.map(({ kind, text, itemId }) => (
            <li key={text}>
              {itemId !== null && (kind === 'holder' || kind === 'extension') ? (
                <Link
                  href={itemPagePath(kind, itemId)}
                  prefetch={false}
                  className="text-accent font-semibold hover:underline pointer-coarse:inline-flex pointer-coarse:min-h-11 pointer-coarse:items-center"
                >
                  {text}
                </Link>
              ) : (
                text
              )}
            </li>
          ))}
        </ul>
      ) : null}
    </AssemblyItem>
  )
}
