import { describe, expect, it } from 'vitest'
import { openedView } from './opened-view'

const columns = [
  { id: 'code', isSortable: true },
  { id: 'maker', isSortable: true },
  { id: 'locations', isSortable: false },
]

describe('a saved view', () => {
  it('opens as it was saved while all of it is there', () => {
    expect(
      openedView('q=ball&maker=Corvane&sort=-maker,code&columns=code,maker', ['maker'], columns),
    ).toEqual({
      view: { q: 'ball', sort: '-maker,code', filters: { maker: 'Corvane' }, columns: ['code', 'maker'] },
      leftOut: [],
    })
  })

  it('opens without a column, a sorting and a filter that are gone, and names them', () => {
    const opened = openedView(
      'maker=Corvane&colour=red&sort=finish,-maker,locations&columns=code,finish',
      ['maker'],
      columns,
    )
    expect(opened.view).toEqual({
      ...{ q: '', sort: '-maker', filters: { maker: 'Corvane' }, columns: ['code'] },
    })
    expect(opened.leftOut).toEqual([
      'the column “finish”',
      'the sorting by “finish”',
      'the sorting by “locations”',
      'the filter “colour”',
    ])
  })

  it('shows the usual columns where none of its own is left', () => {
    expect(openedView('columns=finish', [], columns).view.columns).toBeNull()
  })
})
