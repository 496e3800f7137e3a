import { expectAccessible } from '../support/accessibility'
import { signedInAs, uniqueCode } from '../support/api'
import { createCutter } from '../support/api-stock'
import { expect, signIn, test } from '../support/browser'

test('a cut is estimated beside the reach check, with the spindle it is asked of', async ({ page }) => {
  const crib = await signedInAs('cribManager')
  const cutterId = await createCutter(crib, {
    ...{ cuttingDiameterMm: 12, lengthOfCutMm: 26, shankDiameterMm: 12, overallLengthMm: 83 },
    ...{ fluteCount: 4, substrate: 'carbide' },
  })
  const holder = await crib.post('/api/holders', {
    ...{ code: uniqueCode('H'), gaugeLengthMm: 100, bore: { kind: 'fixed', diameterMm: 12 } },
    ...{ boreDepthMm: 45, minimumGripMm: 36 },
    segments: [{ part: 'holder', lengthMm: 60, noseDiameterMm: 28, spindleDiameterMm: 32 }],
  })
  const machine = { name: 'Mill', taper: 'BT30', gaugeLineToTableMm: 500, zTravelMm: 400, maximumRpm: 10_000 }
  const flat = (powerKw: number) => [
    { rpm: 4000, powerKw },
    { rpm: 10_000, powerKw },
  ]
  const [strong, weak] = [uniqueCode('STRONG'), uniqueCode('WEAK')]
  await crib.post('/api/machines', { ...machine, code: strong, spindlePoints: flat(5) })
  await crib.post('/api/machines', { ...machine, code: weak, spindlePoints: flat(2) })

  await signIn(page, 'machinist')
  await page.goto(`/reach?cutter=${cutterId}&holder=${holder.body.id}&depth=20`)
  const cut = page.getByRole('region', { name: /^A cut with it, estimated/ })
  await cut.getByRole('button', { name: /^A cut with it, estimated/ }).click()
  await cut.getByLabel('Material cut').selectOption({ label: 'Carbon steel from 0.25 % C, annealed, 190 HB' })
  await expect(cut.getByRole('button', { name: /Medium carbon steel.*140 to 250 m\/min/ })).toBeVisible()
  await cut.getByLabel('Cutting speed').fill('180')
  await cut.getByLabel('Feed a tooth').fill('0.06')
  await expect(cut.getByText('The depth of cut is needed.')).toBeVisible()
  await cut.getByLabel('Depth of cut').fill('6')
  await cut.getByLabel('Stepover').fill('6')
  /*
   * By hand: n = 1000·180/(π·12) = 4774.6; vf = 4774.6·4·0.06 = 1145.9; a quarter turn in the cut, hm = 2·6·0.06/(12·π/2) =
   * 0.038197, kc = 1500·0.038197^−0.22 = 3076.5, P = 6·6·1145.9·3076.5/60e6 = 2.115 kW, M = 2115·60/(2π·4774.6) = 4.23 Nm.
   * One tooth bends it: 3076.5·6·0.038197 = 705.1 N, with a radial share of 0.4 705.1·√1.16 = 759.4 N.
   */
  await expect(cut.getByText('1146 mm/min')).toBeVisible()
  await expect(cut.getByText('759 N', { exact: true })).toBeVisible()
  await expect(cut.getByText('2.1 kW', { exact: true })).toBeVisible()
  await expect(cut.getByText('4.2 Nm', { exact: true })).toBeVisible()
  await expect(cut.getByText('No spindle’s curve is known here', { exact: false })).toBeVisible()
  await cut.getByLabel('Machine').selectOption({ label: `${weak} · Mill` })
  // 2.115 kW over the efficiency of 0.8; 2 kW at 4774.6 rpm are 4 Nm.
  await expect(cut.getByText(/does not drive it at 4.775 rpm: 2\.6 of 2 kW, 4\.2 of 4 Nm/)).toBeVisible()
  await cut.getByLabel('Machine').selectOption({ label: `${strong} · Mill` })
  await expect(cut.getByText(/The spindle drives it at 4.775 rpm: 2\.6 of 5 kW/)).toBeVisible()
  await cut.getByLabel('Stepover').fill('13')
  await expect(cut.getByText('The stepover is more than the diameter that cuts.')).toBeVisible()
  await expectAccessible(page, 'a cut estimated beside the reach check')
})
