'use client'

import {
  ClipboardPaste,
  Download,
  Ellipsis,
  type LucideIcon,
  Mail,
  TriangleAlert,
  Truck,
  Upload,
} from 'lucide-react'
import dynamic from 'next/dynamic'
import Link from 'next/link'
import { useState } from 'react'
import { reorderPointsApiPath } from '@/hooks/use-reorder-points'
import { type CatalogueView, queryParams } from '../catalogue/catalogue-view'
import { useBlockPaste } from '../catalogue/use-block-paste'
import { useCan } from '../layout/shop-context'
import { Menu, MenuItem, MenuLink, MenuRule } from '../ui/menu'

const PasteRows = dynamic(() => import('../catalogue/paste-rows'), { ssr: false })

export interface ReorderPointMenuProps {
  view: CatalogueView
  /** On a phone the mark alone. */
  isMarkAlone?: boolean
}

/** Everything one may do with the list, but for adding to it; a block pasted over it opens the dialog too. */
export function ReorderPointMenu({ view, isMarkAlone = false }: ReorderPointMenuProps) {
  const canKeep = useCan('keepCrib')
  const [pasted, setPasted] = useState<string | null>(null)
  useBlockPaste(canKeep, setPasted)
  return (
    <>
      <Menu label="More" Mark={Ellipsis} size="compact" isMarkAlone={isMarkAlone}>
        <PageLink Mark={TriangleAlert} href="/alerts" label="What is low" />
        <PageLink Mark={Truck} href="/suppliers" label="Suppliers" />
        {canKeep ? <PageLink Mark={Mail} href="/crib-members" label="Who gets the mail" /> : null}
        <MenuRule />
        <MenuLink
          Mark={Download}
          link={(content) => (
            <a href={`${reorderPointsApiPath}/export?${queryParams(view)}`} download>
              {content}
            </a>
          )}
        >
          Export as CSV
        </MenuLink>
        {canKeep ? (
          <>
            <MenuRule />
            <MenuItem Mark={ClipboardPaste} onChoose={() => setPasted('')}>
              Paste rows
            </MenuItem>
            <PageLink Mark={Upload} href="/imports/new?kind=reorderPoints" label="Import a file" />
          </>
        ) : null}
      </Menu>
      {pasted === null ? null : (
        <PasteRows
          kind="reorderPoints"
          many="reorder points"
          firstText={pasted}
          onClose={() => setPasted(null)}
        />
      )}
    </>
  )
}

function PageLink({ Mark, href, label }: { Mark: LucideIcon; href: string; label: string }) {
  return (
    <MenuLink
      Mark={Mark}
      link={(content) => (
        <Link href={href} prefetch={false}>
          {content}
        </Link>
      )}
    >
      {label}
    </MenuLink>
  )
}
