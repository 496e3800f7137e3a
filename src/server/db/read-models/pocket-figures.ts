import { pocketForms, usableDepthRoundingMm } from '@/core/catalogue/usable-depth'
import { enumToDb } from '../enum-case'

const length = 'coalesce(cutters.length_of_cut_mm, cutters.flute_length_mm)'

/** That of a cutter's neck or flutes, whichever is longer: what it is as short as. */
export const workingLengthSql = `coalesce(cutters.reach_length_mm, ${length})`

/** As `usableDepth` of the core has it; a test holds the two together. */
export const usableDepthSql = (shankClearanceSql: string) => `case
  when cutters.reach_length_mm > ${length} and coalesce(cutters.neck_taper_half_angle_deg, 0) = 0
    and cutters.neck_diameter_mm + 2 * ${shankClearanceSql} <= cutters.cutting_diameter_mm + ${usableDepthRoundingMm}
    and coalesce(cutters.flute_length_mm, ${length}) <= ${length} + ${usableDepthRoundingMm}
  then cutters.reach_length_mm else ${length} end`

/** The radius a cutter leaves at the foot of a wall: half a ball's diameter, nothing of a square end. */
export const endRadiusSql = `case cutters.form when 'ball' then cutters.cutting_diameter_mm / 2
  else coalesce(cutters.corner_radius_mm, 0) end`

const isForPocketsSql = `cutters.form in (${pocketForms.map((form) => `'${enumToDb(form)}'`).join(', ')})`

/** What the cutters list is filtered by beside its columns, with the shop's own clearance; null for what cuts no pocket. */
export const pocketFilterColumns: Readonly<Record<string, string>> = {
  usableDepthMm: `(case when ${isForPocketsSql}
    then ${usableDepthSql('(select shank_clearance_mm from shop_settings)')} end)`,
  endRadiusMm: `(case when ${isForPocketsSql} then ${endRadiusSql} end)`,
}
