import { AppError } from '@/lib/app-error'
import type { RecheckImportRequest } from '@/schemas/import'
import { db } from '../../db/connection'
import { lockImport, markReading } from '../../db/stores/import-store'
import { inTransaction } from '../../db/transaction'
import { checkMapping } from '../../imports/column-mapping'
import { checkDefaults } from '../../imports/import-defaults'
import { checkImportJob } from '../../jobs/definitions'
import { sendJob } from '../../jobs/queue'
import { noSuchImport } from './import-refusals'

/** Has the file read again, by other columns, another unit or another decimal sign. */
export async function recheckImport(id: string, request: RecheckImportRequest): Promise<{ id: string }> {
  await inTransaction(db(), async (trx) => {
    const found = await lockImport(trx, id)
    if (!found) throw noSuchImport()
    if (found.state !== 'checked') {
      throw new AppError(
        'import-not-ready',
        `This import is ${found.state}: only a checked one can be checked again.`,
      )
    }
    const mapping = request.mapping ?? found.mapping
    checkMapping(
      found.kind,
      mapping,
      found.columns.map((column) => column.heading),
    )
    const defaults = request.defaults ?? found.defaults
    checkDefaults(found.kind, defaults)
    await markReading(trx, id, {
      unit: request.unit ?? found.unit,
      decimals: request.decimals,
      mapping,
      defaults,
    })
    await sendJob(trx, checkImportJob, { importId: id })
  })
  return { id }
}
