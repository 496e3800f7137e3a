import dynamic from 'next/dynamic'
import type { FieldValues } from 'react-hook-form'
import { identityGroup } from '@/components/catalogue/item-fields'
import type { ItemFormDefinition } from '@/components/catalogue/item-form-definition'
import { type CutterForm, cutterForms, substrates } from '@/core/tooling'
import { cutterFormNames, substrateNames } from '@/lib/cutter-words'
import type { CutterResponse } from '@/schemas/cutter'

// A list has the form's fields at hand for editing in place, but draws nothing.
const CutterDrawing = dynamic(() => import('./cutter-drawing').then((module) => module.CutterDrawing))

function hasForm(...forms: CutterForm[]) {
  return (values: FieldValues) => forms.includes(values.form)
}

/** A form without a neck in the catalogues: what follows its flutes is the shank. */
const neckless = hasForm('drill', 'reamer', 'tap', 'chamfer')
const mayHaveNeck = (values: FieldValues) => !neckless(values)

/** The fields of a cutter: each form is asked only for what it has. */
export const cutterForm: ItemFormDefinition<CutterResponse> = {
  blank: { form: 'square', substrate: 'carbide' },
  draw: (cutter) => <CutterDrawing code={cutter.code} cutter={cutter} />,
  groups: [
    identityGroup,
    {
      title: 'Cutting end',
      fields: [
        {
          path: 'form',
          label: 'Form',
          kind: 'choice',
          isRequired: true,
          options: cutterForms.map((form) => ({ value: form, label: cutterFormNames[form] })),
        },
        {
          path: 'cuttingDiameterMm',
          label: 'Cutting diameter',
          symbol: 'DC',
          kind: 'length',
          isRequired: true,
        },
        {
          path: 'cornerRadiusMm',
          label: 'Corner radius',
          symbol: 'RE',
          kind: 'length',
          allowZero: true,
          isShown: hasForm('cornerRadius', 'tapered', 'faceMill', 'slotting'),
          hint: 'Half the diameter makes a tapered ball.',
        },
        {
          path: 'taperHalfAngleDeg',
          label: 'Taper, a side',
          symbol: 'κ',
          kind: 'angle',
          isRequired: true,
          isShown: hasForm('tapered'),
        },
        {
          path: 'pointAngleDeg',
          label: 'Point angle, included',
          symbol: 'SIG',
          kind: 'angle',
          isShown: hasForm('drill', 'reamer', 'tap', 'chamfer'),
          hint: 'Of a reamer or tap: its lead, where known.',
        },
        {
          path: 'tipDiameterMm',
          label: 'Diameter at the tip',
          kind: 'length',
          allowZero: true,
          isShown: hasForm('chamfer'),
          hint: '0 for a sharp point.',
        },
        { path: 'lengthOfCutMm', label: 'Length of cut', symbol: 'APMX', kind: 'length' },
        {
          path: 'fluteLengthMm',
          label: 'Fluted length',
          symbol: 'LCF',
          kind: 'length',
          hint: 'With the run-out; one of the two lengths is enough.',
        },
        { path: 'fluteCount', label: 'Flutes', symbol: 'NOF', kind: 'count' },
        {
          path: 'substrate',
          label: 'Made of',
          kind: 'choice',
          options: [
            { value: '', label: 'Not known' },
            ...substrates.map((substrate) => ({ value: substrate, label: substrateNames[substrate] })),
          ],
        },
      ],
    },
    {
      title: 'Neck',
      fields: [
        {
          path: 'neckDiameterMm',
          label: 'Neck diameter',
          symbol: 'DN',
          kind: 'length',
          isShown: mayHaveNeck,
        },
        {
          path: 'reachLengthMm',
          label: 'Reach length',
          symbol: 'LU',
          kind: 'length',
          hint: 'From the tip to the end of the neck, or the usable length.',
        },
        {
          path: 'neckTaperHalfAngleDeg',
          label: 'Neck taper, a side',
          symbol: 'BHTA',
          kind: 'angle',
          isShown: mayHaveNeck,
        },
        {
          path: 'neckTransitionAngleDeg',
          label: 'Neck to shank, a side',
          kind: 'angle',
          isShown: mayHaveNeck,
          hint: 'Empty is 45°.',
        },
      ],
    },
    {
      title: 'Shank',
      fields: [
        { path: 'shankDiameterMm', label: 'Shank diameter', symbol: 'DMM', kind: 'length', isRequired: true },
        { path: 'overallLengthMm', label: 'Overall length', symbol: 'OAL', kind: 'length', isRequired: true },
        { path: 'maximumRpm', label: 'Highest spindle speed', symbol: 'RPMX', kind: 'count' },
      ],
    },
  ],
}
