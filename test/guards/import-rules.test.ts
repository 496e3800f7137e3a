import { createRequire } from 'node:module'
import { fileURLToPath } from 'node:url'
import { cruise, type ICruiseResult, type IFlattenedRuleSet } from 'dependency-cruiser'
import { describe, expect, it } from 'vitest'

const rules: { forbidden: IFlattenedRuleSet['forbidden'] } = createRequire(import.meta.url)(
  '../../.dependency-cruiser.cjs',
)

/** A tree with one offence against each border, so that a rule that stopped biting is noticed. */
async function cruiseOf(baseDir: string): Promise<ICruiseResult> {
  const { output } = await cruise(['src'], {
    baseDir,
    validate: true,
    ruleSet: { forbidden: rules.forbidden ?? [] },
    doNotFollow: { path: 'node_modules' },
  })
  if (typeof output === 'string') throw new Error(output)
  return output
}

describe('the import rules', () => {
  it('see the TypeScript of the project', async () => {
    const { summary } = await cruiseOf(fileURLToPath(new URL('../..', import.meta.url)))
    expect(summary.totalCruised).toBeGreaterThan(200)
  })

  it.each([
    ['core', 'src/core/imports-schema.ts'],
    ['core-imports-no-package', 'src/core/imports-package.ts'],
    ['server-stays-on-the-server', 'src/components/imports-server.ts'],
    ['knex-lives-in-the-database-folder', 'src/server/services/imports-knex.ts'],
    ['no-circles', 'src/server/db/one-way.ts'],
    ['every-server-folder-is-known', 'src/server/db/imports-unknown-folder.ts'],
  ])('refuse by "%s"', async (rule, from) => {
    const { summary } = await cruiseOf(fileURLToPath(new URL('import-fixture', import.meta.url)))
    expect(summary.violations.map((violation) => `${violation.rule.name} ${violation.from}`)).toContain(
      `${rule} ${from}`,
    )
  })
})
