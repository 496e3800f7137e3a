'use client'

import Link from 'next/link'
import { Notice } from '@/components/ui/notice'
import { useItemMerges } from '@/hooks/use-duplicates'
import { itemPagePath } from '@/lib/catalogue-paths'
import type { ItemMerges } from '@/schemas/duplicate'

/** Where an item went, or what it took in; nothing for most. */
export function MergesNotice({ itemId }: { itemId: string }) {
  const merges = useItemMerges(itemId)
  if (!merges || (merges.into === null && merges.from.length === 0)) return null
  return (
    <Notice kind="plain">
      {merges.into ? (
        <p>
          It was merged into <ItemLink item={merges.into} />, which has its pieces now. What happened before
          stands here, under the old code.
        </p>
      ) : null}
      {merges.from.length > 0 ? (
        <p>
          It took in{' '}
          {merges.from.map((item, index) => (
            <span key={item.id}>
              {index > 0 ? ', ' : ''}
              <ItemLink item={item} />
            </span>
          ))}
          , whose earlier movements stand there.
        </p>
      ) : null}
    </Notice>
  )
}

function ItemLink({ item }: { item: ItemMerges['from'][number] }) {
  return (
    <Link
      href={itemPagePath(item.kind, item.id)}
      prefetch={false}
      className="text-accent font-semibold underline"
    >
      {item.code}
    </Link>
  )
}
