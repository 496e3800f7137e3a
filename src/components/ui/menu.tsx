'use client'

import type { LucideIcon } from 'lucide-react'
import { DropdownMenu } from 'radix-ui'
import { createContext, type ReactNode, type RefObject, useContext, useEffect, useRef } from 'react'
import { type ButtonLook, buttonClass } from './button'

export interface MenuProps extends ButtonLook {
  /** What the button says, and the menu is called by. */
  label: string
  Mark: LucideIcon
  /** The label is heard and not seen. */
  isMarkAlone?: boolean | undefined
  triggerRef?: RefObject<HTMLButtonElement | null>
  /** It takes the place of a button that was pressed, or had the keyboard. */
  isOpenAtOnce?: boolean
  hasFocus?: boolean
  children: ReactNode
}

/** What was chosen runs once the menu is gone and its button has the keyboard, so that a dialog gives it back there. */
const ChosenContext = createContext<RefObject<(() => void) | null> | null>(null)

/** A button and the acts behind it. */
export function Menu(props: MenuProps) {
  const { label, Mark, isMarkAlone, triggerRef, isOpenAtOnce, hasFocus, children, ...look } = props
  const own = useRef<HTMLButtonElement>(null)
  const trigger = triggerRef ?? own
  useEffect(() => {
    if (hasFocus && !isOpenAtOnce) trigger.current?.focus()
  }, [hasFocus, isOpenAtOnce, trigger])
  const chosen = useRef<(() => void) | null>(null)
  return (
    <DropdownMenu.Root modal={false} defaultOpen={isOpenAtOnce ?? false}>
      <DropdownMenu.Trigger
        ref={trigger}
        aria-label={isMarkAlone ? label : undefined}
        className={buttonClass(look, isMarkAlone ? 'w-11 px-0!' : undefined)}
      >
        <Mark aria-hidden="true" className="size-5" />
        {isMarkAlone ? null : label}
      </DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align="end"
          sideOffset={6}
          collisionPadding={8}
          className="bg-sheet text-ink border-ink z-40 max-h-(--radix-dropdown-menu-content-available-height) min-w-56 overflow-y-auto border py-1.5 shadow-xl print:hidden"
          onCloseAutoFocus={(event) => {
            event.preventDefault()
            trigger.current?.focus()
            const act = chosen.current
            chosen.current = null
            act?.()
          }}
        >
          <ChosenContext value={chosen}>{children}</ChosenContext>
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  )
}

const itemClass =
  'data-highlighted:bg-accent-wash flex min-h-9 cursor-pointer items-center gap-3 px-4 py-1.5 outline-none select-none data-highlighted:outline-2 data-highlighted:-outline-offset-2 data-highlighted:outline-accent pointer-coarse:min-h-11'

export interface MenuItemProps {
  Mark: LucideIcon
  children: ReactNode
  onChoose: () => void
}

export function MenuItem({ Mark, children, onChoose }: MenuItemProps) {
  const chosen = useContext(ChosenContext)
  return (
    <DropdownMenu.Item
      className={itemClass}
      onSelect={() => {
        if (chosen) chosen.current = onChoose
      }}
    >
      <Mark aria-hidden="true" className="text-accent size-4.5" />
      {children}
    </DropdownMenu.Item>
  )
}

/** A place to go or a file to fetch: the link itself is the child. */
export function MenuLink({
  Mark,
  children,
  link,
}: Pick<MenuItemProps, 'Mark' | 'children'> & { link: LinkPart }) {
  return (
    <DropdownMenu.Item asChild className={itemClass}>
      {link(
        <>
          <Mark aria-hidden="true" className="text-accent size-4.5" />
          {children}
        </>,
      )}
    </DropdownMenu.Item>
  )
}

type LinkPart = (content: ReactNode) => ReactNode

export function MenuRule() {
  return <DropdownMenu.Separator className="bg-hairline my-1.5 h-px" />
}
