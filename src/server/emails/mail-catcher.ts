import type { AddressInfo } from 'node:net'
import { SMTPServer } from 'smtp-server'

export interface CaughtMail {
  recipients: string[]
  source: Buffer
}

export interface MailCatcher {
  smtpUrl: string
  close(): Promise<void>
}

/**
 * A mail server of the project's own, on loopback, that passes nothing on: what comes is kept, and answered for only
 * once it is kept. It stands in where the shop has named no server, so that there is one way for a mail to go.
 */
export async function startMailCatcher(keep: (mail: CaughtMail) => Promise<void>): Promise<MailCatcher> {
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    logger: false,
    onData(stream, session, done) {
      const chunks: Buffer[] = []
      stream.on('data', (chunk: Buffer) => chunks.push(chunk))
      stream.on('end', () => {
        const recipients = session.envelope.rcptTo.map(({ address }) => address)
        keep({ recipients, source: Buffer.concat(chunks) }).then(
          () => done(),
          (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
        )
      })
    },
  })
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen(0, '127.0.0.1', resolve)
  })
  const { port } = server.server.address() as AddressInfo
  return {
    smtpUrl: `smtp://127.0.0.1:${port}`,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  }
}
