'use client'

import { findWorkMaterial } from '@/core/cutting/work-materials'
import type { Substrate } from '@/core/tooling'
import type { CutQuestionState } from '@/hooks/use-cut-question'
import { useStartingSpeeds } from '@/hooks/use-starting-speeds'
import { substrateNames } from '@/lib/cutter-words'
import { formatSpeedRange, speedInputText, speedUnitNames } from '@/lib/format-speed'
import { useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { LengthField } from '../ui/length-field'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { WorkMaterialField } from './work-material-field'

export interface CutQuestionProps {
  question: CutQuestionState
  /** Narrows the shop's speeds to what the cutter is made of, where that is known. */
  substrate?: Substrate | null
  /** A drill is asked for a feed a revolution and for no depth and no stepover. */
  isDrill?: boolean
  /** The cutter's own number of flutes is not entered. */
  asksFlutes?: boolean
}

/** The cut to be estimated: material, speed, feed, depth, stepover and the machine. */
export function CutQuestion({
  question,
  substrate = null,
  isDrill = false,
  asksFlutes = false,
}: CutQuestionProps) {
  const { unit, decimalComma } = useShop()
  const { draft, faults, machines, type } = question
  const manner = { unit, decimalComma, drillSizes: false }
  return (
    <div className="flex flex-col gap-3">
      <div className="grid items-start gap-4 sm:grid-cols-2 lg:grid-cols-3">
        <WorkMaterialField
          className="sm:col-span-2 lg:col-span-1"
          value={draft.materialNumber}
          onChoose={(materialNumber) => type({ materialNumber })}
        />
        <TextField
          label="Cutting speed"
          symbol={speedUnitNames[unit]}
          inputMode="decimal"
          autoComplete="off"
          value={draft.speed}
          error={faults.speed ?? null}
          onChange={(event) => type({ speed: event.target.value })}
        />
        <LengthField
          {...manner}
          label={isDrill ? 'Feed a revolution' : 'Feed a tooth'}
          symbol={isDrill ? 'f' : 'fz'}
          value={draft.feed}
          error={faults.feed ?? null}
          hint={isDrill ? 'From the drill’s maker.' : 'The maker’s, at full engagement.'}
          onTextChange={(feed) => type({ feed })}
        />
        {isDrill ? null : (
          <>
            <LengthField
              {...manner}
              label="Depth of cut"
              symbol="ap"
              value={draft.depthOfCut}
              error={faults.depthOfCut ?? null}
              onTextChange={(depthOfCut) => type({ depthOfCut })}
            />
            <LengthField
              {...manner}
              label="Stepover"
              symbol="ae"
              value={draft.stepover}
              error={faults.stepover ?? null}
              onTextChange={(stepover) => type({ stepover })}
            />
          </>
        )}
        {asksFlutes && !isDrill ? (
          <TextField
            label="Flutes"
            symbol="NOF"
            inputMode="numeric"
            autoComplete="off"
            value={draft.flutes}
            error={faults.flutes ?? null}
            onChange={(event) => type({ flutes: event.target.value })}
          />
        ) : null}
        <SelectField
          label="Machine"
          value={draft.machineId}
          onChange={(event) => type({ machineId: event.target.value })}
          options={[
            { value: '', label: 'None chosen' },
            ...machines.map(({ id, code, name }) => ({ value: id, label: `${code} · ${name}` })),
          ]}
        />
      </div>
      <ShopSpeeds
        materialNumber={draft.materialNumber}
        substrate={substrate}
        isDrill={isDrill}
        onTake={(mPerMin) => type({ speed: speedInputText(mPerMin, unit, { decimalComma }) })}
      />
    </div>
  )
}

interface ShopSpeedsProps {
  materialNumber: string
  substrate: Substrate | null
  isDrill: boolean
  onTake: (mPerMin: number) => void
}

/** What the shop's table has for the material's group; the slow end is where a cut starts. */
function ShopSpeeds({ materialNumber, substrate, isDrill, onTake }: ShopSpeedsProps) {
  const { unit } = useShop()
  const { rows } = useStartingSpeeds()
  const material = findWorkMaterial(Number(materialNumber))
  const offered = rows.filter(
    (row) => row.isoGroup === material?.isoGroup && (substrate === null || row.substrate === substrate),
  )
  if (!material || offered.length === 0) return null
  return (
    <div className="flex flex-wrap items-center gap-2">
      <span className="text-ink-soft text-sm">
        {isDrill ? 'The shop’s speeds for milling begin at:' : 'The shop’s table, the slow end first:'}
      </span>
      {offered.map((row) => (
        <Button key={row.id} size="compact" variant="quiet" onClick={() => onTake(row.lowMPerMin)}>
          <span className="text-left font-normal whitespace-normal">
            {row.material}
            {substrate === null ? ` · ${substrateNames[row.substrate]}` : ''}: {formatSpeedRange(row, unit)}
          </span>
        </Button>
      ))}
    </div>
  )
}
