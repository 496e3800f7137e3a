import { AppError } from '@/lib/app-error'
import { db } from '../../db/connection'

const patienceMs = 2000

/** Answers only while the database does. */
export async function checkHealth(): Promise<{ status: 'ok' }> {
  try {
    await db().raw('select 1').timeout(patienceMs)
  } catch (error) {
    throw new AppError('database-unreachable', 'The database does not answer.', { note: String(error) })
  }
  return { status: 'ok' }
}
