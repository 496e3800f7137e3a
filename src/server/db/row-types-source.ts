import type { Knex } from 'knex'

interface ColumnRow {
  table_name: string
  column_name: string
  udt_name: string
  is_nullable: 'YES' | 'NO'
}

/** As node-postgres hands them over: bigint as text, since ids are opaque and amounts are turned in a row's mapper. */
const typescriptTypes: Record<string, string> = {
  bool: 'boolean',
  bytea: 'Buffer',
  float8: 'number',
  int4: 'number',
  int8: 'string',
  jsonb: 'unknown',
  text: 'string',
  timestamptz: 'Date',
  _text: 'string[]',
}

/** The source of row-types.ts: one interface a table, as the database describes itself. */
export async function rowTypesSource(db: Knex): Promise<string> {
  const columns = await db<ColumnRow>('information_schema.columns')
    .where('table_schema', 'public')
    .whereNot('table_name', 'like', 'knex\\_%')
    .orderByRaw('table_name collate "C", ordinal_position')
    .select('table_name', 'column_name', 'udt_name', 'is_nullable')
  const tables = byTable(columns)
  const interfaces = [...tables].map(([table, own]) => rowInterface(table, own))
  const names = [...tables.keys()].map((table) => `  ${table}: ${interfaceName(table)}\n`)
  return [
    '// Written by `npm run db:types` from the migrated database; a test compares the two.\n',
    ...interfaces,
    `export interface Tables {\n${names.join('')}}\n`,
  ].join('\n')
}

function rowInterface(table: string, columns: ColumnRow[]): string {
  const lines = columns.map((column) => `  ${column.column_name}: ${columnType(column)}\n`)
  return `export interface ${interfaceName(table)} {\n${lines.join('')}}\n`
}

function columnType(column: ColumnRow): string {
  const type = typescriptTypes[column.udt_name]
  if (!type) throw new Error(`${column.table_name}.${column.column_name}: no type for ${column.udt_name}`)
  return column.is_nullable === 'YES' && type !== 'unknown' ? `${type} | null` : type
}

/** `import_rows` becomes `ImportRowsRow`. */
function interfaceName(table: string): string {
  return `${table.replace(/(?:^|_)([a-z])/g, (_, letter: string) => letter.toUpperCase())}Row`
}

function byTable(columns: ColumnRow[]): Map<string, ColumnRow[]> {
  const tables = new Map<string, ColumnRow[]>()
  for (const column of columns)
    tables.set(column.table_name, [...(tables.get(column.table_name) ?? []), column])
  return tables
}
