import { createHash } from 'node:crypto'
import type { Knex } from 'knex'
import { z } from 'zod'
import { AppError } from '@/lib/app-error'
import type { PageQuery } from '@/schemas/paging'

/** One expression a list is sorted by; null values come last either way. */
export interface SortKey {
  sql: string
  isNumber: boolean
  isDescending: boolean
}

export interface KeyPage {
  ids: string[]
  nextCursor: string | null
  /** On the first block alone. */
  total?: number
}

const cursorSchema = z.object({
  sort: z.string(),
  keys: z.array(z.union([z.string(), z.number(), z.null()])),
  id: z.string().regex(/^\d{1,18}$/),
})
type Cursor = z.output<typeof cursorSchema>

/**
 * The ids of one block of a list. Only keys are read here, so that a block deep in a long list does not join and carry
 * all the rows before it; the caller then reads the rows of these ids.
 *
 * A cursor holds the sort keys of the last row and asks for what comes after them: sorted by `maker, id`, after
 * ("acme", 7) come the rows with maker > "acme" or none, then those of "acme" with id > 7.
 */
export async function readKeyPage(
  db: Knex,
  matching: Knex.QueryBuilder,
  id: { sql: string; isDescending?: boolean },
  sort: readonly SortKey[],
  page: Pick<PageQuery, 'limit' | 'offset' | 'cursor'>,
): Promise<KeyPage> {
  const idKey: SortKey = { sql: id.sql, isNumber: true, isDescending: id.isDescending ?? false }
  const signature = sortSignature(sort)
  const keys = sortedKeys(db, matching, idKey, sort).limit(page.limit + 1)
  if (page.cursor) {
    const cursor = decodeCursor(page.cursor, signature, sort)
    whereAfter(keys, [...sort, idKey], [...cursor.keys, cursor.id])
  } else if (page.offset) {
    keys.offset(page.offset)
  }
  const rows: Record<string, string | number | null>[] = await keys
  const shown = rows.slice(0, page.limit)
  const last = rows.length > page.limit ? shown.at(-1) : undefined
  const isFirst = !page.cursor && !page.offset
  return {
    ids: shown.map((row) => String(row.id)),
    nextCursor: last
      ? encodeCursor({
          sort: signature,
          keys: sort.map((_, index) => last[`key_${index}`] ?? null),
          id: String(last.id),
        })
      : null,
    ...(isFirst ? { total: await countRows(db, matching) } : {}),
  }
}

/** The ids of a whole list as one moment has it, for what goes through all of it. */
export async function readAllKeys(
  db: Knex,
  matching: Knex.QueryBuilder,
  id: { sql: string },
  sort: readonly SortKey[],
): Promise<string[]> {
  const idKey: SortKey = { sql: id.sql, isNumber: true, isDescending: false }
  const rows: { id: string }[] = await sortedKeys(db, matching, idKey, sort)
  return rows.map((row) => row.id)
}

function sortedKeys(
  db: Knex,
  matching: Knex.QueryBuilder,
  id: SortKey,
  sort: readonly SortKey[],
): Knex.QueryBuilder {
  const keys = matching.clone().select(db.raw(`${id.sql}::text as id`))
  for (const [index, key] of sort.entries()) keys.select(db.raw(`${key.sql} as key_${index}`))
  for (const key of sort) keys.orderByRaw(`${key.sql} ${key.isDescending ? 'desc' : 'asc'} nulls last`)
  return keys.orderByRaw(`${id.sql} ${id.isDescending ? 'desc' : 'asc'}`)
}

/** Enough to tell one sorting from another without telling what it is. */
function sortSignature(sort: readonly SortKey[]): string {
  return createHash('sha256').update(JSON.stringify(sort)).digest('base64url').slice(0, 12)
}

async function countRows(db: Knex, matching: Knex.QueryBuilder): Promise<number> {
  const row = await matching.clone().first(db.raw('count(*)::int as total'))
  return row.total
}

function whereAfter(
  query: Knex.QueryBuilder,
  keys: readonly SortKey[],
  values: readonly (string | number | null)[],
): void {
  query.where((any) => {
    for (const [index, key] of keys.entries()) {
      any.orWhere((all) => {
        for (const [before, value] of values.slice(0, index).entries()) whereEqual(all, keys[before], value)
        whereBeyond(all, key, values[index] ?? null)
      })
    }
  })
}

function whereEqual(query: Knex.QueryBuilder, key: SortKey | undefined, value: string | number | null): void {
  if (!key) return
  if (value === null) query.whereRaw(`${key.sql} is null`)
  else query.whereRaw(`${key.sql} = ${placeholder(key)}`, [value])
}

/** Null comes last, so nothing lies beyond it. */
function whereBeyond(query: Knex.QueryBuilder, key: SortKey, value: string | number | null): void {
  if (value === null) query.whereRaw('false')
  else {
    const comparison = key.isDescending ? '<' : '>'
    query.whereRaw(`(${key.sql} ${comparison} ${placeholder(key)} or ${key.sql} is null)`, [value])
  }
}

/** A whole number meets a fractional one here, so neither side may be taken for the other's type. */
function placeholder(key: SortKey): string {
  return key.isNumber ? '?::double precision' : '?::text'
}

function encodeCursor(cursor: Cursor): string {
  return Buffer.from(JSON.stringify(cursor)).toString('base64url')
}

function decodeCursor(text: string, signature: string, sort: readonly SortKey[]): Cursor {
  const parsed = cursorSchema.safeParse(jsonOf(Buffer.from(text, 'base64url').toString()))
  const isOurs =
    parsed.success &&
    parsed.data.sort === signature &&
    parsed.data.keys.length === sort.length &&
    parsed.data.keys.every((value, index) => value === null || isOfType(value, sort[index]))
  if (isOurs) return parsed.data
  throw new AppError('wrong-shape', 'This cursor belongs to another list or another sorting.', {
    errors: [{ path: 'cursor', message: 'Use the nextCursor of an answer with the same sorting.' }],
  })
}

function isOfType(value: string | number, key: SortKey | undefined): boolean {
  return key?.isNumber ? Number.isFinite(Number(value)) && value !== '' : typeof value === 'string'
}

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    return null
  }
}
