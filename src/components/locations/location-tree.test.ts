import { describe, expect, it } from 'vitest'
import type { LocationResponse } from '@/schemas/location'
import { locationTree, shortCode } from './location-tree'

function place(
  id: string,
  kind: LocationResponse['kind'],
  code: string,
  parentId: string | null,
): LocationResponse {
  const isInCrib = ['crib', 'cabinet', 'drawer', 'bin'].includes(kind)
  return {
    id,
    version: 1,
    code,
    kind,
    name: code,
    cribId: isInCrib ? '1' : null,
    cribCode: isInCrib ? 'MAIN' : null,
    parentId,
    archivedAt: null,
  }
}

describe('the tree of locations', () => {
  it('stands each place in its own, numbers counted as numbers', () => {
    const { cribs, others } = locationTree([
      place('4', 'bin', 'A1-10', '3'),
      place('5', 'bin', 'A1-9', '3'),
      place('1', 'crib', 'MAIN', null),
      place('3', 'drawer', 'A1', '2'),
      place('2', 'cabinet', 'A', '1'),
      place('6', 'machine', 'M1', null),
    ])
    const drawer = cribs[0]?.children[0]?.children[0]
    expect(drawer?.location.code).toBe('A1')
    expect(drawer?.children.map(({ location }) => location.code)).toEqual(['A1-9', 'A1-10'])
    expect(others.map(({ code }) => code)).toEqual(['M1'])
  })

  it('leaves out of a code what the place it stands in says', () => {
    expect(shortCode('A1-07', 'A1')).toBe('07')
    expect(shortCode('A1', 'A1')).toBe('A1')
    expect(shortCode('Shelf', 'A1')).toBe('Shelf')
  })
})
