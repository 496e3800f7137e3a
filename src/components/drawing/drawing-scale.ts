/** Scales a drawing office draws at (ISO 5455: 1, 2, 5 and their tens), with the halves between that it allows. */
const mantissas = [1, 1.5, 2, 2.5, 3, 4, 5, 7.5]

const scales = [0.01, 0.1, 1, 10, 100].flatMap((ten) => mantissas.map((mantissa) => mantissa * ten))

/** CSS px in a millimetre, on paper. */
export const pxPerMmOnPaper = 96 / 25.4

/**
 * The largest scale at which something of this size fits the room there is.
 *
 * @returns px a millimetre, and the scale as it is written in a title block.
 */
export function drawingScale(
  size: { widthMm: number; heightMm: number },
  room: { width: number; height: number },
): { pxPerMm: number; name: string } {
  const most = Math.min(room.width / size.widthMm, room.height / size.heightMm) / pxPerMmOnPaper
  const scale = scales.findLast((candidate) => candidate <= most) ?? scales[0] ?? 1
  return { pxPerMm: scale * pxPerMmOnPaper, name: scale >= 1 ? `${scale}:1` : `1:${trim(1 / scale)}` }
}

function trim(value: number): string {
  return String(Math.round(value * 100) / 100)
}
