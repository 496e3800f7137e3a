import fc from 'fast-check'
import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { cutterForms, substrates } from '@/core/tooling'
import { parseLength } from '@/core/units/parse-length'
import { cutterFormNames, substrateNames } from '@/lib/cutter-words'
import { exportColumnIds } from '@/schemas/catalogue-export'
import type { CutterResponse } from '@/schemas/cutter'
import { CatalogueFile, type FileManner } from './catalogue-file'
import { mapColumns } from './column-mapping'
import { formNamed, substrateNamed } from './trade-words'

const cutter: CutterResponse = {
  ...{ id: '1', kind: 'cutter', version: 1, code: '=1+1', maker: "'=x", partNumber: '-12', currency: 'USD' },
  ...{ description: 'Finisher, "fine"', unitCost: 123_405, archivedAt: null, form: 'cornerRadius' },
  ...{ createdAt: '2026-12-01T00:00:00Z', updatedAt: '2026-12-01T00:00:00Z', substrate: 'hss' },
  ...{ cuttingDiameterMm: 3.175, cornerRadiusMm: 0.5, taperHalfAngleDeg: null, pointAngleDeg: null },
  ...{ tipDiameterMm: null, lengthOfCutMm: 3, fluteLengthMm: null, neckDiameterMm: null, fluteCount: 4 },
  ...{ neckTaperHalfAngleDeg: null, reachLengthMm: null, neckTransitionAngleDeg: null, maximumRpm: null },
  ...{ shankDiameterMm: 6, overallLengthMm: 57 },
  stock: { onHand: 2, available: -3, isLow: false, locations: [] },
}
const inches: FileManner = { unit: 'in', decimalComma: false, currency: 'USD' }
const columns = ['code', 'cuttingDiameterMm', 'lengthOfCutMm', 'available', 'maker', 'partNumber', 'unitCost']

describe('a file of the catalogue', () => {
  it("has the unit and the currency in its headings and figures in that unit, and text that isn't computed", () => {
    const file = new CatalogueFile('cutter', columns, inches)
    expect(file.headings()).toBe(
      '\ufeffOwn code,Cutting diameter (in),Length of cut (in),Available,Maker,Maker’s part number,Unit cost (USD)\r\n',
    )
    // 3 / 25.4 = 0.118110236220472…, by hand.
    expect(file.row(cutter)).toBe("'=1+1,0.125,0.11811023622,-3,''=x,'-12,1234.05\r\n")
  })

  it('follows a shop that writes a decimal comma', () => {
    const file = new CatalogueFile('cutter', ['cuttingDiameterMm', 'unitCost'], {
      ...{ unit: 'mm', decimalComma: true, currency: 'EUR' },
    })
    expect(file.row(cutter)).toBe('3,175;1234,05\r\n')
  })

  it('has headings that the import knows, each in its unit, and no other column is taken for a field', () => {
    const notOfTheFile = ['boreKind', 'onHand', 'available', 'locations']
    for (const kind of ['cutter', 'holder', 'collet', 'extension'] as const) {
      for (const unit of ['mm', 'in'] as const) {
        const file = new CatalogueFile(kind, exportColumnIds[kind], { ...inches, unit })
        const headings = Papa.parse<string[]>(file.headings().slice(1).trimEnd()).data[0] ?? []
        const mapped = mapColumns(headings, {
          ...{ kind: `${kind}s` as const, set: {}, kept: new Map(), currency: 'USD' },
        })
        for (const [index, id] of exportColumnIds[kind].entries()) {
          const isBoreSeries = id === 'series' && kind !== 'collet'
          const field = notOfTheFile.includes(id) ? null : isBoreSeries ? 'boreSeries' : id
          expect(mapped[index]?.field, `${kind} ${id}`).toBe(field)
          if (id.endsWith('Mm')) expect(mapped[index]?.unit, `${kind} ${id}`).toBe(unit)
        }
      }
    }
  })

  it('writes words that the import reads as the same', () => {
    for (const form of cutterForms) expect(formNamed(cutterFormNames[form])).toBe(form)
    for (const substrate of substrates) expect(substrateNamed(substrateNames[substrate])).toBe(substrate)
  })

  it('writes any length so that the same comes back, in either unit', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1_000_000_000_000 }),
        fc.constantFrom('mm', 'in'),
        (steps, unit) => {
          const mm = steps / 1e9
          const file = new CatalogueFile('cutter', ['cuttingDiameterMm'], { ...inches, unit })
          const text = file.row({ ...cutter, cuttingDiameterMm: mm }).trim()
          expect(parseLength(text, { unit, decimalComma: false })).toMatchObject({ ok: true, mm })
        },
      ),
    )
  })
})
