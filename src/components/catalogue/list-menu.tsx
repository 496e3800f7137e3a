'use client'

import { Ellipsis } from 'lucide-react'
import { type ComponentType, useRef, useState } from 'react'
import { buttonClass } from '@/components/ui/button'
import type { ListMenuProps } from './list-act'
import type { LoadedListMenuProps } from './loaded-list-menu'

interface Loaded {
  Menu: ComponentType<LoadedListMenuProps>
  isOpenAtOnce: boolean
  hasFocus: boolean
}

/**
 * Everything one may do with a list, but for the one thing done most. The menu's own code comes when a hand or the
 * keyboard comes near; a press in between opens it as soon as it is there.
 */
export function ListMenu(props: ListMenuProps) {
  const { isMarkAlone, triggerRef } = props
  const [loaded, setLoaded] = useState<Loaded | null>(null)
  const isPressed = useRef(false)

  async function handleNear() {
    const { LoadedListMenu } = await import('./loaded-list-menu')
    const hasFocus = triggerRef.current !== null && triggerRef.current === document.activeElement
    setLoaded((now) => now ?? { Menu: LoadedListMenu, isOpenAtOnce: isPressed.current, hasFocus })
  }
  function handlePress() {
    isPressed.current = true
    void handleNear()
  }

  if (loaded) {
    const { Menu, ...manner } = loaded
    return <Menu {...props} {...manner} />
  }
  return (
    <button
      ref={triggerRef}
      type="button"
      aria-haspopup="menu"
      aria-expanded={false}
      aria-label={isMarkAlone ? 'More' : undefined}
      className={buttonClass({ size: 'compact' }, isMarkAlone ? 'w-11 px-0!' : undefined)}
      onPointerEnter={handleNear}
      onFocus={handleNear}
      onPointerDown={handlePress}
      onClick={handlePress}
    >
      <Ellipsis aria-hidden="true" className="size-5" />
      {isMarkAlone ? null : 'More'}
    </button>
  )
}
