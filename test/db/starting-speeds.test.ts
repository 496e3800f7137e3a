import { readFile } from 'node:fs/promises'
import { fileURLToPath } from 'node:url'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { metresPerFoot } from '@/core/units/parse-speed'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

interface Printed {
  group: string
  material: string
  substrate: string
  low: number
  high: number
  sfm: string
  source: string
}

const page = fileURLToPath(new URL('../reference/speeds/starting-speeds.md', import.meta.url))

let database: TestDatabase
let printed: Printed[]

beforeAll(async () => {
  database = await createTestDatabase()
  printed = (await readFile(page, 'utf8'))
    .split('\n')
    .filter((line) => /^\| [PMKNSH] \|/.test(line))
    .map((line) => {
      const [group = '', material = '', substrate = '', low, high, sfm = '', source = ''] = line
        .slice(1, -1)
        .split('|')
        .map((cell) => cell.trim())
      return { group, material, substrate, low: Number(low), high: Number(high), sfm, source }
    })
})
afterAll(() => database.drop())

describe('the table of starting speeds', () => {
  test('it begins with the published ranges, each with its source', async () => {
    const rows = await database.db('starting_speeds').select('*')
    const told = rows.map((row) => ({
      group: row.iso_group,
      material: row.material,
      substrate: row.substrate,
      low: row.low_m_per_min,
      high: row.high_m_per_min,
      source: row.source_note.startsWith('From memory') ? 'memory' : 'page',
    }))
    const byName = (one: { material: string; substrate: string }) => `${one.material} ${one.substrate}`
    const sorted = <Row extends { material: string; substrate: string }>(list: Row[]) =>
      [...list].sort((one, other) => byName(one).localeCompare(byName(other)))
    expect(printed.length).toBeGreaterThan(20)
    expect(sorted(told)).toEqual(sorted(printed.map(({ sfm: _, ...row }) => row)))
    expect(rows.filter((row) => row.source_note.length < 10)).toEqual([])
  })

  test('its metres a minute are the printed feet a minute to the metre', () => {
    const withFeet = printed.filter(({ sfm }) => sfm !== '')
    expect(withFeet.length).toBeGreaterThan(8)
    for (const { sfm, low, high, material } of withFeet) {
      const [lowSfm = 0, highSfm = 0] = sfm.split('-').map(Number)
      expect(Math.abs(low - lowSfm * metresPerFoot), material).toBeLessThan(1)
      expect(Math.abs(high - highSfm * metresPerFoot), material).toBeLessThan(1)
    }
  })

  test('it refuses a range that runs backwards, and a second one of the same material', async () => {
    const row = { iso_group: 'N', material: 'Zinc', substrate: 'hss', low_m_per_min: 50, high_m_per_min: 90 }
    const backwards = { ...row, high_m_per_min: 40 }
    await expectRefusal(
      database.db('starting_speeds').insert(backwards),
      '23514',
      'starting_speeds_low_within_high',
    )
    await database.db('starting_speeds').insert(row)
    const twin = { ...row, material: 'ZINC' }
    await expectRefusal(database.db('starting_speeds').insert(twin), '23505', 'starting_speeds_material_idx')
  })
})
