import type { CatalogueKind } from '@/core/stock/kinds'
import { decimalText } from '@/core/units/decimal-text'
import { type LengthUnit, lengthDecimals, mmPerInch } from '@/core/units/length-unit'
import { cutterFormNames, substrateNames } from '@/lib/cutter-words'
import { currencyDecimals } from '@/lib/format-money'
import type { CatalogueTypes } from '@/schemas/catalogue'
import { exportField, hasLengthUnit } from '@/schemas/import-fields'
import { csvLine, guardedText, utf8Mark } from './csv-line'

/** How figures are written: as the import of this shop reads them. */
export interface FileManner {
  unit: LengthUnit
  decimalComma: boolean
  currency: string
}

type Row = CatalogueTypes[CatalogueKind]['row']

/** What no import takes: it is told by the books or by another column. */
const otherHeadings: Readonly<Record<string, string>> = {
  boreKind: 'Holds by',
  onHand: 'On hand',
  available: 'Available',
  locations: 'Bins with stock',
}

/** Of an inch, enough that the nearest 1e-9 mm comes back. */
const inchDecimals = 11

/** Writes rows of the catalogue as a file that the import takes back without changing anything. */
export class CatalogueFile {
  private readonly delimiter: string

  constructor(
    private readonly kind: CatalogueKind,
    private readonly columns: readonly string[],
    private readonly manner: FileManner,
  ) {
    // Where a comma is the decimal sign, spreadsheets part cells by semicolons.
    this.delimiter = manner.decimalComma ? ';' : ','
  }

  headings(): string {
    return utf8Mark + csvLine(this.columns.map(this.heading), this.delimiter)
  }

  row(row: Row): string {
    return csvLine(
      this.columns.map((column) => this.cell(column, row)),
      this.delimiter,
    )
  }

  private field(column: string) {
    const isBoreSeries = column === 'series' && (this.kind === 'holder' || this.kind === 'extension')
    return exportField(this.kind, isBoreSeries ? 'boreSeries' : column)
  }

  private readonly heading = (column: string): string => {
    const field = this.field(column)
    if (!field) return otherHeadings[column] ?? column
    if (field.type === 'money') return `${field.label} (${this.manner.currency})`
    return hasLengthUnit(field.type) ? `${field.label} (${this.manner.unit})` : field.label
  }

  private cell(column: string, row: Row): string {
    const value = columnValue(column, row)
    if (value === null || value === undefined) return ''
    if (typeof value === 'string') return guardedText(value)
    const type = this.field(column)?.type
    if (type === 'money') {
      const decimals = currencyDecimals(this.manner.currency)
      return this.localised(decimalText(value / 10 ** decimals, decimals, decimals))
    }
    if (type && hasLengthUnit(type)) return this.localised(lengthText(value, this.manner.unit))
    return this.localised(decimalText(value, 0, lengthDecimals))
  }

  private localised(text: string): string {
    return this.manner.decimalComma ? text.replace('.', ',') : text
  }
}

function lengthText(mm: number, unit: LengthUnit): string {
  return unit === 'in' ? decimalText(mm / mmPerInch, 0, inchDecimals) : decimalText(mm, 0, lengthDecimals)
}

/** What stands in a column: a figure as it is kept, or words. */
function columnValue(column: string, row: Row): string | number | null | undefined {
  if (column === 'onHand' || column === 'available') return row.stock[column]
  if (column === 'locations')
    return row.stock.locations.map((place) => `${place.cribCode} ${place.code}: ${place.quantity}`).join('; ')
  if (row.kind === 'cutter' && column === 'form') return cutterFormNames[row.form]
  if (row.kind === 'cutter' && column === 'substrate') return row.substrate && substrateNames[row.substrate]
  if ('bore' in row) {
    if (column === 'boreKind') return row.bore.kind === 'collet' ? 'Collet' : 'Fixed bore'
    if (column === 'series') return row.bore.kind === 'collet' ? row.bore.series : null
    if (column === 'boreDiameterMm') return row.bore.kind === 'fixed' ? row.bore.diameterMm : null
  }
  return (row as unknown as Record<string, string | number | null>)[column]
}
