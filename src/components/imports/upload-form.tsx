'use client'

import { useRouter, useSearchParams } from 'next/navigation'
import { type FormEvent, useRef, useState } from 'react'
import { createImport } from '@/hooks/use-import'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { hasLengths, type ImportKind, importKindLabels, importKinds } from '@/schemas/import-fields'
import { fileLimitText, importLimits } from '@/schemas/import-limits'
import { useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { classNames } from '../ui/class-names'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { FileDrop } from './file-drop'
import { StockNeeds } from './stock-needs'

const kindHints: Readonly<Record<ImportKind, string>> = {
  cutters: 'End mills, drills, taps, reamers: one row each.',
  holders: 'One row a segment of the outline, or nut, nose and body in one row.',
  collets: 'Series and the shanks each takes.',
  extensions: 'Projection, bore and outline.',
  stock: 'What lies in the bins today, once, for items without movements.',
  reorderPoints: 'When each item is low in each crib, how far to order up, and from whom.',
}

/** What the file holds, its unit and the file itself; the rest is asked when it has been read. */
export function UploadForm() {
  const { unit } = useShop()
  const router = useRouter()
  const [kind, setKind] = useState<ImportKind>(kindOfAddress(useSearchParams()))
  const [fileUnit, setFileUnit] = useState<string>(unit)
  const [file, setFile] = useState<File | null>(null)
  const [failure, setFailure] = useState<unknown>(null)
  const sending = useRef<AbortController | null>(null)
  const [isBusy, setIsBusy] = useState(false)
  const faults = fieldFaults(failure)

  function handleChoose(chosen: File) {
    setFile(chosen)
    setFailure(chosen.size > importLimits.fileBytes ? tooLarge(chosen) : null)
  }

  async function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const chosen = file ?? fileOf(event.currentTarget)
    if (!chosen) return setFailure(new Error('Choose a file first.'))
    if (chosen.size > importLimits.fileBytes) return setFailure(tooLarge(chosen))
    setIsBusy(true)
    setFailure(null)
    sending.current = new AbortController()
    try {
      const id = await createImport(kind, fileUnit, chosen, sending.current.signal)
      router.push(`/imports/${id}`)
    } catch (error) {
      if (!sending.current.signal.aborted) setFailure(error)
      setIsBusy(false)
    }
  }

  return (
    <form onSubmit={handleSubmit} noValidate className="flex max-w-3xl flex-col gap-5">
      <KindChoice kind={kind} onChoose={setKind} error={faults.kind} />
      {kind === 'stock' ? <StockNeeds /> : null}
      <FileDrop
        file={file}
        onChoose={handleChoose}
        error={failure ? (faults.file ?? faultSentence(failure)) : null}
      />
      {hasLengths(kind) ? (
        <SelectField
          label="Bare numbers are in"
          hint="A unit in a heading (“Dia (in)”), in a column of its own or in a cell goes before this one."
          value={fileUnit}
          onChange={(event) => setFileUnit(event.target.value)}
          error={faults.unit}
          options={[
            { value: 'mm', label: 'millimetres' },
            { value: 'in', label: 'inches' },
          ]}
          className="max-w-md"
        />
      ) : null}
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" variant="primary" disabled={isBusy}>
          {isBusy ? 'Uploading …' : 'Upload and check'}
        </Button>
        {isBusy ? <Button onClick={() => sending.current?.abort()}>Cancel the upload</Button> : null}
      </div>
      <Notice kind="plain">
        Nothing is changed by uploading. The file is checked first, and you see what would be added, changed
        and rejected before you commit it.
      </Notice>
    </form>
  )
}

/** A link may say what the file will hold: `?kind=stock`. */
function kindOfAddress(params: URLSearchParams): ImportKind {
  return importKinds.find((kind) => kind === params.get('kind')) ?? 'cutters'
}

/** A file that was chosen before this page had come to life is in the form, though nobody was told. */
function fileOf(form: HTMLFormElement): File | null {
  const chosen = new FormData(form).get('file')
  return chosen instanceof File && chosen.name !== '' ? chosen : null
}

function tooLarge(file: File): Error {
  return new Error(`${file.name} is larger than ${fileLimitText}. Split it and upload the parts.`)
}

function KindChoice({
  kind,
  onChoose,
  error,
}: {
  kind: ImportKind
  onChoose: (kind: ImportKind) => void
  error?: string | undefined
}) {
  return (
    <fieldset>
      <legend className="mb-1 text-[0.9375rem] font-semibold">What the file holds</legend>
      <div className="grid gap-2 sm:grid-cols-2 lg:grid-cols-3">
        {importKinds.map((choice) => (
          <label
            key={choice}
            className={classNames(
              'has-focus-visible:outline-accent flex min-h-11 cursor-pointer gap-2.5 rounded-[3px] border px-3 py-2 has-focus-visible:outline-3 has-focus-visible:outline-offset-2',
              choice === kind
                ? 'border-accent bg-accent-wash'
                : 'border-ink-soft/60 bg-sheet hover:bg-accent-wash',
            )}
          >
            <input
              type="radio"
              name="kind"
              value={choice}
              checked={choice === kind}
              onChange={() => onChoose(choice)}
              className="accent-accent mt-1 size-4 shrink-0"
            />
            <span>
              <span className="block font-semibold">{importKindLabels[choice]}</span>
              <span className="text-ink-soft block text-sm">{kindHints[choice]}</span>
            </span>
          </label>
        ))}
      </div>
      {error ? <p className="text-collision text-sm font-semibold">{error}</p> : null}
    </fieldset>
  )
}
