'use client'

import { Archive, PackageMinus, PackagePlus, Pencil, Ruler } from 'lucide-react'
import Link from 'next/link'
import { useCan, useShop } from '@/components/layout/shop-context'
import { Button, ButtonLink } from '@/components/ui/button'
import { cataloguePaths } from '@/lib/catalogue-paths'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'

export type ItemAct = 'issue' | 'return' | 'edit' | 'archive'

/** The item's names, and what can be done with it. */
export function ItemHeading<Row extends CatalogueRow>({
  definition,
  row,
  onAct,
}: {
  definition: CatalogueDefinition<Row>
  row: Row
  onAct: (act: ItemAct) => void
}) {
  const { unit } = useShop()
  const mayMove = useCan('move')
  const mayKeep = useCan('keepCrib')
  const source = [row.maker, row.partNumber].filter(Boolean).join(' ')
  return (
    <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        <p className="text-sm print:hidden">
          <Link
            href={cataloguePaths[row.kind]}
            prefetch={false}
            className="text-accent inline-flex min-h-6 items-center hover:underline pointer-coarse:min-h-11"
          >
            {definition.title}
          </Link>
        </p>
        <h1 className="text-2xl break-words">{row.code}</h1>
        <p>{definition.facts(row, unit)}</p>
        {row.description ? <p className="max-w-[75ch] whitespace-pre-line">{row.description}</p> : null}
        {source ? <p className="text-ink-soft text-[0.9375rem]">{source}</p> : null}
      </div>
      <div className="flex flex-wrap gap-2 print:hidden">
        {row.kind === 'fixture' ? null : (
          <ButtonLink variant="primary" size="compact" href={`/reach?${row.kind}=${row.id}`} prefetch={false}>
            <Ruler aria-hidden="true" className="size-4.5" />
            Check reach
          </ButtonLink>
        )}
        {mayMove ? (
          <>
            <Button size="compact" onClick={() => onAct('issue')}>
              <PackageMinus aria-hidden="true" className="size-4.5" />
              Issue
            </Button>
            <Button size="compact" onClick={() => onAct('return')}>
              <PackagePlus aria-hidden="true" className="size-4.5" />
              Return
            </Button>
          </>
        ) : null}
        {mayKeep ? (
          <>
            <Button size="compact" onClick={() => onAct('edit')}>
              <Pencil aria-hidden="true" className="size-4.5" />
              Edit
            </Button>
            {row.archivedAt ? null : (
              <Button variant="quiet" size="compact" onClick={() => onAct('archive')}>
                <Archive aria-hidden="true" className="size-4.5" />
                Archive
              </Button>
            )}
          </>
        ) : null}
      </div>
    </div>
  )
}
