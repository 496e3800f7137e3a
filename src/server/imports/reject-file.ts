import type { RowProblem } from '@/schemas/import'
import { type ImportKind, importField } from '@/schemas/import-fields'
import type { ImportColumn } from '@/schemas/import-mapping'
import { csvLine, isFormulaLike, utf8Mark } from './csv-line'

const textTypes = new Set(['text', 'form', 'substrate', 'part', 'condition', 'unit'])
const plainNumber = /^\s*[-+]?[\d.,]+\s*$/

/**
 * Text that a spreadsheet would take for a formula gets a quote in front, which our own reader takes off again. A number
 * in a column of numbers stays a number, its minus sign too; anything else there is text.
 */
export function safeCell(cell: string, isNumberColumn: boolean): string {
  if (isNumberColumn && plainNumber.test(cell)) return cell
  return isFormulaLike(cell) ? `'${cell}` : cell
}

/** Writes rejected rows as they stood in the file, the reason in a last column. */
export class RejectFile {
  private readonly isNumber: boolean[]

  constructor(
    kind: ImportKind,
    private readonly columns: readonly ImportColumn[],
    private readonly delimiter: string,
  ) {
    this.isNumber = columns.map((column) => {
      const type = column.field ? importField(kind, column.field)?.type : undefined
      return type !== undefined && !textTypes.has(type)
    })
  }

  headings(): string {
    return `${utf8Mark}${this.line([...this.columns.map(({ heading }) => safeCell(heading, false)), 'Reason'])}`
  }

  /** An item of several rows comes out whole, so that it can be corrected and brought again. */
  rows(rejected: { cells: { line: number; cells: string[] }[]; problems: RowProblem[] }): string {
    const [first] = rejected.problems
    return rejected.cells
      .map(({ line, cells }) => {
        const own = rejected.problems.filter((problem) => problem.line === line)
        const reason =
          own.length > 0 ? own.map(reasonText).join(' ') : `Belongs to line ${first?.line ?? line}.`
        const whole = this.columns.map((_, index) =>
          safeCell(cells[index] ?? '', this.isNumber[index] ?? false),
        )
        return this.line([...whole, safeCell(reason, false)])
      })
      .join('')
  }

  private line(cells: string[]): string {
    return csvLine(cells, this.delimiter)
  }
}

function reasonText({ column, message }: RowProblem): string {
  return column === '' ? message : `${column}: ${message}`
}
