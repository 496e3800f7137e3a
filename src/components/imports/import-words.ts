import type { ImportListRow, ImportState } from '@/schemas/import'
import { hasDecimals, hasLengths, type ImportKind } from '@/schemas/import-fields'

export const stateWords: Readonly<Record<ImportState, string>> = {
  reading: 'Being read',
  checked: 'Checked, waiting for you',
  committing: 'Being committed',
  committed: 'Committed',
  failed: 'Failed',
  cancelled: 'Cancelled',
}

/** `see` leads to where what was brought is looked at. */
export const kindWords: Readonly<Record<ImportKind, { page: string; see: string }>> = {
  cutters: { page: '/cutters', see: 'See the cutters' },
  holders: { page: '/holders', see: 'See the holders' },
  collets: { page: '/collets', see: 'See the collets' },
  extensions: { page: '/extensions', see: 'See the extensions' },
  stock: { page: '/locations', see: 'See the locations' },
  reorderPoints: { page: '/reorder-points', see: 'See the reorder points' },
}

/** How a list of tools heads what opening stock takes: the bin and how many lie there. Common practice. */
export const stockHeadings =
  /^(?:where|bin|place|location|shelf|drawer|qty|quantity|on hand|count|stock|pcs|pieces)$/i

/** On every button that ends an import before its commit. */
export const cancelLabel = 'Cancel the import'

const encodingNames: Readonly<Record<string, string>> = {
  'utf-8': 'UTF-8',
  'utf-16le': 'UTF-16',
  'utf-16be': 'UTF-16',
  'windows-1252': 'Windows-1252',
}
const delimiterNames: Readonly<Record<string, string>> = { ',': 'commas', ';': 'semicolons', '\t': 'tabs' }

export function countText(count: number): string {
  return count.toLocaleString('en')
}

/** What the reader found of the file: `Windows-1252, semicolons, bare numbers in inches`. */
export function formatWords(
  found: Pick<ImportListRow, 'encoding' | 'delimiter' | 'decimals' | 'unit' | 'kind'>,
): string {
  const words = [
    encodingNames[found.encoding ?? ''],
    delimiterNames[found.delimiter ?? ''],
    hasDecimals(found.kind) && found.decimals === 'comma' ? 'decimal commas' : undefined,
    hasLengths(found.kind) ? `bare numbers in ${found.unit === 'in' ? 'inches' : 'millimetres'}` : undefined,
  ]
  return words.filter(Boolean).join(', ')
}

/** What a checked import would do: `add 18, change 3, leave 5 as they are; 2 are rejected`. */
export function planWords(found: ImportListRow): string {
  const plans = [
    found.added > 0 ? `add ${countText(found.added)}` : null,
    found.changed > 0 ? `change ${countText(found.changed)}` : null,
    found.unchanged > 0
      ? `leave ${countText(found.unchanged)} as ${found.unchanged === 1 ? 'it is' : 'they are'}`
      : null,
  ].filter(Boolean)
  const rejects =
    found.rejectedCount === 1 ? '1 is rejected' : `${countText(found.rejectedCount)} are rejected`
  return found.rejectedCount > 0 ? `${plans.join(', ')}; ${rejects}` : plans.join(', ')
}

/** What a committed import did: `18 added, 3 changed, 5 left as they are, 2 rejected`. */
export function outcomeWords(found: ImportListRow): string {
  const parts = [
    found.added > 0 ? `${countText(found.added)} added` : null,
    found.changed > 0 ? `${countText(found.changed)} changed` : null,
    found.unchanged > 0 ? `${countText(found.unchanged)} left as they are` : null,
    found.rejectedCount > 0 ? `${countText(found.rejectedCount)} rejected` : null,
  ].filter(Boolean)
  return parts.length > 0 ? parts.join(', ') : 'nothing'
}

export function sizeText(bytes: number): string {
  if (bytes < 1024) return `${bytes} bytes`
  return bytes < 1024 * 1024 ? `${Math.round(bytes / 1024)} KB` : `${(bytes / 1024 / 1024).toFixed(1)} MB`
}
