import { afterAll, beforeAll, expect, it } from 'vitest'
import { createTestDatabase, type TestDatabase } from '../support/database'

let database: TestDatabase

beforeAll(async () => {
  database = await createTestDatabase()
  Object.assign(process.env, {
    DATABASE_URL: database.url,
    DATA_DIR: '/nowhere',
    SESSION_SECRET: 'a secret for tests that is long enough',
    LOG_LEVEL: 'silent',
  })
})
afterAll(() => database.drop())

it('web servers and workers that come up at once over a new database all get their queue', async () => {
  const { startBoss } = await import('@/server/jobs/queue')
  const { closeDb } = await import('@/server/db/connection')
  for (let round = 0; round < 5; round += 1) {
    await database.db.raw('drop schema if exists pgboss cascade')
    const bosses = await Promise.all(Array.from({ length: 4 }, () => startBoss({ supervise: false })))
    const queues = await bosses[0]?.getQueues()
    expect(queues?.map(({ name }) => name).sort()).toEqual(['check-import', 'commit-import'])
    await Promise.all(bosses.map((boss) => boss.stop({ graceful: false })))
  }
  await closeDb()
})
