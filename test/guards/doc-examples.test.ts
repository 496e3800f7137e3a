import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'
import { describe, expect, it } from 'vitest'
import * as samples from '../support/reach-requests'

/*
 * Every `@example` in src/core is run, so a comment can't promise what the code no longer does. An example is one
 * expression, over one line or several, ended by `// => value`; `// => throws code` expects a refusal with that code.
 * Names come from the file itself first, then from the rest of the core, then from the samples of
 * test/support/reach-requests.ts (`squareCutter`, `handHolder`, `reachRequest`).
 */

const coreFolder = join(process.cwd(), 'src/core')

interface Example {
  file: string
  expression: string
  expected: string
}

type Scope = Record<string, unknown>

function coreFiles(): string[] {
  return readdirSync(coreFolder, { recursive: true, encoding: 'utf8' })
    .filter((file) => file.endsWith('.ts') && !file.endsWith('.test.ts') && !file.endsWith('.d.ts'))
    .sort()
}

function examplesIn(file: string): Example[] {
  const source = readFileSync(join(coreFolder, file), 'utf8')
  return [...source.matchAll(/\/\*\*[\s\S]*?\*\//g)].flatMap(([comment]) => examplesOf(file, comment))
}

function examplesOf(file: string, comment: string): Example[] {
  const [, ...blocks] = comment.replace(/\*\/$/, '').split('@example')
  return blocks.flatMap((block) => {
    const lines = block.split('\n').map((line) => line.replace(/^\s*\*\s?/, ''))
    const examples: Example[] = []
    let expression = ''
    for (const line of lines) {
      if (/^@\w/.test(line)) break
      const [code = '', expected] = line.split('// =>')
      expression += `${code}\n`
      if (expected === undefined) continue
      examples.push({ file, expression: expression.trim(), expected: expected.trim() })
      expression = ''
    }
    return examples
  })
}

function evaluate(expression: string, scope: Scope): unknown {
  const names = Object.keys(scope)
  const body = `'use strict'; return (${expression.replace(/;$/, '')})`
  return new Function(...names, body)(...names.map((name) => scope[name]))
}

function thrownCode(expression: string, scope: Scope): unknown {
  try {
    evaluate(expression, scope)
  } catch (error) {
    return error instanceof Error && 'code' in error ? error.code : error
  }
  return 'nothing'
}

const files = coreFiles()
const modules = new Map<string, Scope>()
for (const file of files) {
  const module: Scope = await import(/* @vite-ignore */ pathToFileURL(join(coreFolder, file)).href)
  modules.set(file, { ...module })
}
const everything: Scope = Object.assign({ ...samples }, ...modules.values())

describe('examples in doc comments of the core', () => {
  const examples = files.flatMap(examplesIn)

  it('are found', () => {
    expect(examples.length).toBeGreaterThan(20)
  })

  it.each(examples)('$file: $expression', ({ file, expression, expected }) => {
    const scope = { ...everything, ...modules.get(file) }
    const refusal = /^throws (\S+)$/.exec(expected)
    if (refusal) expect(thrownCode(expression, scope)).toBe(refusal[1])
    else expect(evaluate(expression, scope)).toEqual(evaluate(expected, scope))
  })
})
