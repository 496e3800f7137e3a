import { z } from 'zod'
import type { CatalogueKind } from '@/core/stock/kinds'
import { colletListQuerySchema } from './collet'
import { cutterListQuerySchema } from './cutter'
import { extensionListQuerySchema } from './extension'
import { fixtureListQuerySchema } from './fixture'
import { holderListQuerySchema } from './holder'

const itemColumns = [
  'onHand',
  'available',
  'locations',
  'maker',
  'partNumber',
  'description',
  'unitCost',
] as const
const clampingColumns = ['boreDepthMm', 'minimumGripMm', 'gripStartMm', 'nutTorqueNm'] as const

/** The columns a list can be exported with, in the order of the page's own. */
export const exportColumnIds = {
  cutter: [
    'code',
    'form',
    'cuttingDiameterMm',
    'cornerRadiusMm',
    'lengthOfCutMm',
    'fluteLengthMm',
    'reachLengthMm',
    'neckDiameterMm',
    'shankDiameterMm',
    'overallLengthMm',
    'fluteCount',
    'taperHalfAngleDeg',
    'pointAngleDeg',
    'tipDiameterMm',
    'neckTaperHalfAngleDeg',
    'neckTransitionAngleDeg',
    'substrate',
    'maximumRpm',
    ...itemColumns,
  ],
  holder: [
    'code',
    'taper',
    'boreKind',
    'series',
    'boreDiameterMm',
    'gaugeLengthMm',
    ...clampingColumns,
    'sideLockInsertionMm',
    'maximumRpm',
    ...itemColumns,
  ],
  collet: ['code', 'series', 'minimumMm', 'maximumMm', 'lengthMm', 'minimumGripMm', ...itemColumns],
  extension: [
    'code',
    'boreKind',
    'series',
    'boreDiameterMm',
    'projectionMm',
    'shankDiameterMm',
    ...clampingColumns,
    ...itemColumns,
  ],
  fixture: ['code', 'heightMm', ...itemColumns],
} as const satisfies Record<CatalogueKind, readonly string[]>

/** `columns=code,maker`: those of the list, in their order; all of them where none is named. */
function columnsSchema(ids: readonly string[]) {
  return z
    .string()
    .max(2000)
    .transform((text) => [...new Set(text.split(',').filter((id) => id !== ''))])
    .refine((asked) => asked.every((id) => ids.includes(id)), `Only ${ids.join(', ')}.`)
    .optional()
}

const paging = { limit: true, offset: true, cursor: true } as const

/** An export is asked for as its list is, without the paging and with the columns. */
export const exportQuerySchemas = {
  cutter: cutterListQuerySchema.omit(paging).extend({ columns: columnsSchema(exportColumnIds.cutter) }),
  holder: holderListQuerySchema.omit(paging).extend({ columns: columnsSchema(exportColumnIds.holder) }),
  collet: colletListQuerySchema.omit(paging).extend({ columns: columnsSchema(exportColumnIds.collet) }),
  extension: extensionListQuerySchema
    .omit(paging)
    .extend({ columns: columnsSchema(exportColumnIds.extension) }),
  fixture: fixtureListQuerySchema.omit(paging).extend({ columns: columnsSchema(exportColumnIds.fixture) }),
}
export type ExportQuery = z.output<(typeof exportQuerySchemas)[CatalogueKind]>
