import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { runStep } from './run-step'
import { sourceHash } from './source-hash'

export interface Build {
  projectFolder: string
  /** Its NEXT_DIST_DIR names another folder to build into than .next. */
  environment: NodeJS.ProcessEnv
  logPath: string
  signal: AbortSignal
  announce: () => void
}

/** Builds the web server, unless the build on disk was made from exactly these sources. */
export async function buildIfChanged(build: Build): Promise<void> {
  const stamp = join(build.projectFolder, build.environment.NEXT_DIST_DIR ?? '.next', 'built-from')
  const hash = sourceHash(build.projectFolder)
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) return
  build.announce()
  rmSync(stamp, { force: true })
  await runStep({
    name: 'Build',
    argv: ['npm', 'run', '--silent', 'build', '--', build.projectFolder],
    environment: build.environment,
    logPath: build.logPath,
    signal: build.signal,
  })
  writeFileSync(stamp, hash)
}
