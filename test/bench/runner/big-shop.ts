import { writeFileSync } from 'node:fs'
import { join } from 'node:path'
import pg from 'pg'
import { cutterCsv, stockCsv } from './big-catalogue'
import { importFile } from './import-file'
import { type BenchSite, type Lab, statementsFile } from './lab'
import { type ListView, listStatements, type Statement } from './list-statements'
import { sessionCookie } from './session'

const cutterCount = 100_000

export interface BigShop {
  site: BenchSite
  /** What the cutter list asks the database, and the site's bare route with it. */
  statements: Record<ListView, Statement[]>
}

/** The demo shop with 100,000 cutters more, every third in a bin, brought there by imports; one for all benches. */
export function bigShop(lab: Lab): Promise<BigShop> {
  return lab.once('big shop', async () => {
    const site = await lab.startSite(await lab.createDatabase())
    const cookie = await sessionCookie(site)
    lab.say('Filling a shop with 100,000 cutters')
    await importFile(site, cookie, 'cutters', cutterCsv(cutterCount))
    const database = new pg.Client({ connectionString: site.databaseUrl })
    await database.connect()
    const { rows } = await database.query<{ crib: string; bin: string }>(
      `select cribs.code as crib, locations.code as bin from locations join cribs on cribs.id = locations.crib_id
        where locations.kind = 'bin' order by locations.id`,
    )
    await importFile(site, cookie, 'stock', stockCsv(cutterCount, rows))
    // What PostgreSQL does by itself within minutes of such an import.
    await database.query('vacuum analyze')
    await database.end()
    const statements = await listStatements(site.databaseUrl)
    writeFileSync(join(site.folder, statementsFile), JSON.stringify(statements))
    return { site, statements }
  })
}
