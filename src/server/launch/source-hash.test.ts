import { mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { sourceHash } from './source-hash'

let folder = ''

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'source-hash-'))
  mkdirSync(join(folder, 'src', 'app'), { recursive: true })
  writeFileSync(join(folder, 'src', 'app', 'page.tsx'), 'one')
  writeFileSync(join(folder, 'package-lock.json'), '{}')
})

afterEach(() => rmSync(folder, { recursive: true }))

it('stays while the sources stay, whatever else lies about', () => {
  const before = sourceHash(folder)
  writeFileSync(join(folder, 'src', 'app', 'page.test.tsx'), 'a test is not built')
  writeFileSync(join(folder, 'notes.txt'), 'nor is this')
  expect(sourceHash(folder)).toBe(before)
})

it.each([
  ['a file that changes', () => writeFileSync(join(folder, 'src', 'app', 'page.tsx'), 'two')],
  ['a file that is new', () => writeFileSync(join(folder, 'src', 'new.ts'), '')],
  ['a file that is gone', () => rmSync(join(folder, 'src', 'app', 'page.tsx'))],
  [
    'a new name',
    () => renameSync(join(folder, 'src', 'app', 'page.tsx'), join(folder, 'src', 'app', 'other.tsx')),
  ],
  ['other packages', () => writeFileSync(join(folder, 'package-lock.json'), '{"a":1}')],
])('shows %s', (_, change) => {
  const before = sourceHash(folder)
  change()
  expect(sourceHash(folder)).not.toBe(before)
})
