'use client'

import { FileText, Upload } from 'lucide-react'
import { type DragEvent, useId, useState } from 'react'
import { fileLimitText, importLimits } from '@/schemas/import-limits'
import { classNames } from '../ui/class-names'
import { sizeText } from './import-words'

export interface FileDropProps {
  file: File | null
  onChoose: (file: File) => void
  error?: string | null
}

/** Where a file is dropped or chosen; the limits stand in it. */
export function FileDrop({ file, onChoose, error }: FileDropProps) {
  const id = useId()
  const [isOver, setIsOver] = useState(false)

  function handleDrop(event: DragEvent) {
    event.preventDefault()
    setIsOver(false)
    const dropped = event.dataTransfer.files[0]
    if (dropped) onChoose(dropped)
  }

  return (
    <div className="flex flex-col gap-1">
      <label
        htmlFor={id}
        onDragOver={(event) => {
          event.preventDefault()
          setIsOver(true)
        }}
        onDragLeave={() => setIsOver(false)}
        onDrop={handleDrop}
        className={classNames(
          'focus-within:outline-accent flex min-h-36 cursor-pointer flex-col items-center justify-center gap-2 rounded-[3px] border-2 border-dashed px-4 py-6 text-center focus-within:outline-3 focus-within:outline-offset-2',
          isOver
            ? 'border-accent bg-accent-wash'
            : error
              ? 'border-collision'
              : 'border-ink-soft/60 hover:bg-accent-wash',
        )}
      >
        <input
          id={id}
          type="file"
          name="file"
          accept=".csv,.txt,.tsv,text/csv,text/plain,text/tab-separated-values"
          className="sr-only"
          aria-describedby={`${id}-limits`}
          aria-invalid={error ? true : undefined}
          onChange={(event) => {
            const chosen = event.target.files?.[0]
            if (chosen) onChoose(chosen)
          }}
        />
        {file ? (
          <>
            <FileText aria-hidden="true" className="text-accent size-8" />
            <span className="text-lg font-semibold break-all">{file.name}</span>
            <span className="text-ink-soft text-sm">
              {sizeText(file.size)}. Choose or drop another to replace it.
            </span>
          </>
        ) : (
          <>
            <Upload aria-hidden="true" className="text-accent size-8" />
            <span className="text-accent text-lg font-semibold">Choose a CSV file</span>
            <span className="text-ink-soft text-sm">or drop it here</span>
          </>
        )}
      </label>
      {error ? (
        <p className="text-collision text-sm font-semibold" role="alert">
          {error}
        </p>
      ) : null}
      <p id={`${id}-limits`} className="text-ink-soft text-sm">
        At most {fileLimitText}, {importLimits.columns} columns,{' '}
        {importLimits.cellCharacters.toLocaleString('en')} characters a cell. Commas, semicolons or tabs;
        UTF-8, UTF-16 or Windows-1252.
      </p>
    </div>
  )
}
