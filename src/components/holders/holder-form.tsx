import dynamic from 'next/dynamic'
import type { FieldValues } from 'react-hook-form'
import { withWholeSegments } from '@/components/catalogue/complete-segments'
import { boreFields, identityGroup } from '@/components/catalogue/item-fields'
import type { ItemFormDefinition } from '@/components/catalogue/item-form-definition'
import type { HolderResponse } from '@/schemas/holder'

// A list has the form's fields at hand for editing in place, but draws nothing.
const HolderDrawing = dynamic(() => import('./holder-drawing').then((module) => module.HolderDrawing))

const hasFixedBore = (values: FieldValues) => values.bore?.kind === 'fixed'

export const holderForm: ItemFormDefinition<HolderResponse> = {
  blank: { bore: { kind: 'collet' } },
  draw: (holder) => <HolderDrawing code={holder.code} holder={holder} />,
  completeForDrawing: (body) => withWholeSegments(body, 'gaugeLengthMm'),
  groups: [
    identityGroup,
    {
      title: 'Holder',
      fields: [
        { path: 'taper', label: 'Spindle taper', kind: 'line', hint: 'As the shop writes it, such as SK40.' },
        {
          path: 'gaugeLengthMm',
          label: 'Gauge length',
          symbol: 'A',
          kind: 'length',
          isRequired: true,
          hint: 'Gauge line to nose face.',
        },
        { path: 'maximumRpm', label: 'Highest spindle speed', symbol: 'RPMX', kind: 'count' },
      ],
    },
    {
      title: 'Bore',
      fields: [
        ...boreFields,
        {
          path: 'sideLockInsertionMm',
          label: 'Side-lock insertion',
          kind: 'length',
          isShown: hasFixedBore,
          hint: 'Where a flat decides how deep the shank goes.',
        },
      ],
    },
  ],
  segments: {
    hasPart: true,
    hint: 'Straight pieces from the nose face towards the spindle; the nut of a collet chuck comes first. Shorter than the gauge length, the last diameter is carried on.',
  },
}
