import { db } from '../../db/connection'
import { removeImportRows } from '../../db/stores/import-row-store'
import { lockImport, markCancelled } from '../../db/stores/import-store'
import { inTransaction } from '../../db/transaction'
import { removeImportFile } from './import-files'
import { alreadyCommitted, noSuchImport } from './import-refusals'

/**
 * Ends an import that is not committed, whatever it is at. From the moment it is marked nothing of it can come into the
 * catalogue: the worker's last statement finds the mark and its transaction is undone. Its rows and file go with it.
 */
export async function cancelImport(id: string): Promise<void> {
  const filePath = await inTransaction(db(), async (trx) => {
    const found = await lockImport(trx, id)
    if (!found) throw noSuchImport()
    if (found.state === 'committed') throw alreadyCommitted()
    const hasEnded = found.state === 'cancelled' || found.state === 'failed'
    if (!hasEnded) await markCancelled(trx, id)
    return found.filePath
  })
  // In a transaction of its own: rows the worker holds are free only when it has seen the mark.
  await removeImportRows(db(), id)
  await removeImportFile(filePath)
}
