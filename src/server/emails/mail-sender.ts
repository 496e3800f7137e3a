import { createTransport } from 'nodemailer'
import type { MailContent } from './mail-content'

export interface MailToSend extends MailContent {
  to: string
  /** The same at every try. */
  messageId: string
  date: Date
}

export interface MailTimeouts {
  connectionMs: number
  greetingMs: number
  /** Without a word from the server. */
  silenceMs: number
}

export interface MailSender {
  /** Resolves once the server has taken the mail upon itself; else throws `MailNotSent`. */
  send(mail: MailToSend): Promise<void>
}

/** `refused`: the server said no for good; `later`: it said not now; `unreachable`: it did not say. */
export type MailFault = 'refused' | 'later' | 'unreachable'

export class MailNotSent extends Error {
  override readonly name = 'MailNotSent'

  constructor(
    readonly fault: MailFault,
    reason: string,
  ) {
    super(reason)
  }
}

const patience: MailTimeouts = { connectionMs: 10_000, greetingMs: 10_000, silenceMs: 30_000 }

/** The one sender: a connection a mail, to the server of this address. */
export function createMailSender(smtpUrl: string, from: string, timeouts = patience): MailSender {
  return {
    async send(mail) {
      const transport = createTransport({
        ...addressOf(smtpUrl),
        connectionTimeout: timeouts.connectionMs,
        greetingTimeout: timeouts.greetingMs,
        socketTimeout: timeouts.silenceMs,
        disableFileAccess: true,
        disableUrlAccess: true,
      })
      try {
        await transport.sendMail({
          from,
          to: { name: '', address: mail.to },
          subject: mail.subject,
          text: mail.text,
          html: mail.html,
          messageId: mail.messageId,
          date: mail.date,
          headers: { 'Auto-Submitted': 'auto-generated' },
        })
      } catch (error) {
        throw notSent(error)
      } finally {
        transport.close()
      }
    },
  }
}

function addressOf(smtpUrl: string) {
  const url = new URL(smtpUrl)
  const isSecure = url.protocol === 'smtps:'
  return {
    host: url.hostname.replace(/^\[|\]$/g, ''),
    port: Number(url.port) || (isSecure ? 465 : 587),
    secure: isSecure,
    ...(url.username
      ? { auth: { user: decodeURIComponent(url.username), pass: decodeURIComponent(url.password) } }
      : {}),
  }
}

function notSent(error: unknown): MailNotSent {
  const reason = error instanceof Error ? error.message : String(error)
  const code = error instanceof Error && 'responseCode' in error ? Number(error.responseCode) : 0
  const fault = code >= 500 ? 'refused' : code >= 400 && code !== 421 ? 'later' : 'unreachable'
  return new MailNotSent(fault, reason)
}
