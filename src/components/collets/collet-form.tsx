import dynamic from 'next/dynamic'
import { identityGroup } from '@/components/catalogue/item-fields'
import type { ItemFormDefinition } from '@/components/catalogue/item-form-definition'
import type { ColletResponse } from '@/schemas/collet'

// A list has the form's fields at hand for editing in place, but draws nothing.
const ColletDrawing = dynamic(() => import('./collet-drawing').then((module) => module.ColletDrawing))

export const colletForm: ItemFormDefinition<ColletResponse> = {
  blank: {},
  draw: (collet) => <ColletDrawing code={collet.code} collet={collet} />,
  groups: [
    identityGroup,
    {
      title: 'Collet',
      fields: [
        {
          path: 'series',
          label: 'Series',
          kind: 'line',
          isRequired: true,
          hint: 'As on the chuck, such as ER16.',
        },
        {
          path: 'lengthMm',
          label: 'Length',
          kind: 'length',
          hint: 'Two thirds of it is taken as the grip where none is given.',
        },
        { path: 'minimumMm', label: 'Smallest shank', kind: 'length', isRequired: true },
        { path: 'maximumMm', label: 'Largest shank', kind: 'length', isRequired: true },
        { path: 'minimumGripMm', label: 'Minimum clamping length', symbol: 'LSCN', kind: 'length' },
      ],
    },
  ],
}
