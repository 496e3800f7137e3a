'use client'

import { Search, X } from 'lucide-react'
import { type KeyboardEvent, useEffect, useRef, useState } from 'react'
import { controlClass } from '@/components/ui/field'
import { useDelayed } from './use-delayed'

export interface SearchBoxProps {
  value: string
  label: string
  onSearch: (text: string) => void
  /** Down and Enter go on into the list. */
  onLeaveDown?: () => void
}

/** The list's search: `/` comes here from anywhere on the page, Down or Enter goes on to the rows, Escape clears. */
export function SearchBox({ value, label, onSearch, onLeaveDown }: SearchBoxProps) {
  const [text, setText] = useState(value)
  const input = useRef<HTMLInputElement>(null)
  const sent = useRef(value)
  const delayed = useDelayed((next: string) => {
    sent.current = next.trim()
    onSearch(sent.current)
  }, 250)
  useSlashKey(() => input.current?.select())

  useEffect(() => {
    // Cleared or changed from outside; not the echo of what was typed here.
    if (value === sent.current) return
    sent.current = value
    setText(value)
  }, [value])

  function handleChange(next: string) {
    setText(next)
    delayed.later(next)
  }

  function handleKey(event: KeyboardEvent<HTMLInputElement>) {
    if (event.key === 'Escape' && text !== '') {
      event.preventDefault()
      handleChange('')
      delayed.now()
    }
    if (event.key === 'Enter' || event.key === 'ArrowDown') {
      event.preventDefault()
      delayed.now()
      onLeaveDown?.()
    }
  }

  return (
    <div className="relative min-w-0 flex-1 sm:w-80 sm:flex-none">
      <Search
        aria-hidden="true"
        className="text-ink-soft pointer-events-none absolute top-1/2 left-2.5 size-4.5 -translate-y-1/2"
      />
      <input
        ref={input}
        type="search"
        aria-label={label}
        aria-keyshortcuts="/"
        placeholder={label}
        autoComplete="off"
        spellCheck={false}
        value={text}
        maxLength={200}
        onChange={(event) => handleChange(event.target.value)}
        onKeyDown={handleKey}
        className={`${controlClass} pr-9 pl-9 [&::-webkit-search-cancel-button]:hidden`}
      />
      {text === '' ? (
        <span
          aria-hidden="true"
          className="border-hairline text-ink-soft pointer-events-none absolute top-1/2 right-2.5 hidden -translate-y-1/2 border px-1.5 text-xs pointer-fine:block"
        >
          /
        </span>
      ) : (
        <button
          type="button"
          aria-label="Clear the search"
          className="hover:bg-accent-wash absolute top-0 right-0 grid h-full w-10 place-items-center rounded-[3px]"
          onClick={() => {
            handleChange('')
            delayed.now()
            input.current?.focus()
          }}
        >
          <X aria-hidden="true" className="size-4" />
        </button>
      )}
    </div>
  )
}

function useSlashKey(onSlash: () => void): void {
  const latest = useRef(onSlash)
  useEffect(() => {
    latest.current = onSlash
  })
  useEffect(() => {
    const handle = (event: globalThis.KeyboardEvent) => {
      const target = event.target
      const isTyping =
        target instanceof Element &&
        target.closest('input, textarea, select, [contenteditable], [role="dialog"]')
      if (event.key !== '/' || event.ctrlKey || event.metaKey || event.altKey || isTyping) return
      event.preventDefault()
      latest.current()
    }
    window.addEventListener('keydown', handle)
    return () => window.removeEventListener('keydown', handle)
  }, [])
}
