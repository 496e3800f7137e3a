import type { ColletResponse } from '@/schemas/collet'
import type { CutterResponse } from '@/schemas/cutter'
import type { ExtensionResponse } from '@/schemas/extension'
import type { FixtureResponse } from '@/schemas/fixture'
import type { HolderResponse } from '@/schemas/holder'

/** A row of any of the catalogue's lists, told apart by `kind`. */
export type CatalogueRow =
  | CutterResponse
  | HolderResponse
  | ColletResponse
  | ExtensionResponse
  | FixtureResponse
