import type { ReachSettings } from '@/core/reach/types'

export type ReachSettingName = keyof ReachSettings

interface NumberSetting {
  name: ReachSettingName
  kind: 'length' | 'number'
  label: string
  hint: string
}

/** The figures of reach a shop may set, in the order they are thought of. */
export const numberSettings: readonly NumberSetting[] = [
  {
    name: 'shankClearanceMm',
    kind: 'length',
    label: 'Shank clearance, radial',
    hint: 'What run-out, neck, transition and shank keep from the wall.',
  },
  {
    name: 'holderClearanceMm',
    kind: 'length',
    label: 'Holder clearance, all round',
    hint: 'What nut, holder, extension and spindle keep from the part, and everything from obstacles.',
  },
  {
    name: 'stickOutStepMm',
    kind: 'length',
    label: 'Stick-out step',
    hint: 'The stick-out to set is rounded up to this: 0.5 mm or 0.050 in is usual.',
  },
  {
    name: 'fluteToGripMm',
    kind: 'length',
    label: 'Flutes to grip',
    hint: 'Full shank left between the flutes or transition and where gripping begins.',
  },
  {
    name: 'holeToleranceMm',
    kind: 'length',
    label: 'Hole tolerance',
    hint: 'How far a drill, reamer or tap may be from the size of its hole.',
  },
  {
    name: 'drillChipRoomDiameters',
    kind: 'number',
    label: 'Room for chips behind a drill, in diameters',
    hint: 'Length of cut kept free where the maker gives no usable length; 1.5 is common practice.',
  },
  {
    name: 'fluteStiffnessRatio',
    kind: 'number',
    label: 'Equivalent diameter of flutes, as a share',
    hint: 'How thick a fluted length counts when it bends: 0.8 after Kops and Vo, 1990.',
  },
  {
    name: 'carbideModulusGpa',
    kind: 'number',
    label: "Carbide: Young's modulus in GPa",
    hint: '580 is typical of the 10 % cobalt rod that end mills are ground from.',
  },
  {
    name: 'steelModulusGpa',
    kind: 'number',
    label: "Steel and high-speed steel: Young's modulus in GPa",
    hint: '210 is usual.',
  },
]
