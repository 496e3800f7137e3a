import type { MailFault } from '../../emails/mail-sender'

const seconds = { refused: { first: 300, most: 6 * 3600 }, other: { first: 15, most: 3600 } } as const

/**
 * How long a mail waits after a try that failed: twice as long each time, up to an hour; a server that says no is asked
 * less often. It is never given up, so that nothing is lost where the address or the server is mended.
 */
export function retryDelaySeconds(fault: MailFault, failedTries: number): number {
  const { first, most } = fault === 'refused' ? seconds.refused : seconds.other
  return Math.min(most, first * 2 ** Math.min(failedTries - 1, 20))
}
