import type { AskedSearch } from './asked-search'
import type { ClassOffer, Takers } from './offers'
import type { PlacedBounds } from './placed-bounds'
import { cutterCompliance } from './row-comparison'
import type { SearchTables } from './search-tables'
import { chosenStickOutMm, type StickOutRule } from './stick-out-rule'

/** An assembly of one cutter, with its bounds; indexes of the crib's lists, -1 for none. */
export interface WalkedAssembly {
  row: number
  holder: number
  collet: number
  extension: number
  extensionCollet: number
  lowerMm: number
  upperMm: number
  /** What of the gauge length is behind the nose. */
  behindMm: number
  penalty: number
}

/** Everything of a cutter a walk needs. */
export interface WalkFrom {
  tables: SearchTables
  asked: AskedSearch
  rule: StickOutRule
  row: number
  offer: ClassOffer
  bounds: PlacedBounds
}

/** Asked before the holders behind an extension are gone through: the assembly's own holder is not known yet. */
export type WantsStack = (assembly: WalkedAssembly, takers: Takers, lowestMm: number) => boolean

/**
 * Goes through every assembly of one cutter, whether it reaches or not.
 *
 * Assumes the visitor keeps no hold of the assembly: it is the same object every time.
 *
 * Units      Millimetres.
 *
 * @example
 * walkAssemblies({ tables: { cutters: { overallMm: [80], fullShankMm: [13], index: [0] } }, asked: { penalties: { cutters: [0] } }, row: 0, offer: { direct: { count: 0 }, extended: { count: 0 } } }, () => {}) // => undefined
 */
export function walkAssemblies(
  from: WalkFrom,
  visit: (assembly: WalkedAssembly) => void,
  wantsStack: WantsStack = () => true,
): void {
  walkDirect(from, visit)
  walkExtended(from, visit, wantsStack)
}

function emptyAssembly(row: number): WalkedAssembly {
  return {
    row,
    holder: -1,
    collet: -1,
    extension: -1,
    extensionCollet: -1,
    lowerMm: 0,
    upperMm: 0,
    behindMm: 0,
    penalty: 0,
  }
}

function walkDirect(
  { tables, asked: { penalties }, row, offer: { direct }, bounds }: WalkFrom,
  visit: (assembly: WalkedAssembly) => void,
): void {
  const { cutters, holders } = tables
  const overallMm = cutters.overallMm[row]!
  const fullShankMm = cutters.fullShankMm[row]!
  const ofCutter = penalties.cutters[cutters.index[row]!]!
  const assembly = emptyAssembly(row)
  for (let clamp = 0; clamp < direct.count; clamp++) {
    const outline = direct.outline[clamp]!
    assembly.holder = direct.owner[clamp]!
    assembly.collet = direct.collet[clamp]!
    assembly.upperMm = overallMm - direct.leastInMm[clamp]!
    assembly.lowerMm = Math.max(fullShankMm, overallMm - direct.mostInMm[clamp]!, bounds.holders[outline]!)
    assembly.behindMm = holders.lengthMm[outline]!
    assembly.penalty =
      ofCutter + penalties.holders[assembly.holder]! + colletPenalty(penalties.collets, assembly.collet)
    visit(assembly)
  }
}

function walkExtended(
  from: WalkFrom,
  visit: (assembly: WalkedAssembly) => void,
  wantsStack: WantsStack,
): void {
  const { tables, row, offer, bounds } = from
  const { penalties } = from.asked
  const { cutters, extensions, holders } = tables
  const { extended } = offer
  const overallMm = cutters.overallMm[row]!
  const ofCutter = penalties.cutters[cutters.index[row]!]!
  const assembly = emptyAssembly(row)
  for (let clamp = 0; clamp < extended.count; clamp++) {
    const takers = offer.takers[clamp]!
    const outline = extended.outline[clamp]!
    const projectionMm = extensions.lengthMm[outline]!
    assembly.extension = extended.owner[clamp]!
    assembly.collet = extended.collet[clamp]!
    assembly.upperMm = overallMm - extended.leastInMm[clamp]!
    const lowestMm = Math.max(
      cutters.fullShankMm[row]!,
      overallMm - extended.mostInMm[clamp]!,
      bounds.extensions[outline]!,
    )
    const ownPenalty =
      ofCutter + penalties.extensions[assembly.extension]! + colletPenalty(penalties.collets, assembly.collet)
    assembly.penalty = ownPenalty
    if (!wantsStack(assembly, takers, lowestMm)) continue
    for (let one = 0; one < takers.count; one++) {
      const holder = takers.holder[one]!
      const behind = holders.outlineOf[holder]!
      assembly.holder = holder
      assembly.extensionCollet = takers.collet[one]!
      assembly.lowerMm = Math.max(lowestMm, bounds.holders[behind]! - projectionMm)
      assembly.behindMm = holders.lengthMm[behind]! + projectionMm
      assembly.penalty =
        ownPenalty + penalties.holders[holder]! + colletPenalty(penalties.collets, assembly.extensionCollet)
      visit(assembly)
    }
  }
}

function colletPenalty(penalties: Float64Array, collet: number): number {
  return collet >= 0 ? penalties[collet]! : 0
}

/**
 * The stick-out of an assembly on a walk: as `chosenStickOutMm`.
 *
 * Units      Millimetres.
 *
 * @example
 * walkedStickOutMm({ rule: { stepMm: 0.5 } }, { lowerMm: 25.2, upperMm: 40 }) // => 25.5
 */
export function walkedStickOutMm({ rule }: WalkFrom, { lowerMm, upperMm }: WalkedAssembly): number {
  return chosenStickOutMm(lowerMm, upperMm, rule.stepMm)
}

/**
 * Compliance of an assembly on a walk at a stick-out.
 *
 * Units      Millimetres; micrometres per newton.
 *
 * @example
 * walkedCompliance({ tables: { cutters: { fullShankMm: [10], compliance: [1], compliancePerCubicMm: [0.001] }, holders: { outlineOf: [0], constant: [2], linear: [0.1], quadratic: [0] } } }, { row: 0, holder: 0, extension: -1 }, 20) // => 12
 */
export function walkedCompliance(
  { tables }: WalkFrom,
  { row, holder, extension }: WalkedAssembly,
  stickOutMm: number,
): number {
  const { holders, extensions } = tables
  const ofCutter = cutterCompliance(tables, row, stickOutMm)
  const behind = holders.outlineOf[holder]!
  if (extension < 0) return ofCutter + bodyCompliance(holders, behind, stickOutMm)
  const outline = extensions.outlineOf[extension]!
  return (
    ofCutter +
    bodyCompliance(extensions, outline, stickOutMm) +
    bodyCompliance(holders, behind, stickOutMm + extensions.lengthMm[outline]!)
  )
}

function bodyCompliance(bodies: SearchTables['holders'], outline: number, noseMm: number): number {
  return bodies.constant[outline]! + noseMm * (bodies.linear[outline]! + noseMm * bodies.quadratic[outline]!)
}
