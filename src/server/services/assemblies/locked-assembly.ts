import { AppError } from '@/lib/app-error'
import type { Database } from '../../db/connection'
import { type AssemblyRecord, findLockedAssembly } from '../../db/stores/assembly-store'
import { noSuchAssembly, readAssembly } from './read-assembly'

/** The assembly, held until the transaction ends, where it still has the version it was read with. */
export async function getLockedAssembly(trx: Database, id: string, version: number): Promise<AssemblyRecord> {
  const assembly = await findLockedAssembly(trx, id)
  if (!assembly) throw noSuchAssembly()
  if (assembly.version !== version) {
    throw new AppError('stale-version', `Someone changed assembly ${assembly.number} meanwhile.`, {
      extra: { current: await readAssembly(trx, id) },
    })
  }
  return assembly
}

/** The same, where it is built. */
export async function getLockedBuiltAssembly(
  trx: Database,
  id: string,
  version: number,
): Promise<AssemblyRecord> {
  const assembly = await getLockedAssembly(trx, id, version)
  if (assembly.state === 'built') return assembly
  throw new AppError('wrong-state', `Assembly ${assembly.number} is not built.`)
}
