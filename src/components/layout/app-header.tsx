'use client'

import { CircleUserRound, LogOut, Menu } from 'lucide-react'
import Link from 'next/link'
import { usePathname } from 'next/navigation'
import { useState } from 'react'
import { can } from '@/core/policies/permissions'
import { classNames } from '../ui/class-names'
import { Dialog } from '../ui/dialog'
import { LowStockCount, LowStockFigure } from './low-stock-count'
import { firstDayGroup, navigationGroups } from './navigation'
import { useShop } from './shop-context'
import { SignOutButton } from './sign-out-button'
import { UnitSwitch } from './unit-switch'
import { Wordmark } from './wordmark'

function isCurrent(pathname: string, href: string): boolean {
  return pathname === href || pathname.startsWith(`${href}/`)
}

/** The places one's role may go to, grouped by the work. */
function useGroups() {
  const { actor, isFirstDay } = useShop()
  const { role } = actor
  return [...(isFirstDay ? [firstDayGroup] : []), ...navigationGroups]
    .map((group) => ({ ...group, links: group.links.filter((link) => can(role, link.permission)) }))
    .filter((group) => group.links.length > 0)
}

export function AppHeader() {
  const pathname = usePathname()
  const groups = useGroups()
  return (
    <header className="bg-sheet border-ink sticky top-0 z-30 border-b print:hidden">
      <div className="flex h-14 items-center gap-4 px-4 min-[90rem]:h-12 min-[90rem]:gap-2 min-[112rem]:gap-4">
        <Link
          href="/reach"
          aria-label="Leadline, to the reach check"
          className="flex min-h-11 items-center pr-2"
        >
          <Wordmark />
        </Link>
        <nav aria-label="Main" className="hidden h-full min-w-0 flex-1 min-[90rem]:flex">
          {groups.map((group) => (
            <ul
              key={group.label}
              aria-label={group.label}
              className="border-hairline flex h-full border-l px-1 last:border-r"
            >
              {group.links.map((link) => (
                <li key={link.href} className="h-full">
                  <Link
                    href={link.href}
                    aria-current={isCurrent(pathname, link.href) ? 'page' : undefined}
                    className={classNames(
                      'hover:bg-accent-wash flex h-full items-center border-b-[3px] px-[0.3125rem] min-[112rem]:px-2.5 pt-[3px] text-sm whitespace-nowrap min-[112rem]:text-[0.9375rem]',
                      isCurrent(pathname, link.href)
                        ? 'border-accent text-ink font-semibold'
                        : 'text-ink border-transparent',
                    )}
                  >
                    {link.label}
                    {link.href === '/alerts' ? <LowStockFigure /> : null}
                  </Link>
                </li>
              ))}
            </ul>
          ))}
        </nav>
        <div className="ml-auto flex items-center gap-2">
          <LowStockCount />
          <UnitSwitch />
          <span className="hidden items-center gap-1 min-[90rem]:flex">
            <AccountLink />
            <SignOutButton className="px-2!" label={<LogOut aria-hidden="true" className="size-5" />} />
          </span>
          <PhoneMenu groups={groups} pathname={pathname} />
        </div>
      </div>
    </header>
  )
}

function AccountLink() {
  const { actor } = useShop()
  return (
    <Link
      href="/account"
      className="hover:bg-accent-wash flex min-h-9 max-w-44 items-center rounded-[3px] px-2 text-[0.9375rem]"
    >
      <CircleUserRound aria-hidden="true" className="size-5 min-[112rem]:hidden" />
      <span className="truncate max-[112rem]:sr-only">{actor.name}</span>
    </Link>
  )
}

function PhoneMenu({ groups, pathname }: { groups: ReturnType<typeof useGroups>; pathname: string }) {
  const [isOpen, setIsOpen] = useState(false)
  const { actor, shopName } = useShop()
  return (
    <span className="min-[90rem]:hidden">
      <button
        type="button"
        className="hover:bg-accent-wash -mr-2 grid size-11 place-items-center rounded-[3px]"
        aria-label="Menu"
        onClick={() => setIsOpen(true)}
      >
        <Menu aria-hidden="true" className="size-6" />
      </button>
      <Dialog isOpen={isOpen} onOpenChange={setIsOpen} title={shopName} shape="side">
        <nav aria-label="Main">
          {groups.map((group) => (
            <div key={group.label} className="border-hairline border-b py-2">
              <p className="text-ink-soft text-sm">{group.label}</p>
              <ul>
                {group.links.map((link) => (
                  <li key={link.href}>
                    <Link
                      href={link.href}
                      onClick={() => setIsOpen(false)}
                      aria-current={isCurrent(pathname, link.href) ? 'page' : undefined}
                      className="aria-[current=page]:text-accent flex min-h-12 items-center text-lg font-semibold"
                    >
                      {link.label}
                    </Link>
                  </li>
                ))}
              </ul>
            </div>
          ))}
        </nav>
        <div className="flex items-center justify-between pt-4">
          <Link
            href="/account"
            onClick={() => setIsOpen(false)}
            className="flex min-h-12 items-center text-lg"
          >
            {actor.name}
          </Link>
          <SignOutButton label="Sign out" />
        </div>
      </Dialog>
    </span>
  )
}
