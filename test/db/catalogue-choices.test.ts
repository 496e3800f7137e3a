import { afterAll, beforeAll, expect, it } from 'vitest'
import type { CatalogueKind } from '@/core/stock/kinds'
import { colletListQuerySchema } from '@/schemas/collet'
import { cutterListQuerySchema } from '@/schemas/cutter'
import { holderListQuerySchema } from '@/schemas/holder'
import { readCatalogueKeys } from '@/server/db/read-models/catalogue-keys'
import { createCollet, createCutter, createHolder } from '../support/catalogue'
import { createTestDatabase, type TestDatabase } from '../support/database'

let database: TestDatabase
const made: Record<string, string> = {}

beforeAll(async () => {
  database = await createTestDatabase()
  const { db } = database
  made.square = await createCutter(db, { form: 'square', substrate: 'hss' })
  made.corner = await createCutter(db, { form: 'corner_radius', corner_radius_mm: 0.5, substrate: 'carbide' })
  made.face = await createCutter(db, { form: 'face_mill', substrate: null })
  made.chuck = await createHolder(db, { bore_kind: 'collet', bore_series: 'ER16', bore_diameter_mm: null })
  made.shrink = await createHolder(db, { bore_kind: 'fixed', bore_series: null, bore_diameter_mm: 6 })
  made.collet = await createCollet(db, { series: 'ER16' })
  made.other = await createCollet(db, { series: 'TG100' })
})
afterAll(() => database.drop())

const schemas = {
  cutter: cutterListQuerySchema,
  holder: holderListQuerySchema,
  collet: colletListQuerySchema,
}

async function found(
  kind: keyof typeof schemas & CatalogueKind,
  query: string,
): Promise<(string | undefined)[]> {
  const asked = schemas[kind].parse(Object.fromEntries(new URLSearchParams(query)))
  const { ids } = await readCatalogueKeys(database.db, kind, { ...asked })
  return ids.map((id) => Object.keys(made).find((name) => made[name] === id)).sort()
}

it.each([
  ['cutter', 'form=square', ['square']],
  ['cutter', 'form=cornerRadius', ['corner']],
  ['cutter', 'form=faceMill,cornerRadius', ['corner', 'face']],
  ['cutter', 'substrate=hss', ['square']],
  ['cutter', 'form=cornerRadius,square&substrate=carbide', ['corner']],
  ['holder', 'boreKind=collet', ['chuck']],
  ['holder', 'boreKind=fixed,collet', ['chuck', 'shrink']],
  ['holder', 'series=er16', ['chuck']],
  ['collet', 'series=er16', ['collet']],
  ['collet', 'series=ER16,tg100', ['collet', 'other']],
] as const)('a list of %ss with %s shows those and no others', async (kind, query, expected) => {
  expect(await found(kind, query)).toEqual(expected)
})
