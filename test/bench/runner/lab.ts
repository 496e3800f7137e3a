import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { type Browser, chromium as playwright } from '@playwright/test'
import pg from 'pg'
import { runScript, startWebServer, startWorker } from '@/server/launch/application'
import { buildIfChanged } from '@/server/launch/build'
import { findFreePort } from '@/server/launch/ports'
import type { Started } from '@/server/launch/started'
import { waitForHealth } from '@/server/launch/wait-for-health'
import { startTestDatabase } from '../../runner/test-site'
import type { TestRun } from '../../runner/test-step'
import { chromium } from '../../support/chromium'
import { layBuildTree } from './build-tree'

const templateName = 'bench_template'
/** Where the bare routes of a site find what they run, in its folder. */
export const statementsFile = 'statements.json'

/** A web server with its worker, over a database of its own. */
export interface BenchSite {
  address: string
  databaseUrl: string
  workerPid: number
  /** Its data and logs, and the statements its bare routes run. */
  folder: string
  /** Ends both, so that they cost the next measurement nothing; the lab does so at the end by itself. */
  stop(): Promise<void>
}

/**
 * What benches measure with. Everything is made when it is first asked for, so that a bench that needs no server costs
 * none, and all of it is ended by `close`.
 */
export class Lab {
  readonly #run: TestRun
  readonly #started: Started
  readonly #made = new Map<string, Promise<unknown>>()
  #count = 0
  #fail: (error: unknown) => void = () => undefined
  /** Rejects when a site that was started ends before it was stopped; never resolves. */
  readonly failed = new Promise<never>((_, reject) => {
    this.#fail = reject
  })

  constructor(run: TestRun, started: Started) {
    this.#run = run
    this.#started = started
    this.failed.catch(() => undefined)
  }

  /** Aborts when somebody stops the run. */
  get signal(): AbortSignal {
    return this.#run.signal
  }

  /** A folder for what a bench writes; gone before the next run. */
  get folder(): string {
    return this.#run.logFolder
  }

  say(line: string): void {
    process.stdout.write(`  ${line}\n`)
  }

  /** Makes a thing once for all benches of this run. */
  once<Made>(name: string, make: () => Promise<Made>): Promise<Made> {
    const made = this.#made.get(name) ?? make()
    this.#made.set(name, made)
    return made as Promise<Made>
  }

  /** The address of a fresh database, migrated and with the demo shop in it. */
  async createDatabase(): Promise<string> {
    const { environment } = await this.#template()
    this.#count += 1
    const name = `bench_${this.#count}`
    await this.#onServer(`create database ${name} template ${templateName}`)
    return databaseUrl(environment, name)
  }

  /** A site as `make start` serves it, with the bare pages and routes of test/bench/site beside the product's. */
  async startSite(url: string): Promise<BenchSite> {
    const builtFolder = await this.#build()
    const { environment } = await this.#database()
    const port = await findFreePort()
    const address = `http://127.0.0.1:${port}`
    const folder = join(this.folder, new URL(url).pathname.slice(1))
    mkdirSync(folder, { recursive: true, mode: 0o700 })
    const site: TestRun = {
      signal: this.signal,
      logFolder: folder,
      environment: {
        ...environment,
        NODE_ENV: 'production',
        DATABASE_URL: url,
        DATA_DIR: folder,
        PORT: String(port),
        BASE_URL: address,
        LOG_LEVEL: 'warn',
        BENCH_STATEMENTS: join(folder, statementsFile),
      },
    }
    const web = this.#started.add(startWebServer(site, '127.0.0.1', port, builtFolder))
    const worker = this.#started.add(startWorker(site))
    await Promise.race([waitForHealth(address, web, join(folder, 'web.log'), this.signal), worker.failed])
    let isStopping = false
    // A site that ends by itself ends the bench that measures it, with the reason.
    for (const server of [web, worker])
      server.failed.catch((error: unknown) => {
        if (!isStopping) this.#fail(error)
      })
    const stop = async () => {
      isStopping = true
      await Promise.all([web.stop(), worker.stop()])
    }
    return { address, databaseUrl: url, workerPid: worker.pid ?? 0, folder, stop }
  }

  /** The demo shop, one for all benches. */
  demoSite(): Promise<BenchSite> {
    return this.once('demo site', async () => this.startSite(await this.createDatabase()))
  }

  browser(): Promise<Browser> {
    return this.once('browser', () => playwright.launch(chromium))
  }

  async close(): Promise<void> {
    this.#fail = () => undefined
    const browser = this.#made.get('browser') as Promise<Browser> | undefined
    await browser?.then((opened) => opened.close()).catch(() => undefined)
    await this.#started.stopAll()
  }

  #database(): Promise<TestRun> {
    return this.once('database', () => startTestDatabase(this.#run, this.#started))
  }

  #template(): Promise<TestRun> {
    return this.once('template', async () => {
      const run = await this.#database()
      await this.#onServer(`create database ${templateName}`)
      const url = databaseUrl(run.environment, templateName)
      const template = { ...run, environment: { ...run.environment, DATABASE_URL: url } }
      this.say('Making the demo shop')
      await runScript(template, 'Migration', 'migrate')
      await runScript(template, 'Demo shop', 'seed:demo')
      return run
    })
  }

  #build(): Promise<string> {
    return this.once('build', async () => {
      const { environment } = await this.#database()
      const projectFolder = layBuildTree(process.cwd())
      await buildIfChanged({
        projectFolder,
        environment: { ...environment, NODE_ENV: 'production' },
        logPath: join(this.folder, 'build.log'),
        signal: this.signal,
        announce: () => this.say('Building'),
      })
      return projectFolder
    })
  }

  async #onServer(statement: string): Promise<void> {
    const { environment } = await this.#database()
    const server = new pg.Client({ connectionString: environment.DATABASE_URL })
    await server.connect()
    try {
      await server.query(statement)
    } finally {
      await server.end()
    }
  }
}

function databaseUrl(environment: NodeJS.ProcessEnv, name: string): string {
  const url = new URL(environment.DATABASE_URL ?? '')
  url.pathname = `/${name}`
  return url.href
}
