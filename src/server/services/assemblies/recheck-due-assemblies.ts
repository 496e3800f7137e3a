import { type Database, db } from '../../db/connection'
import {
  findLockedAssembly,
  listDueAssemblies,
  listRecheckRequests,
  removeRecheckRequests,
} from '../../db/stores/assembly-store'
import { inTransaction } from '../../db/transaction'
import { log } from '../../log'
import { recheckAssembly } from './recheck-assembly'

const restAfterFailureMs = 60_000
/** Assemblies whose last look failed, and when the next may be tried; another process begins anew. */
const resting = new Map<string, number>()

/**
 * Looks again at every assembly somebody's change asked for. A request goes in the transaction that kept what was found,
 * so a worker that dies leaves it for the next, and one that comes twice finds nothing new.
 */
export async function recheckDueAssemblies(): Promise<void> {
  for (const id of await listDueAssemblies(db())) {
    if ((resting.get(id) ?? 0) > Date.now()) continue
    try {
      await inTransaction(db(), (trx) => recheckDue(trx, id))
      resting.delete(id)
    } catch (error) {
      resting.set(id, Date.now() + restAfterFailureMs)
      log.error(
        { assemblyId: id, error: error instanceof Error ? error.stack : String(error) },
        'assembly not rechecked',
      )
    }
  }
}

/** The requests are read before anything they ask about: one that comes meanwhile stays for another look. */
async function recheckDue(trx: Database, id: string): Promise<void> {
  const assembly = await findLockedAssembly(trx, id)
  const requests = await listRecheckRequests(trx, id)
  if (assembly && !assembly.isArchived) {
    const movementId = requests.findLast((request) => request.movementId !== null)?.movementId ?? null
    await recheckAssembly(trx, assembly, movementId)
  }
  await removeRecheckRequests(
    trx,
    requests.map((request) => request.id),
  )
}
