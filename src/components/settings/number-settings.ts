import type { ShopSettingsResponse } from '@/schemas/shop-settings'

interface NumberSetting {
  /** Where it stands in the settings, as the answer names a fault of it. */
  path: `reach.${string}` | `cutting.${string}` | 'measuringToleranceMm'
  kind: 'length' | 'number'
  label: string
  hint: string
}

const reachSettings: readonly NumberSetting[] = [
  {
    path: 'reach.shankClearanceMm',
    kind: 'length',
    label: 'Shank clearance, radial',
    hint: 'What run-out, neck, transition and shank keep from the wall.',
  },
  {
    path: 'reach.holderClearanceMm',
    kind: 'length',
    label: 'Holder clearance, all round',
    hint: 'What nut, holder, extension and spindle keep from the part, and everything from obstacles.',
  },
  {
    path: 'reach.stickOutStepMm',
    kind: 'length',
    label: 'Stick-out step',
    hint: 'The stick-out to set is rounded up to this: 0.5 mm or 0.050 in is usual.',
  },
  {
    path: 'reach.fluteToGripMm',
    kind: 'length',
    label: 'Flutes to grip',
    hint: 'Full shank left between the flutes or transition and where gripping begins.',
  },
  {
    path: 'reach.holeToleranceMm',
    kind: 'length',
    label: 'Hole tolerance',
    hint: 'How far a drill, reamer or tap may be from the size of its hole.',
  },
  {
    path: 'reach.drillChipRoomDiameters',
    kind: 'number',
    label: 'Room for chips behind a drill, in diameters',
    hint: 'Length of cut kept free where the maker gives no usable length; 1.5 is common practice.',
  },
  {
    path: 'reach.fluteStiffnessRatio',
    kind: 'number',
    label: 'Equivalent diameter of flutes, as a share',
    hint: 'How thick a fluted length counts when it bends: 0.8 after Kops and Vo, 1990.',
  },
  {
    path: 'reach.carbideModulusGpa',
    kind: 'number',
    label: "Carbide: Young's modulus in GPa",
    hint: '580 is typical of the 10 % cobalt rod that end mills are ground from.',
  },
  {
    path: 'reach.steelModulusGpa',
    kind: 'number',
    label: "Steel and high-speed steel: Young's modulus in GPa",
    hint: '210 is usual.',
  },
]

const cuttingSettings: readonly NumberSetting[] = [
  {
    path: 'cutting.stickOutCautionRatio',
    kind: 'number',
    label: 'Stick-out to diameter: care from',
    hint: 'Above it an assembly is marked with caution. Makers say 4.',
  },
  {
    path: 'cutting.stickOutLimitRatio',
    kind: 'number',
    label: 'Stick-out to diameter: limit',
    hint: 'Above it the shop does not go without asking. One maker says 8; no standard sets it.',
  },
  {
    path: 'cutting.radialForceShare',
    kind: 'number',
    label: 'Radial force, as a share of the cutting force',
    hint: 'For estimated side loads: 0.15 to 0.5 are given; 0.4 is cautious.',
  },
  {
    path: 'measuringToleranceMm',
    kind: 'length',
    label: 'Measuring tolerance',
    hint: 'How far a measured gauge length or diameter may be from the calculated one.',
  },
]

/** The figures a shop may set, in the order they are thought of. */
export const settingGroups: readonly { title: string; settings: readonly NumberSetting[] }[] = [
  { title: 'Reach', settings: reachSettings },
  { title: 'Cutting and measuring', settings: cuttingSettings },
]

export function settingValue(settings: ShopSettingsResponse, path: string): number {
  const value = path
    .split('.')
    .reduce<unknown>((held, name) => (held as Record<string, unknown>)[name], settings)
  if (typeof value !== 'number') throw new Error(`${path} is no figure of the settings`)
  return value
}

/** The body of a change: `reach.stickOutStepMm` stands in `reach`. */
export function settingsBody(values: readonly { path: string; value: number | null }[]) {
  const body: Record<string, number | null | Record<string, number | null>> = {}
  for (const { path, value } of values) {
    const [group = '', name] = path.split('.')
    const held = body[group]
    body[group] = name === undefined ? value : { ...(typeof held === 'object' ? held : {}), [name]: value }
  }
  return body
}
