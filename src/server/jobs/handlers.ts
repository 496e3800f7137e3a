import type PgBoss from 'pg-boss'
import { applyImport } from '../services/imports/apply-import'
import { checkImport } from '../services/imports/check-import'
import { checkImportJob, commitImportJob } from './definitions'

/** A worker looks for work this often; what a person waits for starts within it. */
const pollingIntervalSeconds = 0.5

/** Gives each queue its handler. A handler may be called twice for one job and then finds its work done. */
export async function handleJobs(boss: PgBoss): Promise<void> {
  await boss.work(checkImportJob.name, { pollingIntervalSeconds }, async (jobs) => {
    for (const job of jobs) await checkImport(checkImportJob.payload.parse(job.data).importId)
  })
  await boss.work(commitImportJob.name, { pollingIntervalSeconds }, async (jobs) => {
    for (const job of jobs) await applyImport(commitImportJob.payload.parse(job.data).importId)
  })
}
