import Link from 'next/link'
import { PageHeading } from '../layout/page-heading'
import { ButtonLink } from '../ui/button'
import { Notice } from '../ui/notice'
import { StateSentence } from '../ui/state-sentence'

export interface MailLine {
  id: string
  recipient: string
  cribName: string
  createdAt: string
  sentAt: string | null
  attempts: number
  nextAttemptAt: string
  lastError: string | null
  caughtId: string | null
}

/** What the shop wrote to its people, and what became of it. */
export function MailPage({
  rows,
  total,
  hasServer,
}: {
  rows: MailLine[]
  total: number
  hasServer: boolean
}) {
  return (
    <>
      <PageHeading
        title="Mail"
        note="One mail for each event and person. What cannot go now is tried again until it goes."
      >
        <ButtonLink href="/crib-members">Who gets the mail</ButtonLink>
        <ButtonLink href="/mail/preview">See the templates</ButtonLink>
      </PageHeading>
      {hasServer ? null : (
        <div className="px-4 pb-3 lg:px-6">
          <Notice kind="caution">
            No mail server is set, so mail leaves this machine for nobody: it is kept here to be read. Set
            SMTP_URL and MAIL_FROM and start again to send it.
          </Notice>
        </div>
      )}
      {rows.length === 0 ? (
        <StateSentence sentence="No mail has been written yet. The first comes when an item falls to its reorder point." />
      ) : (
        <>
          <MailTable rows={rows} />
          {total > rows.length ? (
            <p className="text-ink-soft px-4 py-3 lg:px-6">
              What waits and the newest, {rows.length} of {total.toLocaleString('en')} mails.
            </p>
          ) : null}
        </>
      )}
    </>
  )
}

function MailTable({ rows }: { rows: MailLine[] }) {
  return (
    <div className="border-ink bg-sheet border-t">
      <table className="w-full text-left text-[0.9375rem]">
        <thead className="border-ink border-b max-sm:hidden">
          <tr className="[&>th]:px-4 [&>th]:py-2 lg:[&>th]:px-6">
            <th scope="col">Mail</th>
            <th scope="col">To</th>
            <th scope="col">Written (UTC)</th>
            <th scope="col">What became of it</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr
              key={row.id}
              className="border-hairline border-b align-top max-sm:block max-sm:px-4 max-sm:py-2 max-sm:[&>td]:block sm:[&>td]:px-4 sm:[&>td]:py-1.5 lg:[&>td]:px-6"
            >
              <td>
                {row.caughtId ? (
                  <Link
                    href={`/mail/${row.caughtId}`}
                    className="text-accent inline-flex min-h-6 items-center font-semibold hover:underline pointer-coarse:min-h-11"
                  >
                    Low stock in {row.cribName}
                  </Link>
                ) : (
                  `Low stock in ${row.cribName}`
                )}
              </td>
              <td className="break-all">{row.recipient}</td>
              <td className="text-ink-soft whitespace-nowrap">{utc(row.createdAt)}</td>
              <td>{fateOf(row)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}

/** Made on the server, which does not know the reader's time zone. */
function utc(iso: string): string {
  return iso.slice(0, 16).replace('T', ' ')
}

function fateOf(row: MailLine): string {
  if (row.sentAt) return row.caughtId ? `Kept here at ${utc(row.sentAt)}` : `Sent at ${utc(row.sentAt)}`
  if (row.attempts === 0) return 'Waits for the worker'
  const tries = row.attempts === 1 ? 'One try failed' : `${row.attempts} tries failed`
  return `${tries}; the next is at ${utc(row.nextAttemptAt)}. ${row.lastError ?? ''}`
}
