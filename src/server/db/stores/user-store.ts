import type { Knex } from 'knex'
import type { Role } from '@/core/policies/permissions'
import type { LengthUnit } from '@/core/units/length-unit'
import type { Person } from '@/schemas/person'
import { enumFromDb, enumToDb } from '../enum-case'

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

const personColumns = [
  'users.id',
  'users.version',
  'users.name',
  'users.email',
  'users.role',
  'users.is_active',
  'users.home_crib_id',
] as const

interface PersonRow {
  id: string
  version: number
  name: string
  email: string
  role: string
  is_active: boolean
  home_crib_id: string | null
  has_password: boolean
  last_seen_at: Date | null
}

function personOf(row: PersonRow): Person {
  return {
    id: row.id,
    version: row.version,
    name: row.name,
    email: row.email,
    role: enumFromDb(row.role) as Role,
    isActive: row.is_active,
    hasPassword: row.has_password,
    homeCribId: row.home_crib_id,
    lastSeenAt: row.last_seen_at?.toISOString() ?? null,
  }
}

function selectPeople(db: Knex) {
  return db('users')
    .select<PersonRow[]>(
      ...personColumns,
      db.raw('users.password_hash is not null as has_password'),
      db.raw('(select max(last_seen_at) from sessions where sessions.user_id = users.id) as last_seen_at'),
    )
    .orderByRaw('users.is_active desc, lower(users.name), users.id')
}

export async function listPeople(db: Knex): Promise<Person[]> {
  return (await selectPeople(db)).map(personOf)
}

export async function findPerson(db: Knex, id: string): Promise<Person | null> {
  const [row] = await selectPeople(db).where('users.id', id)
  return row ? personOf(row) : null
}

export interface NewUser {
  email: string
  name: string
  role: Role
  homeCribId: string | null
  passwordHash: string | null
}

/** The id of the new person; their location is made by the database. */
export async function createUser(trx: Knex, user: NewUser): Promise<string> {
  const [row] = await trx('users')
    .insert({
      email: user.email,
      name: user.name,
      role: enumToDb(user.role),
      home_crib_id: user.homeCribId,
      password_hash: user.passwordHash,
    })
    .returning('id')
  return row.id
}

export interface UserChange {
  name?: string | undefined
  role?: Role | undefined
  isActive?: boolean | undefined
  homeCribId?: string | null | undefined
}

/** False where the version is no longer the row's. */
export async function updateUser(
  trx: Knex,
  id: string,
  version: number,
  change: UserChange,
): Promise<boolean> {
  const columns = {
    ...(change.name === undefined ? {} : { name: change.name }),
    ...(change.role === undefined ? {} : { role: enumToDb(change.role) }),
    ...(change.isActive === undefined ? {} : { is_active: change.isActive }),
    ...(change.homeCribId === undefined ? {} : { home_crib_id: change.homeCribId }),
  }
  if (Object.keys(columns).length === 0) return true
  return (await trx('users').where({ id, version }).update(columns)) === 1
}

export async function updateUserPassword(trx: Knex, id: string, passwordHash: string): Promise<void> {
  await trx('users').where('id', id).update({ password_hash: passwordHash })
}

export async function getPasswordHash(db: Knex, id: string): Promise<string | null> {
  const row = await db('users').where('id', id).first('password_hash')
  return row?.password_hash ?? null
}

/**
 * How many people could still sign in as an admin. Locks their rows, so that two admins who demote each other at once
 * are taken one after the other.
 */
export async function countActiveAdmins(trx: Knex): Promise<number> {
  const rows = await trx('users')
    .where({ role: 'admin', is_active: true })
    .orderBy('id')
    .forUpdate()
    .select('id')
  return rows.length
}
