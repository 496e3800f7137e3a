import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'

/** The only places that may read the environment, each for its reason. */
const readers = [
  'src/instrumentation.ts', // which run time Next starts, before anything is loaded
  'src/proxy.ts', // the development server alone needs evaluation
  'src/server/env.ts', // the one that parses it
  'src/server/launch.ts', // starts the others and hands them theirs
]

function sourcePaths(): string[] {
  return readdirSync('src', { recursive: true, encoding: 'utf8' })
    .map((path) => `src/${path}`)
    .filter(
      (path) => /\.tsx?$/.test(path) && !path.includes('.test.') && !path.startsWith('src/server/launch/'),
    )
}

function filesThatRead(paths: string[]): string[] {
  return paths.filter((path) => /\bprocess\s*(\.|\[\s*['"])\s*env\b/.test(readFileSync(path, 'utf8'))).sort()
}

describe('the environment', () => {
  it('is read in the files that are meant to, and in no other', () => {
    const paths = sourcePaths()
    expect(paths.length).toBeGreaterThan(100)
    expect(filesThatRead(paths)).toEqual(readers.filter((path) => paths.includes(path)))
  })
})
