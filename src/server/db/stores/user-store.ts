import type { Knex } from 'knex'
import type { Role } from '@/core/policies/permissions'
import type { LengthUnit } from '@/core/units/length-unit'
import { enumFromDb } from '../enum-case'

export interface SignInUser {
  id: string
  name: string
  email: string
  role: Role
  locationId: string
  passwordHash: string | null
}

/** An active person by e-mail, with the hash that only signing in may read. */
export async function findUserForSignIn(db: Knex, email: string): Promise<SignInUser | null> {
  const row = await db('users')
    .join('locations', 'locations.user_id', 'users.id')
    .whereRaw('lower(users.email) = ?', [email])
    .where('users.is_active', true)
    .first('users.id', 'users.name', 'users.email', 'users.role', 'users.password_hash', {
      location_id: 'locations.id',
    })
  if (!row) return null
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    role: enumFromDb(row.role) as Role,
    locationId: row.location_id,
    passwordHash: row.password_hash,
  }
}

export async function updateUserLengthUnit(db: Knex, userId: string, unit: LengthUnit | null): Promise<void> {
  await db('users').where('id', userId).update({ length_unit: unit })
}
