import type { AssemblyParts } from '@/core/search/types'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { readCatalogueRows } from '../../db/read-models/catalogue-rows'
import { visibleItem } from '../catalogue/visible-item'
import type { CribTables } from './crib-tables'

type Rows<Kind extends keyof CatalogueTypes> = Map<string, CatalogueTypes[Kind]['row']>

/** The rows of the catalogue that the listed assemblies are made of, by their ids. */
export interface PartRows {
  cutters: Rows<'cutter'>
  holders: Rows<'holder'>
  collets: Rows<'collet'>
  extensions: Rows<'extension'>
}

/** Reads every part of these assemblies once, as the person may see it. */
export async function readPartRows(
  actor: Actor,
  { tables, cutterSources }: CribTables,
  assemblies: AssemblyParts[],
  cribId: string | null,
): Promise<PartRows> {
  const { tooling } = tables
  const ids = (of: (parts: AssemblyParts) => (string | undefined)[]) => [
    ...new Set(assemblies.flatMap(of).filter((id) => id !== undefined)),
  ]
  const idAt = (list: readonly { id: string }[], index: number | null) =>
    index === null ? undefined : list[index]?.id
  const rowsOf = async <Kind extends keyof CatalogueTypes>(kind: Kind, wanted: string[]) => {
    const rows = await readCatalogueRows(db(), kind, wanted, cribId)
    return new Map(rows.map((row) => [row.id, visibleItem<Kind>(actor, row)]))
  }
  const [cutters, holders, collets, extensions] = await Promise.all([
    rowsOf(
      'cutter',
      ids(({ cutterIndex }) => [cutterSources[cutterIndex]?.itemId]),
    ),
    rowsOf(
      'holder',
      ids(({ holderIndex }) => [idAt(tooling.holders, holderIndex)]),
    ),
    rowsOf(
      'collet',
      ids(({ colletIndex, extensionColletIndex }) => [
        idAt(tooling.collets, colletIndex),
        idAt(tooling.collets, extensionColletIndex),
      ]),
    ),
    rowsOf(
      'extension',
      ids(({ extensionIndex }) => [idAt(tooling.extensions, extensionIndex)]),
    ),
  ])
  return { cutters, holders, collets, extensions }
}
