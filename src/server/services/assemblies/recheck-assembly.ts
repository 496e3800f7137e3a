import { assemblyFindings, type Recheck } from '@/core/assemblies/assembly-findings'
import type { Finding } from '@/core/assemblies/types'
import type { Database } from '../../db/connection'
import { readAssemblyChecks, readAssemblyParts } from '../../db/read-models/assembly-details'
import { readMeasurements } from '../../db/read-models/assembly-rows'
import {
  type AssemblyRecord,
  createFinding,
  listOpenFindings,
  resolveFindings,
  updateFinding,
  writeCheckOutcome,
} from '../../db/stores/assembly-store'
import { createAuditEntry } from '../../db/stores/audit-store'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { readPartSizes, toolsOf } from './assembly-tools'

/**
 * Looks at a locked assembly with the sizes and places its parts have now, and keeps what was found: what is found again
 * stays the finding it was, what is found no more is resolved. Done twice, it changes nothing the second time.
 */
export async function recheckAssembly(
  trx: Database,
  assembly: Pick<AssemblyRecord, 'id' | 'number' | 'stickOutMm'>,
  movementId: string | null = null,
): Promise<Recheck> {
  const recheck = await lookAgain(trx, assembly)
  for (const outcome of recheck.outcomes) await writeCheckOutcome(trx, outcome.checkId, outcome)
  const fresh = await keepFindings(trx, assembly.id, recheck.findings, movementId)
  if (fresh.some(({ isFault }) => isFault)) {
    await createAuditEntry(trx, {
      actorId: null,
      action: 'assembly-marked',
      entity: 'assembly',
      entityId: assembly.id,
      after: fresh.map(({ key, isFault, detail }) => ({ key, isFault, detail })),
    })
  }
  return recheck
}

async function lookAgain(
  trx: Database,
  { id, stickOutMm }: Pick<AssemblyRecord, 'id' | 'stickOutMm'>,
): Promise<Recheck> {
  const parts = await readAssemblyParts(trx, id)
  const checks = await readAssemblyChecks(trx, id)
  const measured = (await readMeasurements(trx, [id])).get(id)?.find(({ isCurrent }) => isCurrent)
  const { reach, measuringToleranceMm } = await readShopSettings(trx)
  return assemblyFindings(
    { stickOutMm, tools: toolsOf(parts), checks, measuredGaugeLengthMm: measured?.gaugeLengthMm ?? null },
    {
      tools: toolsOf(await readPartSizes(trx, parts)),
      parts,
      settings: reach,
      toleranceMm: measuringToleranceMm,
    },
  )
}

/** Answers the findings that were not there before. */
async function keepFindings(
  trx: Database,
  assemblyId: string,
  findings: readonly Finding[],
  movementId: string | null,
): Promise<Finding[]> {
  const open = await listOpenFindings(trx, assemblyId)
  const keys = new Set(findings.map(({ key }) => key))
  const byKey = new Map(open.map((finding) => [finding.key, finding]))
  await resolveFindings(
    trx,
    open.filter(({ key }) => !keys.has(key)).map(({ id }) => id),
  )
  const fresh: Finding[] = []
  for (const finding of findings) {
    const known = byKey.get(finding.key)
    if (known) await updateFinding(trx, known.id, finding)
    else {
      await createFinding(trx, assemblyId, finding, movementId)
      fresh.push(finding)
    }
  }
  return fresh
}
