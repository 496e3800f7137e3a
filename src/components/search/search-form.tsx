'use client'

import { Search } from 'lucide-react'
import { type FormEvent, useCallback, useRef, useState } from 'react'
import { flushSync } from 'react-dom'
import type { ReachSettings } from '@/core/reach/types'
import { type CutterForm, cutterForms, type Substrate, substrates } from '@/core/tooling'
import { useReachItem } from '@/hooks/use-reach-items'
import { useStartingSpeeds } from '@/hooks/use-starting-speeds'
import { cutterFormNames, substrateNames } from '@/lib/cutter-words'
import type { SearchPurpose } from '@/schemas/reach-search'
import type { FieldErrors } from '../reach/compile-check'
import { FeatureSection } from '../reach/feature-section'
import { FieldsFold } from '../reach/fields-fold'
import { changedDraft, type DraftChange } from '../reach/reach-draft'
import type { Reading } from '../reach/read-field'
import { Button } from '../ui/button'
import { classNames } from '../ui/class-names'
import { LengthField } from '../ui/length-field'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { CutFields } from './cut-fields'
import { compileSearch, type SearchDraft, type SearchText, searchTexts } from './search-question'

export interface SearchFormProps {
  /** The search as the address has it. */
  draft: SearchDraft
  reading: Reading
  settings: ReachSettings
  refused: FieldErrors
  onAsk: (draft: SearchDraft) => void
}

const noRows = { cutter: null, holder: null, collet: null, extension: null }

/**
 * What is to be cut, and what of the crib to look through. It is asked on the button: half a depth on the way to a whole
 * one would be answered just as surely.
 */
export function SearchForm({ draft: asked, reading, settings, refused, onAsk }: SearchFormProps) {
  const [draft, setDraft] = useState(asked)
  const [faults, setFaults] = useState<FieldErrors>({})
  const form = useRef<HTMLFormElement>(null)
  const { check, purpose, texts, choices } = draft
  const errors = { ...refused, ...faults }
  const change = useCallback((made: DraftChange) => {
    setFaults({})
    setDraft((held) => ({ ...held, check: changedDraft(held.check, made) }))
  }, [])
  const set = (made: Partial<SearchDraft>) => {
    setFaults({})
    setDraft((held) => ({ ...held, ...made }))
  }

  function handleSubmit(event: FormEvent) {
    event.preventDefault()
    const compiled = compileSearch(draft, reading, settings)
    if (compiled.state === 'asked') {
      const { forms, substrates, material } = choices
      onAsk({ ...draft, choices: { ...asked.choices, forms, substrates, material } })
      return
    }
    const found = compiled.state === 'refused' ? compiled.errors : { 'feature.depthMm': 'Enter the depth.' }
    flushSync(() => setFaults(found))
    form.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus()
  }

  const text = (name: SearchText) => ({
    label: searchTexts[name].label,
    value: texts[name],
    error: errors[searchTexts[name].path] ?? null,
  })
  const setText = (name: SearchText) => (typed: string) => set({ texts: { ...texts, [name]: typed } })

  return (
    <form
      ref={form}
      noValidate
      onSubmit={handleSubmit}
      aria-label="What is to be cut"
      className="border-ink bg-sheet border"
    >
      <FeatureSection
        kind={check.featureKind}
        texts={check.texts.feature}
        obstacles={check.obstacles}
        rows={noRows}
        reading={reading}
        errors={errors}
        onChange={change}
      />
      <div className="border-hairline flex flex-col gap-3 border-t px-4 py-3">
        {check.picks.cutter === null ? null : (
          <OnlyCutter
            id={check.picks.cutter}
            onForget={() => change({ type: 'pick', slot: 'cutter', id: null })}
          />
        )}
        <PurposeChoice purpose={purpose} onChoose={(chosen) => set({ purpose: chosen })} />
        {purpose === 'finishing' ? (
          <div className="grid grid-cols-2 gap-3">
            <LengthField {...reading} {...text('stepover')} onTextChange={setText('stepover')} />
            <LengthField
              {...reading}
              {...text('cusp')}
              hint="Left between two passes"
              onTextChange={setText('cusp')}
            />
          </div>
        ) : null}
        <FieldsFold
          summary="What to look through"
          isOpenAtFirst={
            choices.forms.length > 0 ||
            choices.substrates.length > 0 ||
            choices.material !== null ||
            texts.ratio !== ''
          }
          hasFault={['where.material', searchTexts.ratio.path].some((path) => errors[path] !== undefined)}
          className="flex flex-col gap-3"
        >
          <Checks
            legend="Forms of cutter"
            all={cutterForms.filter((form) => form !== 'chamfer')}
            names={cutterFormNames}
            chosen={choices.forms}
            onChoose={(forms: CutterForm[]) => set({ choices: { ...choices, forms } })}
          />
          <Checks
            legend="Tool material"
            all={substrates}
            names={substrateNames}
            chosen={choices.substrates}
            onChoose={(chosen: Substrate[]) => set({ choices: { ...choices, substrates: chosen } })}
          />
          <MaterialField
            material={choices.material}
            error={errors['where.material'] ?? null}
            onChoose={(material) => set({ choices: { ...choices, material } })}
          />
          <TextField
            {...text('ratio')}
            symbol="× DC"
            autoComplete="off"
            hint="Leave out what would stand out more than so many diameters"
            onChange={(event) => setText('ratio')(event.target.value)}
          />
        </FieldsFold>
        <CutFields
          draft={draft}
          reading={reading}
          errors={errors}
          onMaterial={(cutMaterial) => set({ cutMaterial })}
          onText={(name, typed) => setText(name)(typed)}
        />
      </div>
      <div className="bg-sheet border-hairline sticky bottom-0 border-t px-4 py-3">
        <Button type="submit" variant="primary" size="counter" className="w-full">
          <Search aria-hidden="true" className="size-6" />
          Find
        </Button>
      </div>
    </form>
  )
}

