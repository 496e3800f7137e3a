'use client'

import {
  Bookmark,
  ClipboardPaste,
  Columns3,
  Copy,
  Download,
  Ellipsis,
  ListChecks,
  Printer,
  Upload,
} from 'lucide-react'
import Link from 'next/link'
import { useCan } from '@/components/layout/shop-context'
import { Menu, MenuItem, MenuLink, MenuRule } from '@/components/ui/menu'
import type { ListMenuProps } from './list-act'

export interface LoadedListMenuProps extends ListMenuProps {
  /** It was pressed while it was on its way. */
  isOpenAtOnce: boolean
  /** Its stand-in had the keyboard. */
  hasFocus: boolean
}

export function LoadedListMenu(props: LoadedListMenuProps) {
  const { kind, many, isNarrowed, exportHref, onAct, onPrint, hasColumns, isMarkAlone, triggerRef } = props
  const mayKeep = useCan('keepCrib')
  return (
    <Menu
      label="More"
      Mark={Ellipsis}
      size="compact"
      isMarkAlone={isMarkAlone}
      triggerRef={triggerRef}
      isOpenAtOnce={props.isOpenAtOnce}
      hasFocus={props.hasFocus}
    >
      <MenuItem Mark={Bookmark} onChoose={() => onAct('views')}>
        Views
      </MenuItem>
      {hasColumns ? (
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
          <MenuItem Mark={ListChecks} onChoose={() => onAct('changeFound')}>
            Change all {isNarrowed ? 'found' : many}
          </MenuItem>
          {kind === 'fixture' ? null : (
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
              <MenuLink
                Mark={Copy}
                link={(content) => (
                  <Link href={`/duplicates?kind=${kind}`} prefetch={false}>
                    {content}
                  </Link>
                )}
              >
                Duplicates
              </MenuLink>
            </>
          )}
        </>
      ) : null}
    </Menu>
  )
}
