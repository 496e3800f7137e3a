import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { drawingScale, pxPerMmOnPaper } from './drawing-scale'

const size = fc.double({ min: 0.5, max: 1000, noNaN: true })
const room = fc.integer({ min: 120, max: 2000 })

describe('drawingScale', () => {
  it('never draws past the room there is', () => {
    fc.assert(
      fc.property(size, size, room, room, (widthMm, heightMm, width, height) => {
        const { pxPerMm } = drawingScale({ widthMm, heightMm }, { width, height })
        expect(widthMm * pxPerMm).toBeLessThanOrEqual(width + 1e-9)
        expect(heightMm * pxPerMm).toBeLessThanOrEqual(height + 1e-9)
      }),
    )
  })

  it('names the scale it draws at', () => {
    fc.assert(
      fc.property(size, room, (widthMm, width) => {
        const { pxPerMm, name } = drawingScale({ widthMm, heightMm: 0.1 }, { width, height: 2000 })
        const [drawn = 0, real = 1] = name.split(':').map(Number)
        expect(pxPerMm / pxPerMmOnPaper).toBeCloseTo(drawn / real, 9)
      }),
    )
  })

  it('draws a small thing enlarged and a long one reduced', () => {
    expect(drawingScale({ widthMm: 38, heightMm: 3 }, { width: 800, height: 200 }).name).toBe('5:1')
    expect(drawingScale({ widthMm: 400, heightMm: 60 }, { width: 800, height: 200 }).name).toBe('1:2')
  })
})
