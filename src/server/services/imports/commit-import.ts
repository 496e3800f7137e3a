import { AppError } from '@/lib/app-error'
import type { RejectChoice } from '@/schemas/import'
import { db } from '../../db/connection'
import { lockImport, markCommitting } from '../../db/stores/import-store'
import { inTransaction } from '../../db/transaction'
import { commitImportJob } from '../../jobs/definitions'
import { sendJob } from '../../jobs/queue'
import { alreadyCommitted, noSuchImport } from './import-refusals'

/** Has the worker put a checked import into the catalogue. With `stop` any rejected row refuses it here and now. */
export async function commitImport(id: string, rejects: RejectChoice): Promise<{ id: string }> {
  await inTransaction(db(), async (trx) => {
    const found = await lockImport(trx, id)
    if (!found) throw noSuchImport()
    if (found.state === 'committed') throw alreadyCommitted()
    if (found.state !== 'checked') {
      throw new AppError(
        'import-not-ready',
        `This import is ${found.state}: only a checked one can be committed.`,
      )
    }
    if (found.rejectedCount > 0 && rejects === 'stop') {
      throw new AppError(
        'import-has-rejects',
        `${found.rejectedCount} rejected: correct the file, or commit without them. Nothing was changed.`,
      )
    }
    await markCommitting(trx, id, rejects)
    await sendJob(trx, commitImportJob, { importId: id })
  })
  return { id }
}
