'use client'

import { useState } from 'react'
import { parseLength } from '@/core/units/parse-length'
import { useReachItem } from '@/hooks/use-reach-items'
import { lengthInputText } from '@/lib/format-length'
import {
  centringSentence,
  fitSentence,
  machineRefusals,
  noseSentence,
  strikeSentence,
  windowSentences,
} from '@/lib/machine-sentences'
import type { MachineResponse } from '@/schemas/machine'
import type { SetUpResponse } from '@/schemas/set-up'
import { useShop } from '../layout/shop-context'
import { VerdictLine } from '../reach/verdict-line'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { DaylightDrawing } from './daylight-drawing'
import { type DaylightScene, widestRadiusMm } from './daylight-layout'
import { FittingHolders } from './fitting-holders'
import { ToolTrial } from './tool-trial'
import { triedTool } from './tried-tool'
import { useMachineAddress } from './use-machine-address'

export interface SetUpSheetProps {
  machine: MachineResponse
  setUp: SetUpResponse
  onEdit: (() => void) | null
}

/** A set-up's daylight: the verdict, the drawing, and a tool to be tried in it. */
export function SetUpSheet({ machine, setUp, onEdit }: SetUpSheetProps) {
  const { unit, decimalComma } = useShop()
  const address = useMachineAddress()
  const stickOutMm = positiveOf(address.valueOf('stickOutMm'))
  const [text, setText] = useState(() =>
    stickOutMm === null ? '' : lengthInputText(stickOutMm, unit, { decimalComma }),
  )
  const cutter = useReachItem('cutter', address.valueOf('cutter'))
  const holder = useReachItem('holder', address.valueOf('holder'))
  const extension = useReachItem('extension', address.valueOf('extension'))
  const { window } = setUp
  if (window === null) {
    return (
      <div className="flex flex-col items-start gap-3">
        <Notice kind="collision">{setUp.windowProblem}</Notice>
        {onEdit ? <Button onClick={onEdit}>Change the set-up</Button> : null}
      </div>
    )
  }
  const tried = triedTool(
    { cutter: cutter.row, holder: holder.row, extension: extension.row, stickOutMm },
    window,
  )
  const tool = typeof tried === 'string' ? null : tried
  const problem = typeof tried === 'string' ? tried : null
  const strike = strikeSentence(window, unit)
  const against = [
    ...(strike === null ? [] : [strike]),
    ...(tool && holder.row
      ? machineRefusals(
          machine,
          { holderCode: holder.row.code, taper: holder.row.taper, widestMm: 2 * widestRadiusMm(tool) },
          unit,
        )
      : []),
  ]
  const nose =
    tool?.fit.verdict === 'fits'
      ? noseSentence({ ...setUp, highestMm: window.highestMm }, tool.gaugeLengthMm, unit)
      : null
  const [first = '', ...others] = tool ? [] : windowSentences(window, unit)

  function handleStickOut(typed: string) {
    setText(typed)
    const read = parseLength(typed, { unit, decimalComma, drillSizes: false })
    address.change({ stickOutMm: read.ok ? String(read.mm) : null })
  }

  return (
    <div className="flex min-w-0 flex-col gap-4">
      {tool ? (
        <VerdictLine
          tone={
            tool.fit.verdict !== 'fits' || against.length > 0
              ? 'collision'
              : nose === null
                ? 'holds'
                : 'caution'
          }
          sentence={[...against, fitSentence(tool.fit, tool.gaugeLengthMm, unit), nose ?? '']
            .join(' ')
            .trim()}
        />
      ) : (
        <VerdictLine tone={window.possible ? 'plain' : 'collision'} sentence={first} />
      )}
      {others.length > 0 ? <p className="max-w-[80ch]">{others.join(' ')}</p> : null}
      {setUp.centringMarginMm === null ? null : (
        <Notice kind={setUp.centringMarginMm < 0 ? 'collision' : 'plain'}>
          {centringSentence(setUp.centringMarginMm, unit)}
        </Notice>
      )}
      <DaylightDrawing code={machine.code} scene={sceneOf(machine, setUp)} tool={tool} unit={unit} />
      <ToolTrial
        cutter={cutter}
        holder={holder}
        extension={extension}
        stickOutText={text}
        problem={problem}
        onStickOut={handleStickOut}
        ids={{
          cutter: address.valueOf('cutter'),
          holder: address.valueOf('holder'),
          extension: address.valueOf('extension'),
        }}
        onPick={(slot, id) => address.change({ [slot]: id })}
      />
      {tool && holder.row && stickOutMm !== null ? (
        <FittingHolders
          setUp={setUp}
          holder={holder.row}
          extension={extension.row}
          stickOutMm={stickOutMm}
          onTake={(id) => address.change({ holder: id })}
        />
      ) : null}
      {setUp.note ? <p className="text-ink-soft max-w-[75ch]">{setUp.note}</p> : null}
      <Notice kind="caution">
        A calculated window is not a proven program: check the clearance on the machine, with the longest
        tool, before the first retract. What a tool weighs is not checked. Closed guard, eye protection.
      </Notice>
      {onEdit ? (
        <div>
          <Button size="compact" onClick={onEdit}>
            Change the set-up
          </Button>
        </div>
      ) : null}
    </div>
  )
}

function sceneOf(machine: MachineResponse, setUp: SetUpResponse): DaylightScene {
  if (setUp.window === null) throw new Error('a scene is drawn of a window that is there')
  return {
    gaugeLineToTableMm: machine.gaugeLineToTableMm,
    zTravelMm: machine.zTravelMm,
    spindleNoseDiameterMm: machine.spindleNoseDiameterMm,
    highestMm: setUp.highestMm,
    lowestTipMm: setUp.lowestTipMm,
    retractClearanceMm: setUp.retractClearanceMm,
    fixtures: setUp.fixtures.map((fixture, index) => ({ ...fixture, key: String(index) })),
    rotaryStock: setUp.rotaryStock,
    window: setUp.window,
  }
}

function positiveOf(text: string | null): number | null {
  const value = Number(text)
  return text !== null && Number.isFinite(value) && value > 0 ? value : null
}
