import { closeDb } from './db/connection'
import { handleJobs } from './jobs/handlers'
import { startBoss } from './jobs/queue'
import { log } from './log'
import { recheckDueAssemblies } from './services/assemblies/recheck-due-assemblies'
import { resumeImports, tidyImports } from './services/imports/resume-imports'
import { openMailWay } from './services/mail/open-mail-way'
import { sendDueMail } from './services/mail/send-due-mail'

const resumeEveryMs = 5_000
const tidyEveryMs = 3600_000
const mailEveryMs = 1000
const recheckEveryMs = 1000

/** Runs `work` now and again, one run at a time; a failure is logged and the next run tries again. */
function repeat(name: string, everyMs: number, work: () => Promise<void>): void {
  const run = async () => {
    try {
      await work()
    } catch (error) {
      log.error({ error: error instanceof Error ? error.stack : String(error) }, name)
    }
    setTimeout(run, everyMs)
  }
  void run()
}

const boss = await startBoss({ supervise: true })
await handleJobs(boss)
repeat('resuming imports', resumeEveryMs, resumeImports)
repeat('tidying imports', tidyEveryMs, tidyImports)
repeat('rechecking assemblies', recheckEveryMs, recheckDueAssemblies)
const mailWay = await openMailWay()
repeat('sending mail', mailEveryMs, () => sendDueMail(mailWay))
log.info('worker ready')

/** What is under way is broken off: its transaction is undone, and the next worker takes it up again. */
async function end(): Promise<void> {
  setTimeout(() => process.exit(0), 2000).unref()
  await boss.stop({ graceful: false })
  await closeDb()
  process.exit(0)
}
process.once('SIGTERM', end)
process.once('SIGINT', end)
