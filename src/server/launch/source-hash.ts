import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs'
import { join } from 'node:path'

const sourceFolders = ['src', 'public']
const sourceFiles = [
  'next.config.js',
  'package-lock.json',
  'package.json',
  'postcss.config.js',
  'tsconfig.build.json',
  'tsconfig.json',
]

/** A fingerprint of everything that a build is made from: the same answer means the build on disk is still good. */
export function sourceHash(projectFolder: string): string {
  const hash = createHash('sha256').update(process.version)
  for (const path of [...sourceFiles, ...sourceFolders.flatMap((folder) => filesIn(projectFolder, folder))]) {
    const absolute = join(projectFolder, path)
    if (!existsSync(absolute)) continue
    const content = readFileSync(absolute)
    hash.update(`\0${path}\0${content.length}\0`).update(content)
  }
  return hash.digest('hex')
}

function filesIn(projectFolder: string, folder: string): string[] {
  if (!existsSync(join(projectFolder, folder))) return []
  return readdirSync(join(projectFolder, folder), { recursive: true, encoding: 'utf8' })
    .map((name) => join(folder, name))
    .filter((path) => !/\.test\.tsx?$/.test(path) && statSync(join(projectFolder, path)).isFile())
    .sort()
}
