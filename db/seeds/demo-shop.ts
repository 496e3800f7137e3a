import type { Knex } from 'knex'
import { closeDb, db } from '@/server/db/connection'
import { inTransaction } from '@/server/db/transaction'
import { loadAssemblies } from './demo-shop/assemblies'
import { loadCatalogue } from './demo-shop/catalogue'
import { loadFixtures, loadSetUps } from './demo-shop/fixtures'
import { loadPeople } from './demo-shop/people'
import { loadPlaces } from './demo-shop/places'
import { loadReorderPoints } from './demo-shop/reorder-points'
import { loadYear } from './demo-shop/year'

/**
 * Loads the demo shop, once: a small job shop that never was, with its people, places, tools and a year of movements.
 * The same seed makes the same shop; only the dates end at the day of loading. One transaction: all of it or none.
 */
async function loadDemoShop(trx: Knex): Promise<string> {
  const settings = await trx('shop_settings').where('id', 1).forUpdate().first()
  if (settings.demo_loaded_at) return 'The demo shop is here already.'
  const someone = await trx('users').first('id')
  if (someone) return 'This database holds a shop of its own; the demo shop was left out.'
  const places = await loadPlaces(trx)
  const people = await loadPeople(trx, places)
  const items = await loadCatalogue(trx)
  await loadSetUps(trx, await loadFixtures(trx, places, people))
  const plans = await loadReorderPoints(trx, items, places)
  const movements = await loadYear(trx, { people, places, items, plans })
  await loadAssemblies(trx, items, people)
  await trx('shop_settings').where('id', 1).update({
    shop_name: 'Skerry Lane Machine Works',
    currency: 'EUR',
    length_unit: 'mm',
    setup_completed_at: trx.fn.now(),
    demo_loaded_at: trx.fn.now(),
  })
  return `The demo shop is loaded: ${items.length} items, ${movements} movements.`
}

try {
  process.stdout.write(`${await inTransaction(db(), loadDemoShop)}\n`)
} finally {
  await closeDb()
}
