'use client'

import {
  Bookmark,
  ClipboardPaste,
  Columns3,
  Download,
  Ellipsis,
  ListChecks,
  Pencil,
  Printer,
  Upload,
} from 'lucide-react'
import Link from 'next/link'
import type { RefObject } from 'react'
import { useCan } from '@/components/layout/shop-context'
import { Menu, MenuItem, MenuLink, MenuRule } from '@/components/ui/menu'

/** What opens over a list. */
export type ListAct = 'columns' | 'views' | 'paste' | 'changeSelected' | 'changeFound'

export interface ListMenuProps {
  many: string
  isNarrowed: boolean
  /** Rows of it come in by file, or pasted. */
  isImported: boolean
  exportHref: string
  onAct: (act: ListAct) => void
  onPrint: () => void
  /** Where there is a grid: it has columns to choose and cells to edit. */
  onEdit?: (() => void) | undefined
  /** On a phone the mark alone. */
  isMarkAlone?: boolean
  triggerRef?: RefObject<HTMLButtonElement | null>
}

/** Everything one may do with a list, but for the one thing done most. */
export function ListMenu(props: ListMenuProps) {
  const { many, isNarrowed, isImported, exportHref, onAct, onPrint, onEdit, isMarkAlone, triggerRef } = props
  const mayKeep = useCan('keepCrib')
  return (
    <Menu
      label="More"
      Mark={Ellipsis}
      size="compact"
      {...(isMarkAlone ? { isMarkAlone } : {})}
      {...(triggerRef ? { triggerRef } : {})}
    >
      <MenuItem Mark={Bookmark} onChoose={() => onAct('views')}>
        Views
      </MenuItem>
      {onEdit ? (
        <MenuItem Mark={Columns3} onChoose={() => onAct('columns')}>
          Columns
        </MenuItem>
      ) : null}
      <MenuRule />
      <MenuItem Mark={Printer} onChoose={onPrint}>
        Print
      </MenuItem>
      <MenuLink
        Mark={Download}
        link={(content) => (
          <a href={exportHref} download>
            {content}
          </a>
        )}
      >
        Export as CSV
      </MenuLink>
      {mayKeep ? (
        <>
          <MenuRule />
          {onEdit ? (
            <MenuItem Mark={Pencil} onChoose={onEdit}>
              Edit in list
            </MenuItem>
          ) : null}
          <MenuItem Mark={ListChecks} onChoose={() => onAct('changeFound')}>
            Change all {isNarrowed ? 'found' : many}
          </MenuItem>
          {isImported ? (
            <>
              <MenuRule />
              <MenuItem Mark={ClipboardPaste} onChoose={() => onAct('paste')}>
                Paste rows
              </MenuItem>
              <MenuLink
                Mark={Upload}
                link={(content) => (
                  <Link href="/imports" prefetch={false}>
                    {content}
                  </Link>
                )}
              >
                Import a file
              </MenuLink>
            </>
          ) : null}
        </>
      ) : null}
    </Menu>
  )
}
