import { env } from '../../env'

/** Whether mail leaves this machine; without a mail server it is only kept to be read. */
export function hasMailServer(): boolean {
  return env().SMTP_URL !== undefined
}
