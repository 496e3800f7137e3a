import { dropTemplates } from './database'

/** For vitest's globalSetup: what a run made on the server is gone after it. */
export async function teardown(): Promise<void> {
  await dropTemplates()
}
