'use client'

import { useRouter } from 'next/navigation'
import { type ClipboardEvent, type FormEvent, useMemo, useState } from 'react'
import { useShop } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Notice } from '@/components/ui/notice'
import { TextAreaField } from '@/components/ui/text-field'
import { useAttempt } from '@/components/ui/use-attempt'
import { createImport } from '@/hooks/use-import'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { hasLengths, type ImportKind } from '@/schemas/import-fields'
import { pastedBlock, pastedFile, startsWithHeadings } from './pasted-block'
import { PastedSample } from './pasted-sample'

export interface PasteRowsProps {
  kind: ImportKind
  many: string
  /** What was pasted over the list; empty where the dialog was asked for. */
  firstText: string
  onClose: () => void
}

/** Rows of a spreadsheet on their way to the checks of an import. */
export default function PasteRows({ kind, many, firstText, onClose }: PasteRowsProps) {
  const [text, setText] = useState(firstText)
  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => !isOpen && onClose()}
      title={`Paste ${many} from a spreadsheet`}
      description="Nothing is changed by this. The rows are checked like a file, and you see what each would do."
      shape="wide"
    >
      <PasteForm kind={kind} text={text} onChange={setText} />
    </Dialog>
  )
}

/** More than this is shown by its first rows alone: nobody mends it by hand, and a field of it is slow. */
const mostTyped = 100_000

function PasteForm({
  kind,
  text,
  onChange,
}: {
  kind: ImportKind
  text: string
  onChange: (text: string) => void
}) {
  const { unit } = useShop()
  const router = useRouter()
  const [saidHeadings, setSaidHeadings] = useState<boolean | null>(null)
  const hasHeadings = useMemo(() => saidHeadings ?? startsWithHeadings(text), [saidHeadings, text])
  const [isTried, setIsTried] = useState(false)
  const { fault, isBusy, attempt } = useAttempt()
  const block = useMemo(() => pastedBlock(text, hasHeadings), [text, hasHeadings])
  const shownFault = isTried || block.columns > 0 ? block.fault : null
  const isLong = text.length > mostTyped

  function handleSubmit(event: FormEvent) {
    event.preventDefault()
    setIsTried(true)
    if (block.fault) return
    void attempt(async () => {
      const id = await createImport(kind, unit, pastedFile(text, hasHeadings))
      router.push(`/imports/${id}`)
    })
  }

  function handlePaste(event: ClipboardEvent) {
    const pasted = event.clipboardData.getData('text/plain')
    if (pasted.length <= mostTyped) return
    event.preventDefault()
    onChange(pasted)
  }

  return (
    <form noValidate onSubmit={handleSubmit} className="flex flex-col gap-4">
      {isLong ? null : (
        <TextAreaField
          label="Rows"
          hint={`Copy the rows in the spreadsheet and paste them here.${hasLengths(kind) ? ` Bare numbers are taken as ${unit}, unless a heading says otherwise.` : ''}`}
          rows={5}
          wrap="off"
          spellCheck={false}
          value={text}
          onChange={(event) => onChange(event.target.value)}
          onPaste={handlePaste}
          error={shownFault ?? undefined}
        />
      )}
      {block.columns > 0 ? (
        <>
          <FirstRowChoice hasHeadings={hasHeadings} onChoose={setSaidHeadings} />
          <PastedSample {...{ block, hasHeadings }} />
        </>
      ) : null}
      {isLong && shownFault ? (
        <Notice kind="collision" isAnnounced>
          {shownFault}
        </Notice>
      ) : null}
      {fault ? (
        <Notice kind="collision" isAnnounced>
          {fieldFaults(fault).file ?? faultSentence(fault)}
        </Notice>
      ) : null}
      <div className="flex flex-wrap gap-3">
        <Button type="submit" variant="primary" disabled={isBusy}>
          {isBusy ? 'Sending …' : 'Check these rows'}
        </Button>
        {isLong ? <Button onClick={() => onChange('')}>Paste other rows</Button> : null}
      </div>
    </form>
  )
}

function FirstRowChoice({
  hasHeadings,
  onChoose,
}: {
  hasHeadings: boolean
  onChoose: (hasHeadings: boolean) => void
}) {
  return (
    <fieldset>
      <legend className="font-semibold">The first row is</legend>
      <div className="flex flex-wrap gap-x-6">
        {[true, false].map((choice) => (
          <label key={String(choice)} className="flex min-h-11 items-center gap-2.5">
            <input
              type="radio"
              name="first-row"
              className="accent-accent size-4"
              checked={hasHeadings === choice}
              onChange={() => onChoose(choice)}
            />
            {choice ? 'headings' : 'a row of the list'}
          </label>
        ))}
      </div>
      {hasHeadings ? null : (
        <p className="text-ink-soft text-sm">You say on the next page what each column is.</p>
      )}
    </fieldset>
  )
}
