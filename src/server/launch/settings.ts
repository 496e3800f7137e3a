import { type Env, parseEnv } from '../env'
import { StepFailure } from './step-failure'

export interface LaunchSettings {
  /** Where the scripts of db/ keep everything; they set it before this program starts. */
  dataFolder: string
  /** The user's own server; without one the project runs its own. */
  ownDatabaseUrl: string | undefined
  wantsDemo: boolean
}

type Source = Record<string, string | undefined>

/** What `make start` itself goes by. The rest of the settings is the web server's and the worker's: see env.ts. */
export function readLaunchSettings(source: Source): LaunchSettings {
  const { DATA_DIR: dataFolder, DATABASE_URL: ownDatabaseUrl, DEMO: demo } = source
  if (!dataFolder) throw new StepFailure('Settings', 'DATA_DIR is not set: start through make')
  if (demo !== undefined && !['', 'yes', 'no'].includes(demo)) {
    throw new StepFailure('Settings', `DEMO is wrong (it is "yes" or "no", not "${demo}")`)
  }
  return {
    dataFolder,
    ownDatabaseUrl: ownDatabaseUrl || undefined,
    wantsDemo: demo !== 'no' && !ownDatabaseUrl,
  }
}

/** The settings that the started programs will read, checked here first, so that a wrong one is named at once. */
export function checkSettings(source: Source): Env {
  try {
    return parseEnv(source)
  } catch (error) {
    const told = error instanceof Error ? error.message : String(error)
    throw new StepFailure('Settings', told.replace(/^Settings: /, '').replace(/\.$/, ''))
  }
}
