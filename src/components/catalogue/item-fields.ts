import type { FieldValues } from 'react-hook-form'
import type { ItemField, ItemFieldGroup } from './item-form-definition'
import { makerListId } from './maker-list'

/** What every item has, whatever its kind. */
export const identityGroup: ItemFieldGroup = {
  title: 'Item',
  fields: [
    { path: 'code', label: 'Code', kind: 'line', isRequired: true, hint: "The shop's own name for it." },
    { path: 'unitCost', label: 'Unit cost', kind: 'money' },
    { path: 'maker', label: 'Maker', kind: 'line', listId: makerListId },
    { path: 'partNumber', label: "Maker's part number", kind: 'line' },
    { path: 'description', label: 'Description', kind: 'text' },
  ],
}

function isFixedBore(values: FieldValues): boolean {
  return values.bore?.kind === 'fixed'
}

/** What takes a shank, in a holder as in an extension. */
export const boreFields: readonly ItemField[] = [
  {
    path: 'bore.kind',
    label: 'Holds the shank by',
    kind: 'choice',
    isRequired: true,
    options: [
      { value: 'collet', label: 'A collet' },
      { value: 'fixed', label: 'A fixed bore: shrink, hydraulic, side-lock' },
    ],
  },
  {
    path: 'bore.series',
    label: 'Collet series',
    kind: 'line',
    isRequired: true,
    isShown: (values) => !isFixedBore(values),
  },
  {
    path: 'bore.diameterMm',
    label: 'Bore diameter',
    kind: 'length',
    isRequired: true,
    isShown: isFixedBore,
  },
  {
    path: 'boreDepthMm',
    label: 'Bore depth',
    kind: 'length',
    hint: 'The shank can go no deeper. Needed for a reach check.',
  },
  {
    path: 'minimumGripMm',
    label: 'Minimum clamping length',
    symbol: 'LSCN',
    kind: 'length',
    hint: "The maker's figure. Needed for a reach check in a fixed bore.",
  },
  {
    path: 'gripStartMm',
    label: 'Gripping begins',
    kind: 'length',
    allowZero: true,
    hint: 'Behind the nose face; empty is 0.',
  },
  {
    path: 'nutTorqueNm',
    label: 'Nut torque in N·m',
    kind: 'count',
    isShown: (values) => !isFixedBore(values),
    hint: 'As the maker says. It stands on the set-up sheet; empty says nothing.',
  },
]
