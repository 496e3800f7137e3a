import { AppError } from '@/lib/app-error'
import type { ImportMeasurementsRequest, ImportMeasurementsResponse } from '@/schemas/assembly'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { readAssemblyParts } from '../../db/read-models/assembly-details'
import { findAssemblyIds, findLockedAssembly } from '../../db/stores/assembly-store'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { inTransaction } from '../../db/transaction'
import { type PresetterReject, type PresetterRow, readPresetterFile } from '../../imports/presetter-file'
import { toolsOf } from './assembly-tools'
import { keepMeasurement } from './measure-assembly'

/**
 * Reads what a presetter measured, by assembly number. It is shown first; taken over it goes in whole or, where a line
 * can't be taken, not at all.
 */
export async function importMeasurements(
  actor: Actor,
  request: ImportMeasurementsRequest,
): Promise<ImportMeasurementsResponse> {
  return inTransaction(db(), async (trx) => {
    const { decimalComma } = await readShopSettings(trx)
    const file = readPresetterFile(request, decimalComma)
    const ids = await findAssemblyIds(
      trx,
      file.rows.map(({ number }) => number),
    )
    const rejected = [...file.rejected]
    const rows: ImportMeasurementsResponse['rows'] = []
    for (const row of file.rows) {
      const taken = await takeRow(trx, actor, row, ids.get(row.number), request.commit)
      if ('message' in taken)
        rejected.push({ line: row.line, column: file.columns[taken.field], ...withoutField(taken) })
      else rows.push({ ...row, ...taken })
    }
    rejected.sort((one, other) => one.line - other.line)
    const { headings, columns } = file
    const isReadable = columns.number !== null && columns.gaugeLength !== null
    if (request.commit) refuseCommit(isReadable, rows.length, rejected)
    return { headings, columns, rows, rejected, isCommitted: request.commit }
  })
}

type Taken =
  | Pick<
      ImportMeasurementsResponse['rows'][number],
      'assemblyId' | 'expectedGaugeLengthMm' | 'expectedDiameterMm'
    >
  | { field: 'number' | 'gaugeLength'; value: string; message: string }

async function takeRow(
  trx: Database,
  actor: Actor,
  row: PresetterRow,
  assemblyId: string | undefined,
  isCommitted: boolean,
): Promise<Taken> {
  const assembly = assemblyId === undefined ? null : await findLockedAssembly(trx, assemblyId)
  const refused = (field: 'number' | 'gaugeLength', message: string): Taken => ({
    field,
    value: String(field === 'number' ? row.number : row.gaugeLengthMm),
    message,
  })
  if (!assembly) return refused('number', `There is no assembly ${row.number}.`)
  if (assembly.state !== 'built') return refused('number', `Assembly ${row.number} is not built.`)
  if (row.gaugeLengthMm <= assembly.gaugeLengthMm - assembly.stickOutMm) {
    return refused('gaugeLength', 'Shorter than holder and extension alone: check the unit.')
  }
  const { cutter } = toolsOf(await readAssemblyParts(trx, assembly.id))
  if (isCommitted) await keepMeasurement(trx, actor, assembly, measured(row), 'presetter')
  return {
    assemblyId: assembly.id,
    expectedGaugeLengthMm: assembly.gaugeLengthMm,
    expectedDiameterMm: cutter.cuttingDiameterMm,
  }
}

function measured({ gaugeLengthMm, diameterMm }: PresetterRow) {
  return { gaugeLengthMm, diameterMm }
}

function withoutField({ value, message }: Extract<Taken, { message: string }>) {
  return { value, message }
}

/** All of it or none: what is thrown here undoes the lines that went before. */
function refuseCommit(isReadable: boolean, rowCount: number, rejected: readonly PresetterReject[]): void {
  if (!isReadable) {
    throw new AppError('impossible', 'Say which columns hold the assembly’s number and the gauge length.')
  }
  if (rejected.length > 0) {
    const errors = rejected.map(({ line, message }) => ({ path: `line ${line}`, message }))
    throw new AppError('impossible', 'Nothing was taken over: some lines cannot be taken.', { errors })
  }
  if (rowCount === 0) throw new AppError('impossible', 'The file has no line with a measurement.')
}
