/** Who may import whom; DEVELOPERS.md has the table in words. */
const serverParts = ['db', 'services', 'http', 'auth', 'imports', 'jobs', 'emails']

const onlyFrom = (name, from, allowed, comment) => ({
  name,
  comment,
  severity: 'error',
  from: { path: from, pathNot: '\\.test\\.tsx?$' },
  to: { path: '^(src|db|test)/', pathNot: allowed },
})

const packageOnlyIn = (name, packagePattern, homes) => ({
  name,
  severity: 'error',
  from: { path: '^src/', pathNot: [...homes, '\\.test\\.tsx?$'] },
  to: { path: `(^|/)node_modules/${packagePattern}` },
})

module.exports = {
  forbidden: [
    {
      name: 'no-circles',
      severity: 'error',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
    { name: 'no-lost-imports', severity: 'error', from: {}, to: { couldNotResolve: true } },
    onlyFrom('core', '^src/core/', ['^src/core/'], 'The core is pure: same input, same answer, anywhere.'),
    onlyFrom('schemas', '^src/schemas/', ['^src/(schemas|core)/']),
    onlyFrom('lib', '^src/lib/', ['^src/(lib|core|schemas)/']),
    onlyFrom('hooks', '^src/hooks/', ['^src/(hooks|schemas|lib|core)/']),
    onlyFrom('ui', '^src/components/ui/', ['^src/components/ui/', '^src/(core|lib)/']),
    onlyFrom('components', '^src/components/', ['^src/components/', '^src/(hooks|schemas|core|lib)/']),
    {
      name: 'pages',
      severity: 'error',
      from: { path: '^src/app/.*\\.tsx$' },
      to: { path: '^src/server/', pathNot: '^src/server/(services|auth)/' },
    },
    {
      name: 'routes',
      severity: 'error',
      from: { path: '^src/app/.*route\\.ts$' },
      to: { path: '^src/(server|components|hooks)/', pathNot: '^src/server/(services|auth|http)/' },
    },
    {
      name: 'server-stays-on-the-server',
      severity: 'error',
      from: { path: '^src/(core|schemas|lib|hooks|components)/' },
      to: { path: '^src/(server|app)/' },
    },
    onlyFrom('database', '^src/server/db/', [
      '^src/server/(db|env|log)',
      '^src/server/auth/actor',
      '^src/(core|lib|schemas)/',
    ]),
    {
      name: 'services-know-no-http',
      severity: 'error',
      from: { path: '^src/server/services/' },
      to: { path: '^src/(app|server/http)/', dependencyTypesNot: ['type-only'] },
    },
    onlyFrom(
      'migrations',
      '^db/migrations/',
      ['^db/migrations/'],
      'An old migration runs unchanged for ever.',
    ),
    packageOnlyIn('knex-lives-in-the-database-folder', '(knex|pg|pg-copy-streams)/', [
      '^src/server/db/',
      '^src/server/imports/',
      '^src/server/jobs/',
    ]),
    packageOnlyIn('mathjs-lives-in-units', 'mathjs/', ['^src/core/units/']),
    packageOnlyIn('nodemailer-lives-in-emails', 'nodemailer/', ['^src/server/emails/']),
    {
      name: 'core-imports-no-package',
      severity: 'error',
      from: { path: '^src/core/', pathNot: ['^src/core/units/', '\\.test\\.ts$'] },
      to: { dependencyTypes: ['npm', 'npm-dev', 'core'] },
    },
    {
      name: 'every-server-folder-is-known',
      comment: 'A new folder under src/server is given its rule here first.',
      severity: 'error',
      from: {},
      to: { path: '^src/server/[^/]+/', pathNot: `^src/server/(${[...serverParts, 'launch'].join('|')})/` },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: {
      path: '^(test/guards/import-fixture|\\.next|\\.next-test|node_modules/(?!knex|pg|mathjs|nodemailer))',
    },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
}
