import { knexConfig } from '@/server/db/knex-config'

const databaseUrl = process.env.DATABASE_URL
if (!databaseUrl) throw new Error('Settings: DATABASE_URL is not set.')

/** For the Knex command line (`npm run knex`); it shares everything with the application but the pool. */
export default knexConfig(databaseUrl)
