'use client'

import { Plus, X } from 'lucide-react'
import { memo } from 'react'
import { Button } from '../ui/button'
import { classNames } from '../ui/class-names'
import { LengthField } from '../ui/length-field'
import { FieldsFold } from './fields-fold'
import { newRowKey, type ObstacleDraft, type ReachDraft } from './reach-draft'
import { ReachFieldInput } from './reach-field-input'
import { hasFaultIn, type InputsProps } from './reach-inputs'

export interface FeatureSectionProps extends InputsProps {
  kind: ReachDraft['featureKind']
  texts: ReachDraft['texts']['feature']
  obstacles: readonly ObstacleDraft[]
}

const kinds = [
  ['wall', 'Wall'],
  ['hole', 'Hole'],
] as const

/** What is to be cut: a wall with all that may stand round it, or a hole. */
export const FeatureSection = memo(function FeatureSection(props: FeatureSectionProps) {
  const { kind, onChange } = props
  return (
    <section aria-labelledby="reach-feature" className="flex flex-col gap-3 px-4 py-3">
      <h2 id="reach-feature" className="text-lg">
        Feature
      </h2>
      <fieldset className="border-ink-soft/60 flex self-start overflow-hidden rounded-[3px] border">
        <legend className="sr-only">Kind of feature</legend>
        {kinds.map(([value, label]) => (
          <button
            key={value}
            type="button"
            aria-pressed={kind === value}
            onClick={() => onChange({ type: 'featureKind', kind: value })}
            className={classNames(
              'min-h-9 min-w-24 px-4 font-semibold pointer-coarse:min-h-11',
              kind === value ? 'bg-accent text-on-accent' : 'text-accent hover:bg-accent-wash',
            )}
          >
            {label}
          </button>
        ))}
      </fieldset>
      {kind === 'wall' ? <WallFields {...props} /> : <HoleFields {...props} />}
    </section>
  )
})

const limits = ['throughMm', 'openingWidthMm', 'insideCornerRadiusMm', 'floorRadiusMm', 'obstacles']

function WallFields(props: FeatureSectionProps) {
  const { texts, obstacles, errors } = props
  const hasLimits = obstacles.length > 0 || limits.some((name) => texts[name])
  const field = (name: string) => <ReachFieldInput {...props} group="feature" name={name} />
  return (
    <>
      <div className="grid grid-cols-2 gap-3">
        <ReachFieldInput {...props} group="feature" name="depthMm" isRequired />
        {field('draftDeg')}
        {field('tiltDeg')}
      </div>
      <FieldsFold
        summary="Opening, corners, obstacles"
        isOpenAtFirst={hasLimits}
        hasFault={limits.some((name) => hasFaultIn(errors, `feature.${name}`))}
        className="flex flex-col gap-3"
      >
        <div className="grid grid-cols-2 gap-3">
          {field('openingWidthMm')}
          {field('insideCornerRadiusMm')}
          {field('floorRadiusMm')}
          {field('throughMm')}
        </div>
        <Obstacles {...props} />
      </FieldsFold>
    </>
  )
}

function HoleFields(props: FeatureSectionProps) {
  return (
    <div className="grid grid-cols-2 gap-3">
      <ReachFieldInput {...props} group="feature" name="diameterMm" isRequired />
      <ReachFieldInput {...props} group="feature" name="depthMm" isRequired hint="At full diameter" />
      <ReachFieldInput {...props} group="feature" name="breakThroughMm" />
    </div>
  )
}

function Obstacles({ obstacles, reading, errors, onChange }: FeatureSectionProps) {
  const replace = (index: number, change: Partial<ObstacleDraft>) =>
    onChange({
      type: 'obstacles',
      obstacles: obstacles.map((obstacle, at) => (at === index ? { ...obstacle, ...change } : obstacle)),
    })
  return (
    <fieldset className="flex flex-col gap-2">
      <legend className="text-[0.9375rem] font-semibold">
        Bosses, clamps, jaws behind the wall’s top edge
      </legend>
      {obstacles.map((obstacle, index) => (
        <div key={obstacle.key} className="flex items-end gap-2">
          <LengthField
            {...reading}
            label="Set back"
            allowZero
            className="flex-1"
            value={obstacle.setback}
            error={errors[`feature.obstacles.${index}.setbackMm`] ?? null}
            onTextChange={(setback) => replace(index, { setback })}
          />
          <LengthField
            {...reading}
            label="Rises"
            allowZero
            className="flex-1"
            value={obstacle.rise}
            error={errors[`feature.obstacles.${index}.riseMm`] ?? null}
            onTextChange={(rise) => replace(index, { rise })}
          />
          <button
            type="button"
            className="hover:bg-accent-wash grid size-10 place-items-center rounded-[3px] pointer-coarse:size-11"
            aria-label={`Remove obstacle ${index + 1}`}
            onClick={() =>
              onChange({ type: 'obstacles', obstacles: obstacles.filter((_, at) => at !== index) })
            }
          >
            <X aria-hidden="true" className="size-4.5" />
          </button>
        </div>
      ))}
      <Button
        variant="quiet"
        size="compact"
        className="self-start"
        onClick={() =>
          onChange({
            type: 'obstacles',
            obstacles: [...obstacles, { key: newRowKey(obstacles), setback: '', rise: '' }],
          })
        }
      >
        <Plus aria-hidden="true" className="size-4.5" />
        Add an obstacle
      </Button>
    </fieldset>
  )
}
