import { columnTarget } from '@/schemas/import-mapping'
import { type Database, db } from '../../db/connection'
import { databaseErrorCode } from '../../db/database-errors'
import { createAuditEntry } from '../../db/stores/audit-store'
import { readStagedCells } from '../../db/stores/import-apply-store'
import { keepMappings } from '../../db/stores/import-mapping-store'
import {
  countOutcomes,
  rejectDuplicates,
  removeImportRows,
  removeTakenImportRows,
  replaceImportRows,
} from '../../db/stores/import-row-store'
import {
  claimImport,
  findImport,
  type ImportClaim,
  type ImportRecord,
  markChecked,
  markCommitted,
  markFailed,
  type OutcomeCounts,
} from '../../db/stores/import-store'
import { inTransaction } from '../../db/transaction'
import { checkGroups } from '../../imports/check-groups'
import { headingKey } from '../../imports/column-mapping'
import { RowReader } from '../../imports/row-reader'
import { log } from '../../log'
import { headingOf } from './check-import'
import { removeImportFile } from './import-files'
import { ClaimLost, held, whileAlone } from './import-lock'
import { importSettings } from './import-settings'
import { importSteps } from './import-steps'

/**
 * Puts a checked import into the catalogue or the books: checked again under a lock, then all in one transaction, or
 * nothing. Runs in the worker; may run again after a worker died, since nothing of a broken run is kept.
 */
export async function applyImport(importId: string): Promise<void> {
  await whileAlone(importId, async () => {
    const attempt = await claimImport(db(), importId, 'committing')
    const found = await findImport(db(), importId)
    if (attempt === null || !found) return
    const claim: ImportClaim = { id: importId, state: 'committing', attempt }
    try {
      await inTransaction(db(), (trx) =>
        breakingOffWhenCancelled(trx, importId, () => apply(trx, found, claim)),
      )
    } catch (error) {
      await endFailedRun(found, claim, error)
      return
    }
    if ((await findImport(db(), importId))?.state === 'committed') await removeImportFile(found.filePath)
  })
}

async function apply(trx: Database, found: ImportRecord, claim: ImportClaim): Promise<void> {
  await importSteps[found.kind].lock(trx, found.id)
  const isStale = await checkAgain(trx, found)
  const counts = await countOutcomes(trx, found.id)
  if (counts.rejected > 0 && found.rejects !== 'skip') {
    const message = isStale
      ? 'The catalogue changed since this file was checked, and rows that could be taken cannot any more. Nothing was changed.'
      : 'There are rejected rows. Nothing was changed.'
    await held(markChecked(trx, claim, counts, { message }))
    return
  }
  await importSteps[found.kind].apply(trx, found)
  await writeDown(trx, found, counts)
  // Before the rows go: a cancel that comes now waits here for the end, and finds the import committed.
  await held(markCommitted(trx, claim, counts))
  await removeTakenImportRows(trx, found.id)
}

/** Holds rows whose verdict may have changed against the catalogue once more; true where there were any. */
async function checkAgain(trx: Database, found: ImportRecord): Promise<boolean> {
  const stale = await importSteps[found.kind].listStale(trx, found.id)
  if (stale.length === 0) return false
  const { reading } = await importSettings(found)
  const reader = new RowReader(found.columns, reading)
  for (let from = 0; from < stale.length; from += batchSize) {
    const staged = await readStagedCells(trx, found.id, stale.slice(from, from + batchSize))
    const groups = staged.map((rows) => rows.map((row) => reader.read({ ...row, faults: [] })))
    await replaceImportRows(trx, found.id, await checkGroups(trx, groups, reader))
  }
  await rejectDuplicates(trx, found.id, found.kind, {
    code: headingOf(found, found.columns, 'code'),
    partNumber: headingOf(found, found.columns, 'partNumber'),
  })
  return true
}

const batchSize = 1000

async function writeDown(trx: Database, found: ImportRecord, counts: OutcomeCounts): Promise<void> {
  const said = Object.entries(found.mapping).map(
    ([heading, value]) => [headingKey(heading), columnTarget(value)] as const,
  )
  await keepMappings(trx, found.kind, found.createdBy, new Map(said))
  await createAuditEntry(trx, {
    actorId: found.createdBy,
    action: 'import-committed',
    entity: 'import',
    entityId: found.id,
    after: { kind: found.kind, fileName: found.fileName, ...counts },
  })
}

const lookMs = 300

/** A cancel marks the import at once; this ends the statement that may still be running for it. */
async function breakingOffWhenCancelled(
  trx: Database,
  importId: string,
  work: () => Promise<void>,
): Promise<void> {
  const { rows } = await trx.raw('select pg_backend_pid() as pid')
  const watch = setInterval(async () => {
    try {
      if ((await findImport(db(), importId))?.state !== 'cancelled') return
      clearInterval(watch)
      await db().raw('select pg_cancel_backend(?)', [rows[0].pid])
    } catch (error) {
      log.warn({ importId, error: String(error) }, 'could not look for a cancel')
    }
  }, lookMs)
  try {
    await work()
  } finally {
    clearInterval(watch)
  }
}

const queryCancelled = '57014'

/** What the database refuses ends the import with nothing changed; what may go better next time is thrown on. */
async function endFailedRun(found: ImportRecord, claim: ImportClaim, error: unknown): Promise<void> {
  const code = databaseErrorCode(error)
  if (error instanceof ClaimLost || code === queryCancelled) return
  if (!code || !/^(?:22|23|LL)/.test(code)) throw error
  log.error({ importId: found.id, error: String(error) }, 'the database refused an import')
  await db().transaction(async (trx) => {
    await held(
      markFailed(trx, claim, 'The database refused a row that passed the check. Nothing was changed.'),
    )
    await removeImportRows(trx, found.id)
  })
  await removeImportFile(found.filePath)
}
