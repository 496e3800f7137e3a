import dynamic from 'next/dynamic'
import { withWholeSegments } from '@/components/catalogue/complete-segments'
import { boreFields, identityGroup } from '@/components/catalogue/item-fields'
import type { ItemFormDefinition } from '@/components/catalogue/item-form-definition'
import type { ExtensionResponse } from '@/schemas/extension'

// A list has the form's fields at hand for editing in place, but draws nothing.
const ExtensionDrawing = dynamic(() =>
  import('./extension-drawing').then((module) => module.ExtensionDrawing),
)

export const extensionForm: ItemFormDefinition<ExtensionResponse> = {
  blank: { bore: { kind: 'collet' } },
  draw: (extension) => <ExtensionDrawing code={extension.code} extension={extension} />,
  completeForDrawing: (body) => withWholeSegments(body, 'projectionMm'),
  groups: [
    identityGroup,
    {
      title: 'Extension',
      fields: [
        {
          path: 'projectionMm',
          label: 'Projection',
          symbol: 'E',
          kind: 'length',
          isRequired: true,
          hint: "From the holder's nose face to the extension's own.",
        },
        {
          path: 'shankDiameterMm',
          label: 'Shank diameter',
          symbol: 'DMM',
          kind: 'length',
          hint: 'What the holder takes. Blank: it is offered in any holder, and nothing checks that it fits.',
        },
      ],
    },
    { title: 'Bore', fields: boreFields },
  ],
  segments: {
    hasPart: false,
    hint: "Straight pieces from the extension's nose face towards the holder, its nut first. Shorter than the projection, the last diameter is carried on.",
  },
}
