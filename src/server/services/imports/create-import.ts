import { AppError } from '@/lib/app-error'
import { type CreateImportRequest, createImportRequestSchema } from '@/schemas/import'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { createImport as insertImport } from '../../db/stores/import-store'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { inTransaction } from '../../db/transaction'
import { checkMapping } from '../../imports/column-mapping'
import { nonTextKind, readHead } from '../../imports/encoding'
import { checkDefaults } from '../../imports/import-defaults'
import { ImportFileError } from '../../imports/import-file-error'
import { type ReceivedUpload, receiveUpload } from '../../imports/receive-upload'
import { headingsOfHead } from '../../imports/survey-file'
import { checkImportJob } from '../../jobs/definitions'
import { sendJob } from '../../jobs/queue'
import { newImportFilePath, removeImportFile } from './import-files'
import { importSettings } from './import-settings'

/**
 * Stores an uploaded file and has the worker read and check it. What its first lines tell is refused at once: a file
 * that is no text, has no rows or too many columns, a mapping of columns it has not.
 */
export async function createImport(actor: Actor, upload: Request): Promise<{ id: string }> {
  const path = await newImportFilePath()
  const received = await receiveUpload(upload, path)
  try {
    const request = parseForm(received.fields)
    const unit = request.unit ?? actor.lengthUnit ?? (await readShopSettings(db())).lengthUnit
    await refuseUnreadable(path, { ...request, unit })
    return await inTransaction(db(), async (trx) => {
      const id = await insertImport(trx, {
        ...request,
        ...received,
        unit,
        filePath: path,
        createdBy: actor.id,
      })
      await sendJob(trx, checkImportJob, { importId: id })
      return { id }
    })
  } catch (error) {
    await removeImportFile(path)
    throw error
  }
}

/** Of a form everything is text: an empty part was left out, and the mapping and the defaults are JSON. */
function parseForm({
  kind,
  unit,
  decimals,
  mapping,
  defaults,
}: ReceivedUpload['fields']): CreateImportRequest {
  const values = {
    kind,
    unit: unit || undefined,
    decimals: decimals || undefined,
    mapping: mapping ? jsonOf('mapping', mapping, 'column to field') : undefined,
    defaults: defaults ? jsonOf('defaults', defaults, 'field to value') : undefined,
  }
  const parsed = createImportRequestSchema.safeParse(values)
  if (parsed.success) return parsed.data
  throw new AppError('wrong-shape', 'Some fields cannot be taken as they are.', {
    errors: parsed.error.issues.map(({ path, message }) => ({ path: path.map(String).join('.'), message })),
  })
}

function jsonOf(path: 'mapping' | 'defaults', text: string, shape: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    throw new AppError(
      'wrong-shape',
      path === 'mapping' ? 'The mapping is not JSON.' : 'The defaults are not JSON.',
      {
        errors: [{ path, message: `Send a JSON object: ${shape}.` }],
      },
    )
  }
}

async function refuseUnreadable(
  path: string,
  request: CreateImportRequest & { unit: 'mm' | 'in' },
): Promise<void> {
  const head = await readHead(path)
  const other = nonTextKind(head)
  if (other) throw unreadable(`This is ${other}, not CSV. Save the table as CSV and upload that.`)
  checkDefaults(request.kind, request.defaults)
  const { sources } = await importSettings({ ...request, decimals: null, decimalsOrigin: null })
  try {
    checkMapping(request.kind, request.mapping, headingsOfHead(head, sources))
  } catch (error) {
    if (error instanceof ImportFileError) throw unreadable(error.message)
    throw error
  }
}

function unreadable(message: string): AppError {
  return new AppError('impossible', message, { errors: [{ path: 'file', message }] })
}
