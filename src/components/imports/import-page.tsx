'use client'

import Link from 'next/link'
import { usePathname, useSearchParams } from 'next/navigation'
import { useState } from 'react'
import { cancelImport, commitImport, recheckImport, useImport } from '@/hooks/use-import'
import { isUnderWay } from '@/hooks/use-imports'
import { faultSentence } from '@/lib/field-faults'
import type { ImportResponse } from '@/schemas/import'
import { importKindLabels } from '@/schemas/import-fields'
import type { ImportColumn } from '@/schemas/import-mapping'
import { PageHeading } from '../layout/page-heading'
import { ButtonLink } from '../ui/button'
import { Notice } from '../ui/notice'
import { CancelDialog } from './cancel-dialog'
import { ColumnsTable } from './columns-table'
import { CommitBar, RejectsLink } from './commit-bar'
import { FillIn } from './fill-in'
import { ImportProgress } from './import-progress'
import { hasItemKey, ImportTabs, type ImportView, viewsOf } from './import-tabs'
import { countText, formatWords, sizeText, stockHeadings } from './import-words'
import { OutcomeSentence } from './outcome-sentence'
import { isItemKind, StagedRows } from './staged-rows'
import { WarningsTable } from './warnings-table'

/** One import from the upload to its end: progress, verdict, decision, and every row and column behind it. */
export function ImportPage({ initial }: { initial: ImportResponse }) {
  const { found, error, refresh } = useImport(initial)
  const [failure, setFailure] = useState<string | null>(null)
  const [isBusy, setIsBusy] = useState(false)
  const [isAsking, setIsAsking] = useState(false)

  async function run(work: () => Promise<void>) {
    setIsBusy(true)
    setFailure(null)
    try {
      await work()
    } catch (fault) {
      setFailure(faultSentence(fault))
    }
    await refresh()
    setIsBusy(false)
  }

  const handleCancel = () => run(() => cancelImport(found.id))
  return (
    <>
      <PageHeading title={<span className="break-all">{found.fileName}</span>} note={headingNote(found)}>
        <ButtonLink href="/imports" size="compact" variant="quiet">
          All imports
        </ButtonLink>
      </PageHeading>
      {(failure ?? error) ? (
        <Notice kind="collision" isAnnounced className="mx-4 mb-3 lg:mx-6">
          {failure ?? faultSentence(error)}
        </Notice>
      ) : null}
      <div className="border-ink bg-sheet flex flex-1 flex-col border-t">
        {isUnderWay(found) ? (
          <ImportProgress found={found} isCancelling={isBusy} onCancel={handleCancel} />
        ) : (
          <>
            <div className="flex flex-col gap-3 px-4 py-4 lg:px-6">
              <OutcomeSentence found={found} />
              <LeftOutLine found={found} />
              <StockWay found={found} />
              <DecimalsLine found={found} />
              <KeyNotice found={found} />
              <FillIn
                key={found.checkedAt}
                found={found}
                isBusy={isBusy}
                onRecheck={(change) => run(() => recheckImport(found.id, change))}
              />
              {found.state === 'checked' ? (
                <CommitBar
                  found={found}
                  isBusy={isBusy}
                  onCommit={(rejects) => run(() => commitImport(found.id, rejects))}
                  onCancel={() => setIsAsking(true)}
                />
              ) : null}
              {found.state === 'committed' && found.rejectedCount > 0 ? <RejectsLink id={found.id} /> : null}
            </div>
            <Views
              found={found}
              isBusy={isBusy}
              onRecheck={(change) => run(() => recheckImport(found.id, change))}
            />
          </>
        )}
      </div>
      <CancelDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        onCancelImport={() => {
          setIsAsking(false)
          void handleCancel()
        }}
      />
    </>
  )
}

function headingNote(found: ImportResponse): string {
  const rows = found.rows === null ? null : `${countText(found.rows)} ${found.rows === 1 ? 'row' : 'rows'}`
  return [importKindLabels[found.kind], rows, sizeText(found.fileSizeBytes), formatWords(found)]
    .filter(Boolean)
    .join(', ')
}

/** Columns nobody has a field for are passed over; said, so that a forgotten one is not found out later. */
function LeftOutLine({ found }: { found: ImportResponse }) {
  const leftOut = found.columns.filter((column) => column.field === null).map((column) => column.heading)
  if (found.state !== 'checked' || leftOut.length === 0) return null
  const [shown, rest] = [leftOut.slice(0, 8), leftOut.length - 8]
  return (
    <p className="text-ink-soft text-[0.9375rem]">
      {leftOut.length === 1 ? 'One column is' : `${leftOut.length} columns are`} left out: {shown.join(', ')}
      {rest > 0 ? ` and ${rest} more` : ''}.
    </p>
  )
}

/** A guess is said where it decides what the numbers are. */
function DecimalsLine({ found }: { found: ImportResponse }) {
  if (found.state !== 'checked' || found.decimals !== 'comma' || found.decimalsOrigin !== 'guessed')
    return null
  return (
    <p className="text-[0.9375rem]">
      Its numbers have a decimal comma, so 12,5 is read as 12.5. If that is wrong, say so under Columns.
    </p>
  )
}

/** Bins and quantities of a list of tools are opening stock: the way on, once the tools are there. */
function StockWay({ found }: { found: ImportResponse }) {
  const headings = found.columns.filter(isForStock).map((column) => column.heading)
  const isOver = found.state === 'committed'
  if (headings.length === 0 || !(isOver || found.state === 'checked') || !isItemKind(found.kind)) return null
  return (
    <Notice kind="plain">
      {headings.join(' and ')} {headings.length === 1 ? 'says' : 'say'} what lies where. Opening stock takes
      that from the same file, {isOver ? 'now that the tools are in' : 'once these are brought in'}.{' '}
      {isOver ? (
        <Link href="/imports/new?kind=stock" className="text-accent font-semibold underline">
          Bring in the opening stock
        </Link>
      ) : null}
    </Notice>
  )
}

function isForStock({ heading, field }: ImportColumn): boolean {
  return field === null && stockHeadings.test(heading.trim())
}

/** Without a column that names the item no row can be taken: said once, where it can be set. */
function KeyNotice({ found }: { found: ImportResponse }) {
  if (found.state !== 'checked' || hasItemKey(found) || found.columns.length === 0) return null
  return (
    <Notice kind="caution">
      No column gives the own code, or maker and part number, so no row says which item it means. Say under
      Columns which one does, and check again.
    </Notice>
  )
}

function Views({
  found,
  isBusy,
  onRecheck,
}: {
  found: ImportResponse
  isBusy: boolean
  onRecheck: Parameters<typeof ColumnsTable>[0]['onRecheck']
}) {
  const pathname = usePathname()
  const asked = useSearchParams().get('show')
  const views = viewsOf(found)
  const shown = views.find(({ view }) => view === asked)?.view ?? views[0]?.view
  if (!shown) return null
  const handleShow = (view: ImportView) => window.history.replaceState(null, '', `${pathname}?show=${view}`)
  return (
    <ImportTabs views={views} shown={shown} onShow={handleShow}>
      {shown === 'columns' ? (
        <ColumnsTable
          key={found.checkedAt}
          found={found}
          isBusy={isBusy}
          {...(found.state === 'checked' && onRecheck ? { onRecheck } : {})}
        />
      ) : shown === 'warnings' ? (
        <WarningsTable found={found} />
      ) : (
        <StagedRows key={shown} found={found} outcome={shown} />
      )}
    </ImportTabs>
  )
}
