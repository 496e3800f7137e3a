import type { Knex } from 'knex'
import type { Role } from '@/core/policies/permissions'
import type { CribMember } from '@/schemas/crib-member'
import { enumFromDb } from '../enum-case'

/** Active people by name, with whether each is a member of the crib. */
export async function readCribMembers(db: Knex, cribId: string): Promise<CribMember[]> {
  const rows = await db('users')
    .leftJoin('crib_members', function ofCrib() {
      this.on('crib_members.user_id', 'users.id').andOnVal('crib_members.crib_id', cribId)
    })
    .where('users.is_active', true)
    .orderByRaw('lower(users.name), users.id')
    .select('users.id', 'users.name', 'users.email', 'users.role', {
      is_member: db.raw('crib_members.user_id is not null'),
    })
  return rows.map((row) => ({
    userId: row.id,
    name: row.name,
    email: row.email,
    role: enumFromDb(row.role) as Role,
    isMember: row.is_member,
  }))
}

/** False where the person is one already. */
export async function createCribMember(trx: Knex, cribId: string, userId: string): Promise<boolean> {
  const rows = await trx('crib_members')
    .insert({ crib_id: cribId, user_id: userId })
    .onConflict(['crib_id', 'user_id'])
    .ignore()
    .returning('user_id')
  return rows.length > 0
}

/** False where the person is none. */
export async function removeCribMember(trx: Knex, cribId: string, userId: string): Promise<boolean> {
  return (await trx('crib_members').where({ crib_id: cribId, user_id: userId }).delete()) > 0
}
