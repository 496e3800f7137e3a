import { type ApiClient, uniqueCode } from './api'

export interface MachineRows {
  machineId: string
  code: string
  taper: string
  viseCode: string
  setUpId: string
  setUpName: string
  /** 320 and 150 from gauge line to nose, of one bore and the machine's taper; the first is 5 too long at 40. */
  longHolder: { id: string; code: string }
  stubbyHolder: { id: string; code: string }
}

/** Case 1 of test/reference/machine/machine-window.md: a vise 180 high on 40, a window from 90 to 355. */
export async function createMachineRows(crib: ApiClient): Promise<MachineRows> {
  const [code, taper, series] = [uniqueCode('M'), uniqueCode('T'), uniqueCode('ER')]
  const machine = await crib.post('/api/machines', {
    ...{ code, name: 'Vertical mill', taper, gaugeLineToTableMm: 600, zTravelMm: 450, maximumRpm: 8000 },
    spindlePoints: [
      { rpm: 1500, torqueNm: 70 },
      { rpm: 8000, powerKw: 11 },
    ],
  })
  const viseCode = uniqueCode('VISE')
  const vise = await crib.post('/api/fixtures', { code: viseCode, heightMm: 180 })
  const setUpName = uniqueCode('Vise')
  const setUp = await crib.post('/api/set-ups', {
    ...{ machineId: machine.body.id, name: setUpName, highestMm: 100, lowestTipMm: 60 },
    ...{ retractClearanceMm: 25, fixtures: [{ itemId: vise.body.id, baseMm: 40 }] },
  })
  const holder = async (gaugeLengthMm: number) => {
    const made = await crib.post('/api/holders', {
      code: uniqueCode('H'),
      ...{ taper, gaugeLengthMm, bore: { kind: 'collet', series } },
      segments: [{ part: 'holder', lengthMm: 20, noseDiameterMm: 40, spindleDiameterMm: 50 }],
    })
    return { id: made.body.id, code: made.body.code }
  }
  return {
    ...{ machineId: machine.body.id, code, taper, viseCode, setUpId: setUp.body.id, setUpName },
    longHolder: await holder(320),
    stubbyHolder: await holder(150),
  }
}
