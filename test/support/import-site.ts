import { existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Knex } from 'knex'
import type { ImportResponse, RejectChoice } from '@/schemas/import'
import type { ImportKind } from '@/schemas/import-fields'
import type { DecimalSign } from '@/schemas/import-mapping'
import type { Actor } from '@/server/auth/actor'
import { createTestDatabase } from './database'

export interface Upload {
  kind: ImportKind
  content: string | Uint8Array
  unit?: 'mm' | 'in'
  decimals?: DecimalSign
  mapping?: Record<string, unknown>
  defaults?: Record<string, string>
  fileName?: string
}

/** A database and a data folder of a test file's own, with what the web server and the worker do called by name. */
export interface ImportSite {
  db: Knex
  url: string
  dataFolder: string
  actor: Actor
  upload(upload: Upload): Promise<string>
  check(id: string): Promise<void>
  apply(id: string): Promise<void>
  commit(id: string, rejects?: RejectChoice): Promise<void>
  recheck(
    id: string,
    change: {
      unit?: 'mm' | 'in'
      decimals?: DecimalSign
      mapping?: Record<string, string | null>
      defaults?: Record<string, string>
    },
  ): Promise<void>
  cancel(id: string): Promise<void>
  get(id: string): Promise<ImportResponse>
  rejects(id: string): Promise<string>
  /** Uploads and checks. */
  checked(upload: Upload): Promise<ImportResponse>
  /** Uploads, checks and commits. */
  committed(upload: Upload, rejects?: RejectChoice): Promise<ImportResponse>
  storedFiles(): string[]
  close(): Promise<void>
}

export async function createImportSite(): Promise<ImportSite> {
  const database = await createTestDatabase()
  const dataFolder = mkdtempSync(join(tmpdir(), 'leadline-import-'))
  Object.assign(process.env, {
    DATABASE_URL: database.url,
    DATA_DIR: dataFolder,
    SESSION_SECRET: 'a secret for tests that is long enough',
    LOG_LEVEL: 'silent',
  })
  const { createImport } = await import('@/server/services/imports/create-import')
  const { checkImport } = await import('@/server/services/imports/check-import')
  const { applyImport } = await import('@/server/services/imports/apply-import')
  const { commitImport } = await import('@/server/services/imports/commit-import')
  const { recheckImport } = await import('@/server/services/imports/recheck-import')
  const { cancelImport } = await import('@/server/services/imports/cancel-import')
  const { getImport } = await import('@/server/services/imports/get-import')
  const { downloadRejects } = await import('@/server/services/imports/download-rejects')
  const { closeDb } = await import('@/server/db/connection')
  const { importMappingSchema } = await import('@/schemas/import-mapping')
  const actor = await createKeeper(database.db)

  const site: ImportSite = {
    db: database.db,
    url: database.url,
    dataFolder,
    actor,
    upload: async (upload) => (await createImport(actor, uploadRequest(upload))).id,
    check: checkImport,
    apply: applyImport,
    commit: async (id, rejects = 'stop') => {
      await commitImport(id, rejects)
    },
    recheck: async (id, { mapping, ...change }) => {
      await recheckImport(id, {
        ...change,
        mapping: mapping ? importMappingSchema.parse(mapping) : undefined,
      })
    },
    cancel: cancelImport,
    get: getImport,
    rejects: async (id) => new Response((await downloadRejects(id)).body).text(),
    checked: async (upload) => {
      const id = await site.upload(upload)
      await checkImport(id)
      return getImport(id)
    },
    committed: async (upload, rejects) => {
      const { id } = await site.checked(upload)
      await site.commit(id, rejects)
      await applyImport(id)
      return getImport(id)
    },
    storedFiles: () => {
      const folder = join(dataFolder, 'imports')
      return existsSync(folder) ? readdirSync(folder).sort() : []
    },
    close: async () => {
      await closeDb()
      await database.drop()
      rmSync(dataFolder, { recursive: true, force: true })
    },
  }
  return site
}

export function uploadRequest({
  kind,
  content,
  unit,
  decimals,
  mapping,
  defaults,
  fileName,
}: Upload): Request {
  const form = new FormData()
  form.set('file', new File([content as BlobPart], fileName ?? `${kind}.csv`))
  form.set('kind', kind)
  if (unit) form.set('unit', unit)
  if (decimals) form.set('decimals', decimals)
  if (defaults) form.set('defaults', JSON.stringify(defaults))
  if (mapping) form.set('mapping', JSON.stringify(mapping))
  return new Request('http://127.0.0.1/api/imports', { method: 'POST', body: form })
}

async function createKeeper(db: Knex): Promise<Actor> {
  const [user] = await db('users')
    .insert({ email: 'keeper@leadline.example', name: 'Crib keeper', role: 'crib_manager' })
    .returning('id')
  const location = await db('locations').where('user_id', user.id).first('id')
  return {
    id: user.id,
    name: 'Crib keeper',
    email: 'keeper@leadline.example',
    role: 'cribManager',
    locationId: location.id,
    lengthUnit: null,
    homeCribId: null,
  }
}
