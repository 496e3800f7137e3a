import { randomUUID } from 'node:crypto'
import { mkdir, readdir, rm, stat } from 'node:fs/promises'
import { join } from 'node:path'
import { db } from '../../db/connection'
import { listImportFiles } from '../../db/stores/import-store'
import { env } from '../../env'

function importFolder(): string {
  return join(env().DATA_DIR, 'imports')
}

/** Where an uploaded file goes; the name is ours, whatever the file was called. */
export async function newImportFilePath(): Promise<string> {
  await mkdir(importFolder(), { recursive: true, mode: 0o700 })
  return join(importFolder(), `${randomUUID()}.csv`)
}

export async function removeImportFile(path: string | null): Promise<void> {
  if (path !== null) await rm(path, { force: true })
}

/** An upload under way has no import yet; after this long it is none any more. */
const abandonedMs = 3600_000

/** Removes files that no import waits with: uploads that broke off with the server, ends that a crash kept from tidying. */
export async function removeAbandonedFiles(): Promise<void> {
  const known = new Set(await listImportFiles(db()))
  const names = await readdir(importFolder()).catch(() => [])
  for (const name of names) {
    const path = join(importFolder(), name)
    if (known.has(path)) continue
    const { mtimeMs } = await stat(path).catch(() => ({ mtimeMs: Date.now() }))
    if (Date.now() - mtimeMs > abandonedMs) await removeImportFile(path)
  }
}
