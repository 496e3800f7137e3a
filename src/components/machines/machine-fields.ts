import type { DraftField } from './draft'

/** What is asked of a machine, in groups, in the order a person standing before it answers. */
export const machineGroups: readonly { title: string; fields: readonly DraftField[] }[] = [
  {
    title: 'The machine',
    fields: [
      {
        name: 'code',
        label: 'Code',
        kind: 'line',
        isRequired: true,
        hint: 'As the shop calls it, such as M1.',
      },
      { name: 'name', label: 'Name', kind: 'line', isRequired: true },
      {
        name: 'taper',
        label: 'Spindle taper',
        kind: 'line',
        isRequired: true,
        hint: 'Such as BT30 or CAT40.',
      },
      {
        name: 'spindleNoseDiameterMm',
        label: 'Spindle nose diameter',
        kind: 'length',
        hint: 'The face beside the taper; blank where it is not known.',
      },
    ],
  },
  {
    title: 'Envelope',
    fields: [
      {
        name: 'gaugeLineToTableMm',
        label: 'Gauge line to table',
        kind: 'length',
        isRequired: true,
        hint: 'With Z at the top of its travel.',
      },
      { name: 'zTravelMm', label: 'Z travel', kind: 'length', isRequired: true },
      { name: 'xTravelMm', label: 'X travel', kind: 'length' },
      { name: 'yTravelMm', label: 'Y travel', kind: 'length' },
    ],
  },
  {
    title: 'Tool changer',
    fields: [
      { name: 'longestToolMm', label: 'Longest tool', kind: 'length', hint: 'Gauge line to tip.' },
      { name: 'widestToolMm', label: 'Widest tool', kind: 'length' },
      { name: 'heaviestToolKg', label: 'Heaviest tool', symbol: 'kg', kind: 'number' },
      { name: 'pocketCount', label: 'Pockets', kind: 'count' },
    ],
  },
  {
    title: 'Spindle',
    fields: [
      { name: 'minimumRpm', label: 'Slowest speed', symbol: 'rpm', kind: 'count' },
      { name: 'maximumRpm', label: 'Fastest speed', symbol: 'rpm', kind: 'count', isRequired: true },
      {
        name: 'efficiency',
        label: 'Efficiency',
        kind: 'number',
        hint: 'What of the motor’s power comes to the cutter: 0.7 to 0.9 is usual.',
      },
    ],
  },
  { title: 'Note', fields: [{ name: 'note', label: 'Note', kind: 'text' }] },
]

export const machineFields = machineGroups.flatMap(({ fields }) => fields)
