import type { Knex } from 'knex'

type CurvePoint = [rpm: number, powerKw: number | null, torqueNm: number | null]

interface MachinePlan {
  code: string
  name: string
  note: string
  sizes: Record<string, number | string>
  curve: CurvePoint[]
}

/** Invented, all three; sizes and curves are of the order such machines have. */
const machines: MachinePlan[] = [
  {
    code: 'M1',
    name: 'Five-axis mill, BT30',
    note: 'The rotary axis lies along X; its tailstock is left off for bars under 60 long.',
    sizes: {
      taper: 'BT30',
      gauge_line_to_table_mm: 420,
      x_travel_mm: 500,
      y_travel_mm: 400,
      z_travel_mm: 330,
      spindle_nose_diameter_mm: 80,
      longest_tool_mm: 200,
      widest_tool_mm: 80,
      heaviest_tool_kg: 3,
      pocket_count: 21,
      minimum_rpm: 100,
      maximum_rpm: 24_000,
      efficiency: 0.85,
    },
    curve: [
      [2400, 4.5, 18],
      [12_000, 5.5, null],
      [24_000, 4, null],
    ],
  },
  {
    code: 'M2',
    name: 'Vertical mill, CAT40',
    note: '',
    sizes: {
      taper: 'CAT40',
      gauge_line_to_table_mm: 660,
      x_travel_mm: 762,
      y_travel_mm: 406,
      z_travel_mm: 508,
      spindle_nose_diameter_mm: 120,
      longest_tool_mm: 300,
      widest_tool_mm: 76,
      heaviest_tool_kg: 5.4,
      pocket_count: 24,
      minimum_rpm: 30,
      maximum_rpm: 8100,
      efficiency: 0.8,
    },
    curve: [
      [1500, null, 70],
      [2500, 14, null],
      [8100, 11, null],
    ],
  },
  {
    code: 'M3',
    name: 'Vertical mill, BT30',
    note: 'Changer of 14; the arm strikes tools wider than 60.',
    sizes: {
      taper: 'BT30',
      gauge_line_to_table_mm: 480,
      x_travel_mm: 420,
      y_travel_mm: 320,
      z_travel_mm: 350,
      spindle_nose_diameter_mm: 74,
      longest_tool_mm: 180,
      widest_tool_mm: 60,
      heaviest_tool_kg: 2.5,
      pocket_count: 14,
      minimum_rpm: 100,
      maximum_rpm: 12_000,
      efficiency: 0.8,
    },
    curve: [
      [1500, null, 15],
      [6000, 3.7, null],
      [12_000, 3, null],
    ],
  },
]

/** The locations where the machines' tools are counted, in the order of the machines. */
export async function loadMachines(trx: Knex): Promise<string[]> {
  const locationIds: string[] = []
  for (const { code, name, note, sizes, curve } of machines) {
    const [machine] = await trx('machines')
      .insert({ code, name, note, ...sizes })
      .returning(['id', 'location_id'])
    await trx('machine_spindle_points').insert(
      curve.map(([rpm, power_kw, torque_nm]) => ({ machine_id: machine.id, rpm, power_kw, torque_nm })),
    )
    locationIds.push(machine.location_id)
  }
  return locationIds
}
