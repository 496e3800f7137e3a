import { withWholeSegments } from '@/components/catalogue/complete-segments'
import { boreFields, identityGroup } from '@/components/catalogue/item-fields'
import type { ItemFormDefinition } from '@/components/catalogue/item-form-definition'
import { createExtensionRequestSchema, type ExtensionResponse } from '@/schemas/extension'
import { ExtensionDrawing } from './extension-drawing'

export const extensionForm: ItemFormDefinition<ExtensionResponse> = {
  requestSchema: createExtensionRequestSchema,
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
