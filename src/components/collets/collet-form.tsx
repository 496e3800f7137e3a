import { identityGroup } from '@/components/catalogue/item-fields'
import type { ItemFormDefinition } from '@/components/catalogue/item-form-definition'
import { type ColletResponse, createColletRequestSchema } from '@/schemas/collet'
import { ColletDrawing } from './collet-drawing'

export const colletForm: ItemFormDefinition<ColletResponse> = {
  requestSchema: createColletRequestSchema,
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
