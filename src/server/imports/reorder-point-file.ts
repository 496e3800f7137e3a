import { importField } from '@/schemas/import-fields'
import type { ReorderPointRow } from '@/schemas/reordering'
import { csvLine, guardedText, utf8Mark } from './csv-line'

type Cell = string | number | null

/** Each column of the file by its heading; what no field of the import has is told by the books. */
const columns: readonly { heading: string; value: (row: ReorderPointRow) => Cell }[] = [
  { heading: labelOf('code'), value: (row) => row.itemCode },
  { heading: 'About the item', value: (row) => row.description },
  { heading: labelOf('crib'), value: (row) => row.cribCode },
  { heading: 'On hand', value: (row) => row.onHand },
  { heading: 'Available and coming', value: (row) => row.position },
  { heading: labelOf('reorderPoint'), value: (row) => row.reorderPoint },
  { heading: labelOf('orderUpTo'), value: (row) => row.orderUpTo },
  { heading: labelOf('packSize'), value: (row) => row.packSize },
  { heading: labelOf('minimumOrder'), value: (row) => row.minimumOrder },
  { heading: labelOf('supplier'), value: (row) => row.supplierName },
  { heading: labelOf('supplierPartNumber'), value: (row) => row.supplierPartNumber },
  { heading: labelOf('leadTimeDays'), value: (row) => row.leadTimeDays },
]

function labelOf(field: string): string {
  return importField('reorderPoints', field)?.label ?? field
}

/** Writes reorder points as a file that the import takes back without changing anything. */
export class ReorderPointFile {
  private readonly delimiter: string

  constructor(decimalComma: boolean) {
    // Where a comma is the decimal sign, spreadsheets part cells by semicolons.
    this.delimiter = decimalComma ? ';' : ','
  }

  headings(): string {
    return utf8Mark + this.line(columns.map(({ heading }) => heading))
  }

  row(row: ReorderPointRow): string {
    return this.line(columns.map(({ value }) => cellText(value(row))))
  }

  private line(cells: readonly string[]): string {
    return csvLine(cells, this.delimiter)
  }
}

function cellText(value: Cell): string {
  return typeof value === 'string' ? guardedText(value) : String(value ?? '')
}
