import { db } from '../../db/connection'
import { readRejectedCells } from '../../db/read-models/import-views'
import { RejectFile } from '../../imports/reject-file'
import { getImport } from './get-import'

const rowsAPiece = 500

export interface RejectDownload {
  fileName: string
  /** UTF-8, piece by piece as it is asked for. */
  body: ReadableStream<Uint8Array>
}

/** The rejected rows of an import as a CSV file with the reason in its last column. */
export async function downloadRejects(id: string): Promise<RejectDownload> {
  const found = await getImport(id)
  const file = new RejectFile(found.kind, found.columns, found.delimiter ?? ',')
  const encoder = new TextEncoder()
  let afterLine = 0
  const body = new ReadableStream<Uint8Array>({
    start: (controller) => controller.enqueue(encoder.encode(file.headings())),
    pull: async (controller) => {
      const rows = await readRejectedCells(db(), id, afterLine, rowsAPiece)
      afterLine = rows.at(-1)?.line ?? afterLine
      if (rows.length > 0) controller.enqueue(encoder.encode(rows.map((row) => file.rows(row)).join('')))
      if (rows.length < rowsAPiece) controller.close()
    },
  })
  return { fileName: rejectName(found.fileName), body }
}

/** Letters, digits, dots and dashes alone, since it goes into a header. */
function rejectName(fileName: string): string {
  const stem = fileName
    .replace(/\.[^.]*$/, '')
    .replace(/[^\w.-]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 80)
  return `${stem || 'import'}-rejects.csv`
}
