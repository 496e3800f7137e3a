import { expect, signIn, test } from '../support/browser'

test('on a phone the sentence and the drawing come first, and nothing runs off the side', async ({
  page,
}) => {
  await signIn(page, 'machinist')
  await page.goto(
    '/ball-speed?cuttingDiameterMm=6&depthOfCutMm=0.3&tiltDeg=30&spindleRpm=20000&stepoverMm=0.3',
  )
  await expect(page.getByText('The dead tip is out of the cut')).toBeInViewport()
  await expect(page.getByRole('img', { name: /^Drawing\. At/ })).toBeInViewport()
  const overrun = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  )
  expect(overrun).toBe(0)
})
