import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { pointOutlook } from './crib-stock'
import type { NewPoint } from './new-point'

export interface NewPointFieldsProps {
  point: NewPoint
  /** The item is given and not asked for. */
  isItemKnown: boolean
  /** As typed so far. */
  reorderPoint: number | null
}

/** Of what item and in which crib, with what is there already: a point above it is low at once. */
export function NewPointFields({ point, isItemKnown, reorderPoint }: NewPointFieldsProps) {
  const outlook = point.stock ? pointOutlook(point.stock, point.crib, reorderPoint) : null
  return (
    <div className="flex flex-col gap-2">
      <div className="grid gap-4 sm:grid-cols-2">
        {isItemKnown ? null : (
          <TextField
            label="Item’s code"
            value={point.code}
            onChange={(event) => point.setCode(event.target.value)}
            error={point.faults.code}
            isRequired
            autoComplete="off"
          />
        )}
        <SelectField
          label="Crib"
          value={point.cribId}
          onChange={(event) => point.setCribId(event.target.value)}
          error={point.faults.crib}
          isRequired
          options={[
            ...(point.crib ? [] : [{ value: point.cribId, label: 'Choose the crib' }]),
            ...point.cribs.map((crib) => ({ value: crib.id, label: `${crib.code} · ${crib.name}` })),
          ]}
        />
      </div>
      <p role="status" className={outlook?.isCaution ? 'text-caution font-semibold' : 'text-ink-soft'}>
        {outlook?.sentence}
      </p>
    </div>
  )
}