/** The search is for what holds one cutter. */
function OnlyCutter({ id, onForget }: { id: string; onForget: () => void }) {
  const { row } = useReachItem('cutter', id)
  return (
    <p className="bg-well flex items-center justify-between gap-2 pl-3">
      <span>
        Only with cutter <strong>{row?.code ?? '…'}</strong>
      </span>
      <Button variant="quiet" size="compact" onClick={onForget}>
        Any cutter
      </Button>
    </p>
  )
}

/** What is cut: it says where to start. Which cutters suit it the catalogue does not know. */
function MaterialField({
  material,
  error,
  onChoose,
}: {
  material: string | null
  error: string | null
  onChoose: (material: string | null) => void
}) {
  const { rows } = useStartingSpeeds()
  const known = [...new Set([...rows.map((row) => row.material), ...(material ? [material] : [])])]
  return (
    <SelectField
      label="Material to be cut"
      value={material ?? ''}
      error={error}
      options={[{ value: '', label: 'Any' }, ...known.map((name) => ({ value: name, label: name }))]}
      hint="Each cutter then says where to start; none is left out"
      onChange={(event) => onChoose(event.target.value || null)}
    />
  )
}

const purposes: readonly [SearchPurpose | null, string, string][] = [
  [null, 'All of it', 'Every limit given is asked of one cutter.'],
  ['roughing', 'Rough', 'Depth and opening; corners and floor are left to the finishing cutter.'],
  ['finishing', 'Finish', 'Corner and floor radii too, and the cusp between passes.'],
]

function PurposeChoice({
  purpose,
  onChoose,
}: {
  purpose: SearchPurpose | null
  onChoose: (purpose: SearchPurpose | null) => void
}) {
  return (
    <fieldset className="flex flex-col gap-1">
      <legend className="mb-1 text-[0.9375rem] font-semibold">The cutter is to</legend>
      <div className="border-ink-soft/60 flex self-start overflow-hidden rounded-[3px] border">
        {purposes.map(([value, label]) => (
          <button
            key={label}
            type="button"
            aria-pressed={purpose === value}
            onClick={() => onChoose(value)}
            className={classNames(
              'min-h-9 px-4 font-semibold pointer-coarse:min-h-11',
              purpose === value ? 'bg-accent text-on-accent' : 'text-accent hover:bg-accent-wash',
            )}
          >
            {label}
          </button>
        ))}
      </div>
      <p className="text-ink-soft text-sm">{purposes.find(([value]) => value === purpose)?.[2]}</p>
    </fieldset>
  )
}

function Checks<Word extends string>({
  legend,
  all,
  names,
  chosen,
  onChoose,
}: {
  legend: string
  all: readonly Word[]
  names: Readonly<Record<Word, string>>
  chosen: readonly Word[]
  onChoose: (chosen: Word[]) => void
}) {
  return (
    <fieldset>
      <legend className="text-[0.9375rem] font-semibold">{legend}</legend>
      <div className="grid grid-cols-2 gap-x-3">
        {all.map((word) => (
          <label key={word} className="flex min-h-9 items-center gap-2 pointer-coarse:min-h-11">
            <input
              type="checkbox"
              className="accent-accent size-4"
              checked={chosen.includes(word)}
              onChange={(event) =>
                onChoose(
                  all.filter((other) => (other === word ? event.target.checked : chosen.includes(other))),
                )
              }
            />
            {names[word]}
          </label>
        ))}
      </div>
    </fieldset>
  )
}
