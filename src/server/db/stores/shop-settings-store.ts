import type { Knex } from 'knex'
import type { ReachSettings } from '@/core/reach/types'
import type { LengthUnit } from '@/core/units/length-unit'

export interface ShopSettings {
  shopName: string
  /** ISO 4217 */
  currency: string
  lengthUnit: LengthUnit
  decimalComma: boolean
  reach: ReachSettings
  version: number
}

/** The one row of settings; the migration makes it, so it is always there. */
export async function readShopSettings(db: Knex): Promise<ShopSettings> {
  const row = await db('shop_settings').where('id', 1).first()
  return {
    shopName: row.shop_name,
    currency: row.currency,
    lengthUnit: row.length_unit,
    decimalComma: row.decimal_comma,
    version: row.version,
    reach: {
      shankClearanceMm: row.shank_clearance_mm,
      holderClearanceMm: row.holder_clearance_mm,
      stickOutStepMm: row.stick_out_step_mm,
      fluteToGripMm: row.flute_to_grip_mm,
      holeToleranceMm: row.hole_tolerance_mm,
      drillChipRoomDiameters: row.drill_chip_room_diameters,
      fluteStiffnessRatio: row.flute_stiffness_ratio,
      carbideModulusGpa: row.carbide_modulus_gpa,
      steelModulusGpa: row.steel_modulus_gpa,
    },
  }
}
