import type { Knex } from 'knex'
import type { CuttingSettings } from '@/core/cutting/cut-answer'
import type { ReachSettings } from '@/core/reach/types'
import type { LengthUnit } from '@/core/units/length-unit'

export interface ShopSettings {
  shopName: string
  /** ISO 4217 */
  currency: string
  lengthUnit: LengthUnit
  decimalComma: boolean
  reach: ReachSettings
  cutting: CuttingSettings
  /** How far a measured gauge length or diameter may be from the calculated one. */
  measuringToleranceMm: number
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
    cutting: {
      radialForceShare: row.radial_force_share,
      stickOutCautionRatio: row.stick_out_caution_ratio,
      stickOutLimitRatio: row.stick_out_limit_ratio,
    },
    measuringToleranceMm: row.measuring_tolerance_mm,
  }
}

export interface ShopSettingsChange {
  shopName?: string | undefined
  currency?: string | undefined
  lengthUnit?: LengthUnit | undefined
  decimalComma?: boolean | undefined
  reach?: { [Name in keyof ReachSettings]?: ReachSettings[Name] | undefined } | undefined
  cutting?: { [Name in keyof CuttingSettings]?: CuttingSettings[Name] | undefined } | undefined
  measuringToleranceMm?: number | undefined
}

function columnsOf(change: ShopSettingsChange): Record<string, unknown> {
  const { reach = {}, cutting = {} } = change
  const columns = {
    shop_name: change.shopName,
    currency: change.currency,
    length_unit: change.lengthUnit,
    decimal_comma: change.decimalComma,
    shank_clearance_mm: reach.shankClearanceMm,
    holder_clearance_mm: reach.holderClearanceMm,
    stick_out_step_mm: reach.stickOutStepMm,
    flute_to_grip_mm: reach.fluteToGripMm,
    hole_tolerance_mm: reach.holeToleranceMm,
    drill_chip_room_diameters: reach.drillChipRoomDiameters,
    flute_stiffness_ratio: reach.fluteStiffnessRatio,
    carbide_modulus_gpa: reach.carbideModulusGpa,
    steel_modulus_gpa: reach.steelModulusGpa,
    radial_force_share: cutting.radialForceShare,
    stick_out_caution_ratio: cutting.stickOutCautionRatio,
    stick_out_limit_ratio: cutting.stickOutLimitRatio,
    measuring_tolerance_mm: change.measuringToleranceMm,
  }
  return Object.fromEntries(Object.entries(columns).filter(([, value]) => value !== undefined))
}

/** False where the version is no longer the row's. */
export async function updateShopSettings(
  trx: Knex,
  version: number,
  change: ShopSettingsChange,
): Promise<boolean> {
  const columns = columnsOf(change)
  if (Object.keys(columns).length === 0) return true
  return (await trx('shop_settings').where({ id: 1, version }).update(columns)) === 1
}

/** The first day is over: the shop has its name and unit. */
export async function completeSetup(trx: Knex, change: ShopSettingsChange): Promise<void> {
  await trx('shop_settings')
    .where('id', 1)
    .update({ ...columnsOf(change), setup_completed_at: trx.fn.now() })
}
