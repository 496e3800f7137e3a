import bcrypt from 'bcryptjs'
import type { Knex } from 'knex'
import type { Places } from './places'

export interface People {
  cribManagerId: string
  /** Those who cut, with the location of each one's own hands. */
  machinists: { userId: string; locationId: string }[]
}

const demoPassword = 'leadline-demo'
const bcryptCost = 12

/** Invented, all of them; the four with an account can sign in. */
const people = [
  { email: 'admin', name: 'Wren Ashgrove', role: 'admin', hasAccount: true },
  { email: 'crib', name: 'Idris Fallowfield', role: 'crib_manager', hasAccount: true },
  { email: 'machinist', name: 'Maja Thornqvist', role: 'machinist', hasAccount: true },
  { email: 'estimator', name: 'Tomas Oakhanger', role: 'estimator', hasAccount: true, unit: 'in' },
  { email: 'bo', name: 'Bo Larkspur', role: 'machinist', hasAccount: false },
  { email: 'sunniva', name: 'Sunniva Reedham', role: 'machinist', hasAccount: false },
  { email: 'ferdie', name: 'Ferdie Quillmoor', role: 'machinist', hasAccount: false },
] as const

export async function loadPeople(trx: Knex, places: Places): Promise<People> {
  const hashes = await Promise.all(
    people.map((person) => (person.hasAccount ? bcrypt.hash(demoPassword, bcryptCost) : null)),
  )
  const users = await trx('users')
    .insert(
      people.map((person, index) => ({
        email: `${person.email}@leadline.example`,
        name: person.name,
        role: person.role,
        length_unit: 'unit' in person ? person.unit : null,
        password_hash: hashes[index],
        home_crib_id: places.mainCribId,
      })),
    )
    .returning(['id', 'role'])
  const cribManager = users.find((user: { role: string }) => user.role === 'crib_manager')
  await trx('crib_members').insert([
    { crib_id: places.mainCribId, user_id: cribManager.id },
    { crib_id: places.eastCribId, user_id: cribManager.id },
  ])
  const cutterIds = users.filter((user: { role: string }) => user.role === 'machinist').map(({ id }) => id)
  const hands = await trx('locations')
    .whereIn('user_id', cutterIds)
    .orderBy('user_id')
    .select('id', 'user_id')
  return {
    cribManagerId: cribManager.id,
    machinists: hands.map((row: { id: string; user_id: string }) => ({
      userId: row.user_id,
      locationId: row.id,
    })),
  }
}
