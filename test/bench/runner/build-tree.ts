import { createHash } from 'node:crypto'
import { copyFileSync, cpSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

/** In the checkout, so that Next finds its packages one folder up, and ignored by git and by every tool. */
const treeName = '.next-bench'
const copiedFiles = [
  'package.json',
  'package-lock.json',
  'postcss.config.js',
  'tsconfig.json',
  'tsconfig.build.json',
]

/**
 * The product's sources with what the benches hold them against laid over them (`test/bench/site`), to be built as one
 * site: the bare pages and routes run in the same server as the real ones, and nothing of them is in the product.
 */
export function layBuildTree(projectFolder: string): string {
  const tree = join(projectFolder, treeName)
  for (const folder of ['src', 'public']) rmSync(join(tree, folder), { recursive: true, force: true })
  mkdirSync(tree, { recursive: true })
  cpSync(join(projectFolder, 'src'), join(tree, 'src'), {
    recursive: true,
    filter: (path) => !/\.test\.tsx?$/.test(path),
  })
  cpSync(join(projectFolder, 'test/bench/site'), join(tree, 'src/app'), { recursive: true })
  cpSync(join(projectFolder, 'public'), join(tree, 'public'), { recursive: true })
  for (const name of copiedFiles) copyFileSync(join(projectFolder, name), join(tree, name))
  const config = readFileSync(join(projectFolder, 'next.config.js'))
  // With its hash, so that a changed configuration is built anew.
  const hash = createHash('sha256').update(config).digest('hex')
  writeFileSync(
    join(tree, 'next.config.js'),
    `// ${hash}\nimport config from '../next.config.js'\n\nexport default config\n`,
  )
  return tree
}
