import { describe, expect, it } from 'vitest'
import { colletCatalogue } from '@/components/collets/collet-catalogue'
import { cutterCatalogue } from '@/components/cutters/cutter-catalogue'
import { extensionCatalogue } from '@/components/extensions/extension-catalogue'
import { holderCatalogue } from '@/components/holders/holder-catalogue'
import { colletListQuerySchema, colletSortFields } from '@/schemas/collet'
import { cutterListQuerySchema, cutterSortFields } from '@/schemas/cutter'
import { extensionListQuerySchema, extensionSortFields } from '@/schemas/extension'
import { holderListQuerySchema, holderSortFields } from '@/schemas/holder'
import type { CatalogueFilter } from './catalogue-filter'
import { filterParamNames } from './catalogue-filter'
import { type CatalogueView, queryParams, readView, viewParams } from './catalogue-view'

const names = filterParamNames(cutterCatalogue.filters)

describe('the view in the address', () => {
  it('reads back what it wrote', () => {
    const view: CatalogueView = {
      q: '1/4 ball & long',
      sort: '-cuttingDiameterMm,code',
      filters: { form: 'ball', 'cuttingDiameterMm.min': '3.175', stockState: 'low' },
      columns: ['code', 'onHand', 'form'],
    }
    expect(readView(new URLSearchParams(viewParams(view).toString()), names)).toEqual(view)
  })

  it('passes over what is no filter of this list', () => {
    expect(readView(new URLSearchParams('next=elsewhere&form=ball'), names).filters).toEqual({ form: 'ball' })
  })
})

/** A value that a filter may send. */
function someValue(filter: CatalogueFilter): string {
  if (filter.kind === 'choice') return filter.options[0]?.value ?? ''
  if (filter.kind === 'counted') return '17'
  return filter.kind === 'lengthRange' ? '3.175' : 'text'
}

const lists = [
  { catalogue: cutterCatalogue, schema: cutterListQuerySchema, sortFields: cutterSortFields },
  { catalogue: holderCatalogue, schema: holderListQuerySchema, sortFields: holderSortFields },
  { catalogue: colletCatalogue, schema: colletListQuerySchema, sortFields: colletSortFields },
  { catalogue: extensionCatalogue, schema: extensionListQuerySchema, sortFields: extensionSortFields },
]

describe.each(lists)('the list of $catalogue.many', ({ catalogue, schema, sortFields }) => {
  it('offers no filter the server refuses', () => {
    const filters = Object.fromEntries(
      catalogue.filters.flatMap((filter) =>
        filterParamNames([filter]).map((name) => [name, someValue(filter)]),
      ),
    )
    const asked = Object.fromEntries(queryParams({ q: 'x', sort: '', filters }))
    expect(schema.safeParse(asked).error?.issues ?? []).toEqual([])
  })

  it('offers no sorting the server refuses', () => {
    const sortable = catalogue.columns(true).filter((column) => column.isSortable)
    const fields: readonly string[] = sortFields
    expect(sortable.map((column) => column.id).filter((id) => !fields.includes(id))).toEqual([])
  })
})
