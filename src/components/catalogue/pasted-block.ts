import { fileLimitText, importLimits } from '@/schemas/import-limits'

export interface PastedBlock {
  rows: number
  columns: number
  /** Why it can't be taken as it is; null where nothing stands against it. */
  fault: string | null
}

/** Columns of the widest of the first lines: a break inside a quoted cell makes a line look narrower, never wider. */
const looked = 50

/** What a block copied from a spreadsheet looks like: lines of cells parted by tabs. */
export function pastedBlock(text: string, hasHeadings: boolean): PastedBlock {
  const lines = text.split(/\r\n|\r|\n/).filter((line) => line.trim() !== '')
  const columns = Math.max(0, ...lines.slice(0, looked).map((line) => line.split('\t').length))
  const rows = lines.length - (hasHeadings ? 1 : 0)
  return { rows: Math.max(0, rows), columns: lines.length === 0 ? 0 : columns, fault: faultOf() }

  function faultOf(): string | null {
    if (lines.length === 0)
      return 'There is nothing here yet. Copy the rows in the spreadsheet and paste them.'
    if (columns > importLimits.columns) {
      return (
        `This block has ${columns.toLocaleString('en')} columns; at most ${importLimits.columns} can be taken. ` +
        'Copy only the columns of the list.'
      )
    }
    if (new Blob([text]).size > importLimits.fileBytes)
      return `This block is larger than ${fileLimitText}. Paste it in parts, or import it as a file.`
    return rows < 1 ? 'There is only a line of headings here. Copy the rows too.' : null
  }
}

/** The block as a file that the import reads; where it has no headings its columns are numbered, to be named on the next page. */
export function pastedFile(text: string, hasHeadings: boolean): File {
  const { columns } = pastedBlock(text, hasHeadings)
  const headings = Array.from({ length: columns }, (_, index) => `Column ${index + 1}`).join('\t')
  const content = hasHeadings ? text : `${headings}\n${text}`
  return new File([content], 'pasted-rows.tsv', { type: 'text/tab-separated-values' })
}

/** Whether pasted text is a block of cells rather than a word meant for a field. */
export function isBlock(text: string): boolean {
  return text.includes('\t') && text.trim() !== ''
}
