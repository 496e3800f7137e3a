import type { CatalogueKind } from '@/core/stock/kinds'

/** How a kind of item is called in a sentence, and its plural in an address. */
export const kindWords: Record<CatalogueKind, { one: string; many: string }> = {
  cutter: { one: 'cutter', many: 'cutters' },
  holder: { one: 'holder', many: 'holders' },
  collet: { one: 'collet', many: 'collets' },
  extension: { one: 'extension', many: 'extensions' },
  fixture: { one: 'fixture', many: 'fixtures' },
}
