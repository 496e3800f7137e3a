import type { RowProblem } from '@/schemas/import'
import { importField } from '@/schemas/import-fields'
import { listedProblems } from '@/schemas/import-limits'
import type { ImportColumn } from '@/schemas/import-mapping'
import { db } from '../../db/connection'
import {
  analyzeImportRows,
  copyImportRows,
  countOutcomes,
  rejectDuplicates,
  removeImportRows,
} from '../../db/stores/import-row-store'
import {
  claimImport,
  findImport,
  type ImportClaim,
  type ImportRecord,
  isClaimHeld,
  markChecked,
  markFailed,
  noteRowsRead,
  noteSurvey,
} from '../../db/stores/import-store'
import { checkGroups } from '../../imports/check-groups'
import { readRecords } from '../../imports/csv-file'
import { RowGroups, takesSeveralRows } from '../../imports/group-rows'
import { ImportFileError } from '../../imports/import-file-error'
import { type ImportRow, RowReader } from '../../imports/row-reader'
import { type FileSurvey, surveyFile } from '../../imports/survey-file'
import { log } from '../../log'
import { removeImportFile } from './import-files'
import { ClaimLost, held, whileAlone } from './import-lock'
import { importSettings } from './import-settings'

/** Items checked and staged at once: enough to make a question to the database worth it, little enough to hold. */
const batchSize = 500

/**
 * Reads a stored file, stages what it holds and says what each row would do. Runs in the worker; may run again after a
 * worker died, from the start. An import that is not to be read any more is left as it is.
 */
export async function checkImport(importId: string): Promise<void> {
  await whileAlone(importId, async () => {
    const attempt = await claimImport(db(), importId, 'reading')
    const found = await findImport(db(), importId)
    if (attempt === null || !found) return
    const claim: ImportClaim = { id: importId, state: 'reading', attempt }
    try {
      await new ImportCheck(found, claim).run()
    } catch (error) {
      await endFailedRun(found, claim, error)
    }
  })
}

/** A file that cannot be read ends its import with the reason; a run that lost its import ends quietly. */
async function endFailedRun(found: ImportRecord, claim: ImportClaim, error: unknown): Promise<void> {
  if (error instanceof ClaimLost) return
  const reason = fileFault(error)
  if (reason === null) throw error
  log.info({ importId: found.id, reason: String(error) }, 'import failed')
  await db().transaction(async (trx) => {
    await held(markFailed(trx, claim, reason))
    await removeImportRows(trx, found.id)
  })
  await removeImportFile(found.filePath)
}

function fileFault(error: unknown): string | null {
  if (error instanceof ImportFileError) return error.message
  if (error instanceof TypeError && 'code' in error && error.code === 'ERR_ENCODING_INVALID_ENCODED_DATA') {
    return 'This file says it is Unicode text and holds bytes that are not. Save it again as CSV UTF-8.'
  }
  if (error instanceof Error && 'code' in error && error.code === 'ENOENT')
    return 'The uploaded file is gone. Upload it again.'
  return null
}

class ImportCheck {
  private rowsRead = 0
  private readonly warnings: RowProblem[] = []
  private warningCount = 0
  private pending: ImportRow[][] = []
  private lastLook = 0

  constructor(
    private readonly found: ImportRecord,
    private readonly claim: ImportClaim,
  ) {}

  async run(): Promise<void> {
    const { sources, reading } = await importSettings(withoutGuess(this.found))
    const path = this.found.filePath
    if (path === null) throw new ImportFileError('The uploaded file is gone. Upload it again.')
    const survey = await surveyFile(path, sources, reading, () => this.stillOurs())
    await db().transaction(async (trx) => {
      await held(noteSurvey(trx, this.claim, { ...survey.format, ...survey }))
      await removeImportRows(trx, this.found.id)
    })
    const reader = new RowReader(survey.columns, {
      ...reading,
      decimalComma: survey.decimals === 'comma',
      decimalsOrigin: survey.decimalsOrigin,
    })
    await this.stageRows(path, survey, reader)
    await analyzeImportRows(db())
    await this.finish(survey.columns)
  }

  /** Asked between pieces of the file, of the database once a second. */
  private async stillOurs(): Promise<void> {
    if (Date.now() - this.lastLook < 1000) return
    this.lastLook = Date.now()
    await held(isClaimHeld(db(), this.claim))
  }

  private async stageRows(path: string, survey: FileSurvey, reader: RowReader): Promise<void> {
    const groups = new RowGroups(survey.lastLines)
    const isGrouped = takesSeveralRows(this.found.kind)
    for await (const batch of readRecords(path, survey.format)) {
      for (const record of batch) {
        if (record.line <= survey.headingLine) continue
        this.warn(reader.warningsOf(record))
        const row = reader.read(record)
        this.rowsRead += 1
        if (isGrouped) this.pending.push(...groups.add(row))
        else this.pending.push([row])
        if (this.pending.length >= batchSize) await this.stage(reader)
      }
    }
    this.pending.push(...groups.rest())
    await this.stage(reader)
  }

  private warn(warnings: readonly RowProblem[]): void {
    this.warningCount += warnings.length
    for (const warning of warnings) if (this.warnings.length < listedProblems) this.warnings.push(warning)
  }

  private async stage(reader: RowReader): Promise<void> {
    const groups = this.pending
    this.pending = []
    const staged = await checkGroups(db(), groups, reader)
    for (const row of staged) this.warn(row.warnings ?? [])
    await db().transaction(async (trx) => {
      await held(noteRowsRead(trx, this.claim, this.rowsRead))
      await copyImportRows(trx, this.found.id, staged)
    })
  }

  private async finish(columns: readonly ImportColumn[]): Promise<void> {
    const { id, kind } = this.found
    await db().transaction(async (trx) => {
      await held(noteRowsRead(trx, this.claim, this.rowsRead))
      await rejectDuplicates(trx, id, kind, {
        code: headingOf(this.found, columns, 'code'),
        partNumber: headingOf(this.found, columns, 'partNumber'),
      })
      await held(
        markChecked(trx, this.claim, await countOutcomes(trx, id), {
          warnings: this.warnings,
          warningCount: this.warningCount,
        }),
      )
    })
  }
}

/** What was guessed of the file before is guessed anew: other columns may tell more. */
function withoutGuess(found: ImportRecord): ImportRecord {
  return found.decimalsOrigin === 'set' ? found : { ...found, decimals: null, decimalsOrigin: null }
}

export function headingOf(of: ImportRecord, columns: readonly ImportColumn[], field: string): string {
  return columns.find((column) => column.field === field)?.heading ?? importField(of.kind, field)?.label ?? ''
}
