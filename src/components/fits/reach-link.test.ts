import { expect, test } from 'vitest'
import { queryDraft } from '../reach/reach-query'
import { reachLink } from './reach-link'

test('it carries the feature into the reach check under the names that page reads', () => {
  const asked = new URLSearchParams('insideCornerRadiusMm=3&depthMm=25&floorRadiusMm=0&inStock=yes')
  const link = new URL(reachLink('62', asked), 'http://shop.example')
  expect(link.pathname).toBe('/reach')
  const draft = queryDraft(link.search, { unit: 'mm', decimalComma: false })
  expect(draft.picks.cutter).toBe('62')
  expect(draft.texts.feature).toEqual({ depthMm: '25', insideCornerRadiusMm: '3', floorRadiusMm: '0' })
})

test('it leaves out what was not asked', () => {
  expect(reachLink('62', new URLSearchParams('depthMm=12.7&insideCornerRadiusMm='))).toBe(
    '/reach?cutter=62&depth=12.7',
  )
})
