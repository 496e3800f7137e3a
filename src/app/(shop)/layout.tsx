import type { ReactNode } from 'react'
import { AppHeader } from '@/components/layout/app-header'
import { ShopProvider } from '@/components/layout/shop-context'
import { ToastArea } from '@/components/ui/toast-area'
import { can } from '@/core/policies/permissions'
import { requireActor } from '@/server/auth/require-actor'
import { isFirstDayOpen } from '@/server/services/first-day/get-first-day'
import { getShopSettings } from '@/server/services/settings/get-shop-settings'

export default async function ShopLayout({ children }: { children: ReactNode }) {
  const actor = await requireActor()
  const settings = await getShopSettings()
  return (
    <ShopProvider
      shop={{
        actor: {
          id: actor.id,
          name: actor.name,
          role: actor.role,
          locationId: actor.locationId,
          homeCribId: actor.homeCribId,
        },
        shopName: settings.shopName,
        unit: actor.lengthUnit ?? settings.lengthUnit,
        decimalComma: settings.decimalComma,
        currency: settings.currency,
        reachSettings: settings.reach,
        isFirstDay: can(actor.role, 'keepCrib') && (await isFirstDayOpen()),
        measuringToleranceMm: settings.measuringToleranceMm,
        cuttingSettings: settings.cutting,
      }}
    >
      <a
        href="#content"
        className="bg-accent text-on-accent sr-only z-50 px-4 py-3 focus:not-sr-only focus:absolute"
      >
        Skip to the content
      </a>
      <div className="flex min-h-dvh flex-col">
        <AppHeader />
        <main id="content" tabIndex={-1} className="flex min-h-0 flex-1 flex-col outline-none">
          {children}
        </main>
      </div>
      <ToastArea />
    </ShopProvider>
  )
}
