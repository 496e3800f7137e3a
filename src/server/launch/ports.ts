import { createServer } from 'node:net'
import { StepFailure } from './step-failure'

/** Refuses a port that another program holds before anything is built or started for it. */
export async function assertPortFree(host: string, port: number): Promise<void> {
  try {
    await listenOnce(host, port)
  } catch (error) {
    const code = error instanceof Error && 'code' in error ? error.code : error
    if (code === 'EADDRINUSE') {
      throw new StepFailure(
        'Web server',
        `port ${port} on ${host} is taken by another program (choose another with PORT)`,
      )
    }
    if (code === 'EACCES') {
      throw new StepFailure('Web server', `port ${port} on ${host} is not allowed to this account`)
    }
    throw new StepFailure('Web server', `this computer cannot listen on ${host}:${port} (${code})`)
  }
}

/** A port of the loopback interface that nobody holds now. */
export function findFreePort(): Promise<number> {
  return listenOnce('127.0.0.1', 0)
}

function listenOnce(host: string, port: number): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = createServer()
    server.once('error', reject)
    server.listen({ host, port, exclusive: true }, () => {
      const address = server.address()
      server.close(() => resolve(typeof address === 'object' && address ? address.port : port))
    })
  })
}
