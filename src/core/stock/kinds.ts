/** The words of the books: in what condition a piece is, where it can be, and why it moves. */

export const conditions = ['new', 'used', 'reground', 'worn'] as const
export type Condition = (typeof conditions)[number]

/** A crib's tree, from the root down; each rank may be left out and never turned round. Only bins hold stock. */
export const treeLocationKinds = ['crib', 'cabinet', 'drawer', 'bin'] as const
export type TreeLocationKind = (typeof treeLocationKinds)[number]

/** The far ends of the books, which no page shows. */
export const outsideLocationKinds = ['supplier', 'scrap', 'countAdjustment'] as const

/** Every kind of place a page may show. */
export const shopLocationKinds = [...treeLocationKinds, 'person', 'machine', 'regrind', 'inTransit'] as const
export type ShopLocationKind = (typeof shopLocationKinds)[number]

export const locationKinds = [...shopLocationKinds, ...outsideLocationKinds] as const
export type LocationKind = (typeof locationKinds)[number]

export const movementKinds = [
  'receipt',
  'issue',
  'return',
  'relocation',
  'transfer',
  'regrind',
  'scrap',
  'adjustment',
  'reversal',
] as const
export type MovementKind = (typeof movementKinds)[number]

/** Kinds of item that carry geometry and have a page and a route of their own. */
export const catalogueKinds = ['cutter', 'holder', 'collet', 'extension', 'fixture'] as const
export type CatalogueKind = (typeof catalogueKinds)[number]

/** Those of them that an assembly in a spindle is made of. */
export const toolingKinds = [
  'cutter',
  'holder',
  'collet',
  'extension',
] as const satisfies readonly CatalogueKind[]
export type ToolingKind = (typeof toolingKinds)[number]
