import fc from 'fast-check'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { whereMatchesSearch } from '@/server/db/search-predicate'
import { createItem } from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { editDistance } from '../support/edit-distance'

let database: TestDatabase

beforeAll(async () => {
  database = await createTestDatabase()
  await database.db('items').insert([
    {
      kind: 'cutter',
      code: 'EM-0250',
      maker: 'Kestrel Carbide',
      part_number: 'KC-12500',
      description: 'Roughing',
    },
    {
      kind: 'cutter',
      code: 'EM-0251',
      maker: 'Kestrel Carbide',
      part_number: 'KC-12501',
      description: 'Ball nose',
    },
    {
      kind: 'cutter',
      code: 'DR-F',
      maker: 'Nordfräser',
      part_number: 'X_1%',
      description: 'cobalt-drill, split point',
    },
    { kind: 'holder', code: 'H-1', maker: null, part_number: null, description: 'Shrink chuck ALTIN5 face' },
  ])
})
afterAll(() => database.drop())

async function found(search: string): Promise<string[]> {
  const query = database.db('items').orderBy('code').select('code')
  whereMatchesSearch(query, search)
  return (await query).map((row) => row.code)
}

async function matchingWords(term: string): Promise<string[]> {
  const { rows } = await database.db.raw('select matching_search_words(?) as words', [term])
  return rows[0].words
}

describe('a search', () => {
  test('it finds any part of code, maker, part number and description, in capitals or not', async () => {
    expect(await found('m-02')).toEqual(['EM-0250', 'EM-0251'])
    expect(await found('ESTREL')).toEqual(['EM-0250', 'EM-0251'])
    expect(await found('12501')).toEqual(['EM-0251'])
    expect(await found('split')).toEqual(['DR-F'])
  })

  test('it wants every term, wherever each stands', async () => {
    expect(await found('kestrel rough')).toEqual(['EM-0250'])
    expect(await found('kestrel split')).toEqual([])
  })

  test('it forgives one letter wrong, missing, extra or swapped', async () => {
    for (const typed of ['kestrol', 'kestel', 'kesstrel', 'kesterl']) {
      expect(await found(typed), typed).toEqual(['EM-0250', 'EM-0251'])
    }
  })

  test('it does not forgive two', async () => {
    for (const typed of ['kostrol', 'kstel', 'ksetrle']) expect(await found(typed), typed).toEqual([])
  })

  test('it forgives a letter missing from a word of five, and nothing in shorter ones', async () => {
    expect(await found('pont')).toEqual(['DR-F'])
    expect(await found('bxll')).toEqual([])
    expect(await found('fcae')).toEqual([])
  })

  test('it never forgives a digit', async () => {
    expect(await found('12502')).toEqual([])
    expect(await found('kc-12510')).toEqual([])
    expect(await found('kestrol 12501')).toEqual(['EM-0251'])
    expect(await found('altni5')).toEqual([])
  })

  test('it forgives in a word that punctuation joins to another', async () => {
    expect(await found('cobatl-drill')).toEqual(['DR-F'])
    expect(await found('cobatl-mill')).toEqual([])
  })

  test('it knows letters beyond the alphabet', async () => {
    expect(await found('nordfräsre')).toEqual(['DR-F'])
  })

  test('it takes the signs of a pattern as they are', async () => {
    expect(await found('x_1%')).toEqual(['DR-F'])
    expect(await found('_')).toEqual(['DR-F'])
    expect(await found('kc%')).toEqual([])
    expect(await found("o'clock \\")).toEqual([])
  })

  test('it finds everything where nothing is asked', async () => {
    expect(await found('  ')).toHaveLength(4)
  })
})

describe('the words of the catalogue', () => {
  test('they are kept for many items added in one statement, and for a changed one', async () => {
    const rows = Array.from({ length: 500 }, (_, index) => ({
      kind: 'accessory',
      code: `BULK-${index}`,
      description: `spacer ${index % 2 ? 'walnut' : 'hickory'}`,
    }))
    await database.db('items').insert(rows)
    expect(await matchingWords('wlanut')).toEqual(['walnut'])
    expect(await matchingWords('hickry')).toEqual(['hickory'])
    await database.db('items').where('code', 'BULK-7').update({ description: 'now of juniper' })
    expect(await matchingWords('junipper')).toEqual(['juniper'])
    expect(await found('junipper')).toEqual(['BULK-7'])
  })

  test('they leave out what no one types', async () => {
    const id = await createItem(database.db, {
      code: 'LONG',
      description: `${'x'.repeat(41)} ${'y'.repeat(40)} four`,
    })
    const row = await database.db('items').where({ id }).first('search_words')
    expect(row.search_words).toEqual(['y'.repeat(40)])
  })
})

describe('matching_search_words', () => {
  const letters = fc.constantFrom('a', 'b', 'c', 'ä')
  const words = fc.uniqueArray(fc.string({ unit: letters, minLength: 5, maxLength: 9 }), {
    minLength: 1,
    maxLength: 30,
  })
  const near = (known: string[]) =>
    fc.oneof(
      fc.string({ unit: letters, minLength: 4, maxLength: 10 }),
      fc
        .record({ word: fc.constantFrom(...known), place: fc.nat(8), letter: letters, edit: fc.nat(3) })
        .map(({ word, place, letter, edit }) => edited(word, place % word.length, letter, edit)),
    )

  function edited(word: string, place: number, letter: string, edit: number): string {
    const before = word.slice(0, place)
    const after = word.slice(place)
    if (edit === 0) return before + letter + after.slice(1)
    if (edit === 1) return before + after.slice(1)
    if (edit === 2) return before + letter + after
    return before + after.slice(1, 2) + after.slice(0, 1) + after.slice(2)
  }

  test('it agrees with edit distances worked out one by one', async () => {
    let matches = 0
    const property = fc.asyncProperty(
      words.chain((known) =>
        fc.tuple(fc.constant(known), fc.array(near(known), { minLength: 1, maxLength: 8 })),
      ),
      async ([known, terms]) => {
        await database.db.transaction(async (trx) => {
          await trx('search_words').delete()
          await trx('search_words').insert(known.map((word) => ({ word })))
          for (const term of terms) {
            const { rows } = await trx.raw('select matching_search_words(?) as words', [term])
            const expected = known.filter((word) => editDistance(word, term) <= 1)
            expect([...rows[0].words].sort(), term).toEqual(expected.sort())
            matches += expected.length
          }
        })
      },
    )
    await fc.assert(property, { numRuns: 150 })
    expect(matches).toBeGreaterThan(150)
  })
})
