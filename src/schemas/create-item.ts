import type { z } from 'zod'
import type { CatalogueKind } from '@/core/stock/kinds'
import { createColletRequestSchema } from './collet'
import { createCutterRequestSchema } from './cutter'
import { createExtensionRequestSchema } from './extension'
import { createFixtureRequestSchema } from './fixture'
import { createHolderRequestSchema } from './holder'

/** What a new item of each kind is held to, wherever it is typed, pasted or imported. */
export const createItemSchemas: Readonly<Record<CatalogueKind, z.ZodType>> = {
  cutter: createCutterRequestSchema,
  holder: createHolderRequestSchema,
  collet: createColletRequestSchema,
  extension: createExtensionRequestSchema,
  fixture: createFixtureRequestSchema,
}
