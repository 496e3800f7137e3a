import { leastSpeedLimit, type SpeedLimits } from '@/core/speeds/speed-limit'
import { spindleRange } from '@/core/speeds/spindle-range'
import type { CutterGeometry, Substrate } from '@/core/tooling'
import { AppError } from '@/lib/app-error'
import type { ReachSearchRequest, SearchOptionResponse } from '@/schemas/reach-search'
import { db } from '../../db/connection'
import { listStartingSpeeds } from '../../db/stores/starting-speed-store'

/** The shop's starting speeds in one material, by what the tool is made of. */
export type MaterialSpeeds = ReadonlyMap<Substrate, { lowMPerMin: number; highMPerMin: number }>

/** Null where no material was named. Which cutters suit it the catalogue does not know: it says where to start alone. */
export async function materialSpeeds({ where }: ReachSearchRequest): Promise<MaterialSpeeds | null> {
  if (where?.material == null) return null
  const named = where.material.toLowerCase()
  const rows = (await listStartingSpeeds(db())).filter(({ material }) => material.toLowerCase() === named)
  if (rows.length > 0) return new Map(rows.map((row) => [row.substrate, row]))
  const message = 'The shop has no starting speed for this material.'
  throw new AppError('impossible', message, { errors: [{ path: 'where.material', message }] })
}

/**
 * Where to start with a cutter, held to the least of cutter, holder and spindle. One whose own material was never entered
 * counts as carbide, as in its stiffness.
 */
export function startingSpeed(
  cutter: CutterGeometry & { maximumRpm?: number | null },
  speeds: MaterialSpeeds | null,
  otherLimitsRpm: Pick<SpeedLimits, 'holder' | 'spindle'>,
): NonNullable<SearchOptionResponse['speed']> | null {
  const range = speeds?.get(cutter.substrate ?? 'carbide')
  if (!range) return null
  const { lowMPerMin, highMPerMin } = range
  const limit = leastSpeedLimit({ ...otherLimitsRpm, cutter: cutter.maximumRpm ?? null })
  return { lowMPerMin, highMPerMin, ...spindleRange(cutter.cuttingDiameterMm, range, limit?.rpm) }
}
