import type { Metadata } from 'next'
import { SettingsPage } from '@/components/settings/settings-page'
import { requireActor } from '@/server/auth/require-actor'
import { getShopSettings } from '@/server/services/settings/get-shop-settings'

export const metadata: Metadata = { title: 'Shop settings' }

export default async function Page() {
  const actor = await requireActor('administer')
  const settings = await getShopSettings()
  // A change of unit opens the fields anew, in that unit.
  return <SettingsPage key={`${settings.version} ${actor.lengthUnit}`} settings={settings} />
}
