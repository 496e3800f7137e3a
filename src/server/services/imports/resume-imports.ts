import { db } from '../../db/connection'
import { removeImportRows } from '../../db/stores/import-row-store'
import { listStalledImports, listUntidyImports } from '../../db/stores/import-store'
import { applyImport } from './apply-import'
import { checkImport } from './check-import'
import { removeAbandonedFiles } from './import-files'

/** After this long without a sign of life a waiting import is taken up by any worker; one still at it holds its lock. */
const stalledSeconds = 5

/** Takes up what a worker that died left half way: from the start, since nothing of it was kept. */
export async function resumeImports(): Promise<void> {
  for (const { id, state } of await listStalledImports(db(), stalledSeconds)) {
    await (state === 'reading' ? checkImport(id) : applyImport(id))
  }
}

/** Removes rows and files that a crash between two steps left behind. */
export async function tidyImports(): Promise<void> {
  for (const id of await listUntidyImports(db())) await removeImportRows(db(), id)
  await removeAbandonedFiles()
}
