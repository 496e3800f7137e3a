import { readFileSync } from 'node:fs'
import pg from 'pg'

/** The statements of one request, as Knex sent them. */
type Statements = { sql: string; bindings: unknown[] }[]

let pool: pg.Pool | undefined
let views: Record<string, Statements> | undefined

/** What the product's lists are held against: the same statements by the same server, and nothing else. */
export async function GET(request: Request): Promise<Response> {
  views ??= JSON.parse(readFileSync(process.env.BENCH_STATEMENTS ?? '', 'utf8')) as Record<string, Statements>
  pool ??= new pg.Pool({ connectionString: process.env.DATABASE_URL, max: 10 })
  const statements = views[new URL(request.url).searchParams.get('view') ?? '']
  if (!statements) return new Response(null, { status: 404 })
  const client = await pool.connect()
  try {
    const answers: unknown[] = []
    for (const { sql, bindings } of statements) answers.push((await client.query(sql, bindings)).rows)
    return Response.json(answers)
  } finally {
    client.release()
  }
}
