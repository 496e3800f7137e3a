import type { CatalogueDefinition } from '@/components/catalogue/catalogue-definition'
import { itemFilters } from '@/components/catalogue/catalogue-filter'
import {
  angleColumn,
  codeColumn,
  countColumn,
  itemColumns,
  lengthColumn,
  textColumn,
} from '@/components/catalogue/columns'
import { cutterForms, substrates } from '@/core/tooling'
import { cutterFormNames, substrateNames } from '@/lib/cutter-words'
import { formatLength } from '@/lib/format-length'
import type { CutterResponse } from '@/schemas/cutter'
import { cutterForm } from './cutter-form'

export const cutterCatalogue: CatalogueDefinition<CutterResponse> = {
  kind: 'cutter',
  title: 'Cutters',
  one: 'cutter',
  many: 'cutters',
  columns: (canSeeCosts) => [
    codeColumn(),
    textColumn('form', 'Form', (row) => cutterFormNames[row.form], { width: 150 }),
    lengthColumn('cuttingDiameterMm', 'DC', 'Cutting diameter (DC)', { word: 'diameter', width: 78 }),
    lengthColumn('cornerRadiusMm', 'RE', 'Corner radius (RE)', { word: 'corner', width: 72 }),
    lengthColumn('lengthOfCutMm', 'APMX', 'Length of cut (APMX)', { word: 'cut length', width: 82 }),
    lengthColumn('fluteLengthMm', 'LCF', 'Fluted length with run-out (LCF)', {
      word: 'flute',
      isUsual: false,
    }),
    lengthColumn('reachLengthMm', 'LU', 'Reach length (LU)', { word: 'reach', width: 72 }),
    lengthColumn('neckDiameterMm', 'DN', 'Neck diameter (DN)', { word: 'neck', isUsual: false }),
    lengthColumn('shankDiameterMm', 'DMM', 'Shank diameter (DMM)', { word: 'shank', width: 76 }),
    lengthColumn('overallLengthMm', 'OAL', 'Overall length (OAL)', { word: 'overall', width: 76 }),
    countColumn('fluteCount', 'NOF', 'Number of flutes (NOF)', { word: 'flutes', width: 64 }),
    angleColumn('taperHalfAngleDeg', 'κ', 'Taper, a side (κ)', { word: 'taper' }),
    angleColumn('pointAngleDeg', 'SIG', 'Point angle, included (SIG)', { word: 'point' }),
    lengthColumn('tipDiameterMm', 'Tip ⌀', 'Diameter at the tip', { isUsual: false }),
    angleColumn('neckTaperHalfAngleDeg', 'BHTA', 'Neck taper, a side (BHTA)', { word: 'neck taper' }),
    angleColumn('neckTransitionAngleDeg', 'Transition', 'Neck to shank, a side', { width: 100 }),
    textColumn('substrate', 'Made of', (row) => (row.substrate ? substrateNames[row.substrate] : ''), {
      width: 100,
      isUsual: false,
    }),
    countColumn('maximumRpm', 'RPMX', 'Highest spindle speed (RPMX)', {
      word: 'highest',
      isUsual: false,
      width: 90,
    }),
    ...itemColumns<CutterResponse>(canSeeCosts),
  ],
  filters: [
    {
      kind: 'choice',
      name: 'form',
      label: 'Form',
      anyLabel: 'Any',
      options: cutterForms.map((form) => ({ value: form, label: cutterFormNames[form] })),
    },
    { kind: 'lengthRange', name: 'cuttingDiameterMm', label: 'Cutting diameter' },
    { kind: 'lengthRange', name: 'lengthOfCutMm', label: 'Length of cut', isMore: true },
    { kind: 'lengthRange', name: 'reachLengthMm', label: 'Reach', isMore: true },
    {
      kind: 'lengthRange',
      name: 'usableDepthMm',
      label: 'Depth of a straight wall',
      isMore: true,
      isWorkedOut: true,
    },
    {
      kind: 'lengthRange',
      name: 'endRadiusMm',
      label: 'Radius at the floor',
      isMore: true,
      isWorkedOut: true,
    },
    { kind: 'lengthRange', name: 'shankDiameterMm', label: 'Shank', isMore: true },
    { kind: 'lengthRange', name: 'cornerRadiusMm', label: 'Corner radius', isMore: true },
    {
      kind: 'choice',
      name: 'substrate',
      label: 'Made of',
      anyLabel: 'Any',
      isMore: true,
      options: substrates.map((substrate) => ({ value: substrate, label: substrateNames[substrate] })),
    },
    ...itemFilters,
  ],
  facts: (row, unit) => {
    const figure = (mm: number) => formatLength(mm, unit, { withUnit: false })
    const depth = row.reachLengthMm
      ? `reach ${figure(row.reachLengthMm)}`
      : `cut ${figure(row.lengthOfCutMm ?? row.fluteLengthMm ?? 0)}`
    return `⌀${formatLength(row.cuttingDiameterMm, unit, { fractions: true })} · ${cutterFormNames[row.form]} · ${depth}`
  },
  form: cutterForm,
}
