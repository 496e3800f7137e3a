import type { ServerProcess } from './server-process'

/** What a run has started and stops when it ends: its servers, all at once, then the database under them. */
export class Started {
  readonly #servers: ServerProcess[] = []
  #stopDatabase: () => Promise<void> = async () => undefined

  add(server: ServerProcess): ServerProcess {
    this.#servers.push(server)
    return server
  }

  addDatabase(stop: () => Promise<void>): void {
    this.#stopDatabase = stop
  }

  async stopAll(): Promise<void> {
    await Promise.all(this.#servers.map((server) => server.stop()))
    await this.#stopDatabase()
  }
}
