import { TriangleAlert } from 'lucide-react'
import type { ReactNode } from 'react'
import { mmPerInch } from '@/core/units/length-unit'
import type { BallSpeed } from '@/hooks/use-ball-speed'
import type { BallSpeedField } from '@/lib/ball-speed-draft'
import { formatAngle } from '@/lib/format-angle'
import { formatLength, lengthInputText } from '@/lib/format-length'
import { formatSpeed, speedUnitNames } from '@/lib/format-speed'
import { useShop } from '../layout/shop-context'
import { LengthField } from '../ui/length-field'
import { TextField } from '../ui/text-field'
import { MaterialSpeeds } from './material-speeds'
import { CutterPick, HolderPick } from './picked-limits'
import { RangeField } from './range-field'

/** What is cut, how the tool leans, how fast it turns, and how far apart its passes lie. */
export function BallSpeedForm({ ballSpeed }: { ballSpeed: BallSpeed }) {
  return (
    <form
      className="grid grid-cols-2 content-start gap-x-4 gap-y-3"
      aria-label="The cut"
      onSubmit={(event) => event.preventDefault()}
    >
      <Group title="The tool">
        <CutterPick ballSpeed={ballSpeed} />
        <Length ballSpeed={ballSpeed} field="cuttingDiameterMm" label="Diameter" symbol="DC" isRequired />
        <Length
          ballSpeed={ballSpeed}
          field="cornerRadiusMm"
          label="Corner radius"
          symbol="RE"
          hint="Blank for a ball"
        />
      </Group>
      <Group title="The cut">
        <div className="col-span-2">
          <Length ballSpeed={ballSpeed} field="depthOfCutMm" label="Depth of cut" symbol="ap" isRequired />
          <DepthRange ballSpeed={ballSpeed} />
        </div>
        <div>
          <Plain ballSpeed={ballSpeed} field="tiltDeg" label="Tilt" symbol="deg" />
          <TiltRange ballSpeed={ballSpeed} />
        </div>
        <Plain
          ballSpeed={ballSpeed}
          field="leadDeg"
          label="Lead"
          symbol="deg"
          hint="At right angles to the tilt"
        />
      </Group>
      <Group title="The speed" note="Type either; the other is worked out.">
        <Plain ballSpeed={ballSpeed} field="spindleRpm" label="Spindle speed" symbol="n · rpm" />
        <Speed ballSpeed={ballSpeed} />
        <MaterialSpeeds ballSpeed={ballSpeed} />
      </Group>
      <Group title="The limits">
        <Plain
          ballSpeed={ballSpeed}
          field="maximumRpm"
          label="Spindle limit"
          symbol="rpm"
          hint="What the machine’s spindle may turn"
          className="col-span-2"
        />
        <HolderPick ballSpeed={ballSpeed} />
      </Group>
      <Group title="The surface" note="Type either; the other is worked out.">
        <Length ballSpeed={ballSpeed} field="stepoverMm" label="Stepover" symbol="ae" />
        <Length ballSpeed={ballSpeed} field="scallopHeightMm" label="Scallop height" symbol="h" />
      </Group>
    </form>
  )
}

function Group({ title, note, children }: { title: string; note?: string; children: ReactNode }) {
  return (
    <fieldset className="col-span-2 grid grid-cols-2 items-start gap-x-4 gap-y-3">
      <legend className="border-hairline mb-2 w-full border-b pb-1 text-sm">
        <span className="font-semibold">{title}</span>
        {note ? <span className="text-ink-soft"> · {note}</span> : null}
      </legend>
      {children}
    </fieldset>
  )
}

interface BoundFieldProps {
  ballSpeed: BallSpeed
  field: BallSpeedField
  label: string
  symbol?: string
  hint?: string
  isRequired?: boolean
  className?: string
}

function useBinding({ ballSpeed, field, hint, ...rest }: BoundFieldProps) {
  return {
    ...rest,
    name: field,
    value: ballSpeed.textOf(field),
    error: ballSpeed.reading.faults[field],
    hint: ballSpeed.isWorkedOut(field) ? 'Worked out' : hint,
  }
}

function Length(props: BoundFieldProps) {
  const { unit, decimalComma } = useShop()
  return (
    <LengthField
      {...useBinding(props)}
      unit={unit}
      decimalComma={decimalComma}
      drillSizes={false}
      onTextChange={(text) => props.ballSpeed.type(props.field, text)}
    />
  )
}

function Plain(props: BoundFieldProps) {
  return (
    <TextField
      {...useBinding(props)}
      inputMode="decimal"
      autoComplete="off"
      onChange={(event) => props.ballSpeed.type(props.field, event.target.value)}
    />
  )
}

function Speed({ ballSpeed }: { ballSpeed: BallSpeed }) {
  const { unit } = useShop()
  const { answer } = ballSpeed.reading
  const isHeld = answer?.spindleLimited && !ballSpeed.isWorkedOut('wantedSpeedMPerMin')
  return (
    <Plain
      ballSpeed={ballSpeed}
      field="wantedSpeedMPerMin"
      label="Cutting speed"
      symbol={`vc · ${speedUnitNames[unit]}`}
      hint={isHeld ? `The limit allows ${formatSpeed(answer.speedMPerMin?.largest ?? 0, unit)}` : undefined}
    />
  )
}

function DepthRange({ ballSpeed }: { ballSpeed: BallSpeed }) {
  const { unit, decimalComma } = useShop()
  const { cuttingDiameterMm, cornerRadiusMm } = ballSpeed.reading.values
  const depthOfCutMm = ballSpeed.reading.values.depthOfCutMm ?? ballSpeed.answered.request?.depthOfCutMm
  if (cuttingDiameterMm === undefined) return null
  const radiusMm = cornerRadiusMm ?? cuttingDiameterMm / 2
  const stepMm = rangeStepMm(radiusMm, unit === 'in' ? mmPerInch : 1)
  return (
    <RangeField
      label="Depth of cut, by dragging"
      value={depthOfCutMm ?? 0}
      minimum={stepMm}
      maximum={radiusMm}
      step={stepMm}
      valueText={formatLength(depthOfCutMm ?? 0, unit)}
      onChange={(mm) => ballSpeed.type('depthOfCutMm', lengthInputText(mm, unit, { decimalComma }))}
    />
  )
}

/** About two hundred steps from nothing to the radius, each a round length in the person's unit. */
function rangeStepMm(radiusMm: number, unitMm: number): number {
  return 10 ** Math.floor(Math.log10(radiusMm / unitMm / 50)) * unitMm
}

function TiltRange({ ballSpeed }: { ballSpeed: BallSpeed }) {
  const tiltDeg = ballSpeed.reading.values.tiltDeg ?? 0
  return (
    <RangeField
      label="Tilt, by dragging"
      value={tiltDeg}
      minimum={0}
      maximum={90}
      step={1}
      valueText={formatAngle(tiltDeg)}
      onChange={(deg) => ballSpeed.type('tiltDeg', String(deg))}
    />
  )
}

/** What no calculation takes off anyone. */
export function BallSpeedCautions() {
  return (
    <section aria-label="Cautions" className="flex gap-2.5 text-[0.9375rem]">
      <TriangleAlert aria-hidden="true" className="text-caution mt-0.5 size-5 shrink-0" />
      <p className="max-w-[110ch]">
        These are figures of geometry, not a proven program. Keep below the tool maker’s limits for speed,
        depth and stick-out and the shop’s own rules; run behind a closed guard and with eye protection.
      </p>
    </section>
  )
}
