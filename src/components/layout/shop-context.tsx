'use client'

import { createContext, type ReactNode, useContext } from 'react'
import type { CuttingSettings } from '@/core/cutting/cut-answer'
import { can, type Permission, type Role } from '@/core/policies/permissions'
import type { ReachSettings } from '@/core/reach/types'
import type { LengthUnit } from '@/core/units/length-unit'

/** What every page knows of who looks at it and of the shop. */
export interface Shop {
  actor: { id: string; name: string; role: Role; locationId: string; homeCribId: string | null }
  shopName: string
  /** The person's own unit. */
  unit: LengthUnit
  decimalComma: boolean
  currency: string
  reachSettings: ReachSettings
  /** The shop still lacks something it begins with, and this person may bring it. */
  isFirstDay: boolean
  /** What a measured figure may differ from the calculated one. */
  measuringToleranceMm: number
  cuttingSettings: CuttingSettings
}

const ShopContext = createContext<Shop | null>(null)

export function ShopProvider({ shop, children }: { shop: Shop; children: ReactNode }) {
  return <ShopContext value={shop}>{children}</ShopContext>
}

export function useShop(): Shop {
  const shop = useContext(ShopContext)
  if (!shop) throw new Error('useShop stands outside ShopProvider')
  return shop
}

/** Whether the person looking may do this; the server asks the same table again. */
export function useCan(permission: Permission): boolean {
  return can(useShop().actor.role, permission)
}
