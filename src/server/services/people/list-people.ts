import type { Person } from '@/schemas/person'
import { db } from '../../db/connection'
import { listPeople as readPeople } from '../../db/stores/user-store'

export async function listPeople(): Promise<{ rows: Person[]; total: number }> {
  const rows = await readPeople(db())
  return { rows, total: rows.length }
}
