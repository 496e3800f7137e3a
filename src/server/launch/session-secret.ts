import { randomBytes } from 'node:crypto'
import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

/** The secret that seals session cookies: made once and kept with the data, so a restart signs nobody out. */
export function keptSessionSecret(dataFolder: string): string {
  const path = join(dataFolder, 'session-secret')
  if (!existsSync(path)) {
    writeFileSync(`${path}.partial`, randomBytes(32).toString('hex'), { mode: 0o600 })
    renameSync(`${path}.partial`, path)
  }
  return readFileSync(path, 'utf8').trim()
}
