import type { IsoGroup } from '@/core/speeds/iso-groups'

/** A workpiece material as a specific cutting force table lists it. */
export interface WorkMaterial {
  /** Its number in VDI 3323. */
  number: number
  isoGroup: IsoGroup
  name: string
  /** [kc1.1] Force on a chip of 1 mm by 1 mm. */
  unitForceNPerMm2: number
  /** [mc] How much the force a square millimetre falls as the chip grows thicker. */
  thicknessExponent: number
  /** The table prints no exponent: one was taken. */
  isExponentAssumed: boolean
}

type Row = [number: number, group: IsoGroup, name: string, unitForce: number, exponent?: number]

/** What the table of hardened materials leaves open; from memory, as steel's. */
const assumedExponent = 0.25

const rows: readonly Row[] = [
  [1, 'P', 'Carbon steel below 0.25 % C, annealed, 125 HB', 1350, 0.21],
  [2, 'P', 'Carbon steel from 0.25 % C, annealed, 190 HB', 1500, 0.22],
  [3, 'P', 'Carbon steel below 0.55 % C, quenched and tempered, 250 HB', 1675, 0.24],
  [4, 'P', 'Carbon steel from 0.55 % C, annealed, 220 HB', 1700, 0.24],
  [5, 'P', 'Carbon steel from 0.55 % C, quenched and tempered, 300 HB', 1900, 0.24],
  [6, 'P', 'Low alloy steel, annealed, 200 HB', 1775, 0.24],
  [7, 'P', 'Low alloy steel, quenched and tempered, 275 HB', 1675, 0.24],
  [8, 'P', 'Low alloy steel, quenched and tempered, 300 HB', 1725, 0.24],
  [9, 'P', 'Low alloy steel, quenched and tempered, 350 HB', 1800, 0.24],
  [10, 'P', 'Tool steel, annealed, 200 HB', 2450, 0.23],
  [11, 'P', 'Tool steel, quenched and tempered, 325 HB', 2500, 0.23],
  [12, 'M', 'Stainless steel, ferritic or martensitic, 200 HB', 1875, 0.21],
  [13, 'M', 'Stainless steel, martensitic, 240 HB', 1875, 0.21],
  [14, 'M', 'Stainless steel, austenitic, 180 HB', 2150, 0.2],
  [15, 'K', 'Grey iron, ferritic and pearlitic, 180 HB', 1150, 0.2],
  [16, 'K', 'Grey iron, pearlitic and martensitic, 260 HB', 1350, 0.28],
  [17, 'K', 'Nodular iron, ferritic, 160 HB', 1225, 0.25],
  [18, 'K', 'Nodular iron, pearlitic, 250 HB', 1350, 0.28],
  [19, 'K', 'Malleable iron, ferritic, 130 HB', 1225, 0.25],
  [20, 'K', 'Malleable iron, pearlitic, 230 HB', 1420, 0.3],
  [21, 'N', 'Wrought aluminium, not hardenable, 60 HB', 700, 0.25],
  [22, 'N', 'Wrought aluminium, hardened, 100 HB', 800, 0.25],
  [23, 'N', 'Cast aluminium to 12 % Si, not hardenable, 75 HB', 700, 0.25],
  [24, 'N', 'Cast aluminium to 12 % Si, hardened, 90 HB', 700, 0.25],
  [25, 'N', 'Cast aluminium over 12 % Si, 130 HB', 750, 0.25],
  [26, 'N', 'Free cutting copper alloy, 110 HB', 700, 0.27],
  [27, 'N', 'Brass, 90 HB', 700, 0.27],
  [28, 'N', 'Electrolytic copper, 100 HB', 700, 0.27],
  [31, 'S', 'Heat-resistant iron alloy, annealed, 200 HB', 2600, 0.24],
  [32, 'S', 'Heat-resistant iron alloy, hardened, 280 HB', 3100, 0.24],
  [33, 'S', 'Nickel or cobalt alloy, annealed, 250 HB', 3300, 0.24],
  [34, 'S', 'Nickel or cobalt alloy, hardened, 350 HB', 3300, 0.24],
  [35, 'S', 'Nickel or cobalt alloy, cast, 320 HB', 3300, 0.24],
  [36, 'S', 'Titanium, pure', 1700, 0.23],
  [37, 'S', 'Titanium alloy, alpha and beta, hardened', 2110, 0.22],
  [38, 'H', 'Hardened steel, 55 HRC', 4600],
  [39, 'H', 'Hardened steel, 60 HRC', 4700],
  [40, 'H', 'Chilled cast iron, 400 HB', 4600],
  [41, 'H', 'Hardened cast iron, 55 HRC', 4500],
]

/** A maker's table of 2017 after VDI 3323, as test/reference/cutting/cutting-force.md has it. Others differ by 20 to 40 %. */
export const workMaterials: readonly WorkMaterial[] = rows.map(
  ([number, isoGroup, name, unitForceNPerMm2, exponent]) => ({
    number,
    isoGroup,
    name,
    unitForceNPerMm2,
    thicknessExponent: exponent ?? assumedExponent,
    isExponentAssumed: exponent === undefined,
  }),
)

export function findWorkMaterial(number: number): WorkMaterial | null {
  return workMaterials.find((material) => material.number === number) ?? null
}
