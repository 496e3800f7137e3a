'use client'

import { ClipboardPaste } from 'lucide-react'
import { useRouter } from 'next/navigation'
import { type FormEvent, useEffect, useState } from 'react'
import { useShop } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Notice } from '@/components/ui/notice'
import { TextAreaField } from '@/components/ui/text-field'
import { useAttempt } from '@/components/ui/use-attempt'
import { createImport } from '@/hooks/use-import'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { hasLengths, type ImportKind } from '@/schemas/import-fields'
import { isBlock, pastedBlock, pastedFile } from './pasted-block'

export interface PasteRowsProps {
  kind: ImportKind
  many: string
}

/** The button and its dialog; a block pasted over the list, where nothing is being typed, opens it too. */
export function PasteRows({ kind, many }: PasteRowsProps) {
  const [text, setText] = useState<string | null>(null)
  useBlockPaste(setText)
  return (
    <>
      <Button size="compact" onClick={() => setText('')}>
        <ClipboardPaste aria-hidden="true" className="size-4.5" />
        Paste rows
      </Button>
      <Dialog
        isOpen={text !== null}
        onOpenChange={(isOpen) => !isOpen && setText(null)}
        title={`Paste ${many} from a spreadsheet`}
        description="Nothing is changed by this. The rows are checked like a file, and you see what each would do."
      >
        <PasteForm kind={kind} text={text ?? ''} onChange={setText} />
      </Dialog>
    </>
  )
}

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
  const [hasHeadings, setHasHeadings] = useState(true)
  const [isTried, setIsTried] = useState(false)
  const { fault, isBusy, attempt } = useAttempt()
  const block = pastedBlock(text, hasHeadings)
  const shownFault = isTried || block.columns > 0 ? block.fault : null

  function handleSubmit(event: FormEvent) {
    event.preventDefault()
    setIsTried(true)
    if (block.fault) return
    void attempt(async () => {
      const id = await createImport(kind, unit, pastedFile(text, hasHeadings))
      router.push(`/imports/${id}`)
    })
  }

  return (
    <form noValidate onSubmit={handleSubmit} className="flex flex-col gap-4">
      <TextAreaField
        label="Rows"
        hint={
          hasLengths(kind) ? `Bare numbers are taken as ${unit}, unless a heading says otherwise.` : undefined
        }
        rows={8}
        wrap="off"
        spellCheck={false}
        value={text}
        onChange={(event) => onChange(event.target.value)}
        error={shownFault ?? undefined}
      />
      <label className="flex min-h-11 items-center gap-2.5">
        <input
          type="checkbox"
          className="accent-accent size-5"
          checked={hasHeadings}
          onChange={(event) => setHasHeadings(event.target.checked)}
        />
        The first row holds the headings
      </label>
      <p className="text-ink-soft" role="status">
        {block.columns > 0
          ? `${block.rows.toLocaleString('en')} ${block.rows === 1 ? 'row' : 'rows'}, ${block.columns.toLocaleString('en')} ${block.columns === 1 ? 'column' : 'columns'}.`
          : ''}
      </p>
      {fault ? (
        <Notice kind="collision" isAnnounced>
          {fieldFaults(fault).file ?? faultSentence(fault)}
        </Notice>
      ) : null}
      <Button type="submit" variant="primary" disabled={isBusy}>
        {isBusy ? 'Sending …' : 'Check these rows'}
      </Button>
    </form>
  )
}

function useBlockPaste(onPaste: (text: string) => void): void {
  useEffect(() => {
    const handle = (event: ClipboardEvent) => {
      const target = event.target
      const isTyping =
        target instanceof Element &&
        target.closest('input:not([type=checkbox]), textarea, select, [role="dialog"]')
      const text = event.clipboardData?.getData('text/plain') ?? ''
      if (isTyping || !isBlock(text)) return
      event.preventDefault()
      onPaste(text)
    }
    window.addEventListener('paste', handle)
    return () => window.removeEventListener('paste', handle)
  }, [onPaste])
}
