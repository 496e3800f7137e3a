import type { DraftField } from './draft'

export const setUpFields: readonly DraftField[] = [
  { name: 'name', label: 'Name', kind: 'line', isRequired: true },
  {
    name: 'highestMm',
    label: 'Highest thing above the table',
    kind: 'distance',
    isRequired: true,
    hint: 'Part, jaws and clamps; fixtures and rotary stock count by themselves.',
  },
  {
    name: 'lowestTipMm',
    label: 'Lowest tip position above the table',
    kind: 'distance',
    isRequired: true,
    hint: 'The floor of the deepest feature, less a drill’s point and what it breaks through.',
  },
  {
    name: 'retractClearanceMm',
    label: 'Retract clearance',
    kind: 'distance',
    isRequired: true,
    hint: 'Kept over the highest thing, and by what turns from the table.',
  },
]

export const noteField: DraftField = { name: 'note', label: 'Note', kind: 'text' }

export const rotaryFields: readonly DraftField[] = [
  { name: 'widthMm', label: 'Stock width', kind: 'length', isRequired: true },
  { name: 'heightMm', label: 'Stock height', kind: 'length', isRequired: true },
  {
    name: 'axisHeightMm',
    label: 'Axis above the table',
    kind: 'length',
    isRequired: true,
    hint: 'Of the rotary axis.',
  },
  {
    name: 'chuckRadiusMm',
    label: 'Chuck, jaws or faceplate: radius',
    kind: 'distance',
    hint: 'The farthest they stand from the axis.',
  },
  { name: 'offsetXMm', label: 'Axis off the middle, across', kind: 'distance' },
  { name: 'offsetYMm', label: 'Axis off the middle, up', kind: 'distance' },
  {
    name: 'partDiameterMm',
    label: 'Diameter of the part',
    kind: 'length',
    hint: 'What it is turned or milled to.',
  },
  { name: 'centringErrorMm', label: 'Centring known to', kind: 'distance' },
]
