import { shopSettingsResponseSchema, updateShopSettingsRequestSchema } from '@/schemas/shop-settings'
import { route } from '@/server/http/route'
import { getShopSettings } from '@/server/services/settings/get-shop-settings'
import { updateShopSettings } from '@/server/services/settings/update-shop-settings'

export const GET = route({
  access: 'see',
  answer: shopSettingsResponseSchema,
  handle: () => getShopSettings(),
})

export const PATCH = route({
  access: 'administer',
  body: updateShopSettingsRequestSchema,
  answer: shopSettingsResponseSchema,
  handle: ({ actor, body }) => updateShopSettings(actor, body),
})
