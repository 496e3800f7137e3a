/** Scales a drawing office draws at (ISO 5455: 1, 2, 5 and their tens), with the halves between that it allows. */
const factors = [1, 10, 100].flatMap((ten) => [1, 1.5, 2, 2.5, 3, 4, 5, 7.5].map((step) => step * ten))

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
  const enlarged = factors.findLast((factor) => factor <= most)
  if (enlarged !== undefined) return { pxPerMm: enlarged * pxPerMmOnPaper, name: `${enlarged}:1` }
  const reduced = factors.find((factor) => 1 / factor <= most) ?? factors.at(-1) ?? 1
  return { pxPerMm: pxPerMmOnPaper / reduced, name: `1:${reduced}` }
}
