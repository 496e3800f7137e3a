/** A place on the sheet, in px, y down. */
export interface Point {
  x: number
  y: number
}

/**
 * The lines of ISO 128, as widths in px: outlines thick, everything that only explains thin, about two to one. Colours
 * are the page's tokens, so that a drawing turns with the scheme and prints black.
 */
export const lineWidths = { outline: 1.9, thin: 0.85 } as const

/** Long dash, gap, dot, gap: axes and lines of symmetry. */
export const chainDashes = '14 3 2 3'
/** Short dashes: clearance envelopes and what lies behind. */
export const hiddenDashes = '5 3'

export const draftingFontSize = 13
export const arrowLength = 9
export const arrowHalfWidth = 1.7

/** How far an extension line stands off what it measures, and how far it runs past the dimension line. */
export const extensionGap = 2.5
export const extensionOvershoot = 3

/** Distance between stacked dimension lines, and of the first from the outline. */
export const dimensionSpacing = 26

/** A close guess at how wide drafting text is set, good enough to decide whether it fits between two arrows. */
export function draftingTextWidth(text: string, fontSize: number = draftingFontSize): number {
  return text.length * fontSize * 0.52
}

/** Whether a dimension's figure stands between its arrows, and how far the line goes beyond each end where these turn. */
export function dimensionFit(spanPx: number, textWidthPx: number): { doesTextFit: boolean; tailPx: number } {
  const isTight = spanPx < 2 * arrowLength + 6
  return { doesTextFit: !isTight && spanPx >= textWidthPx + 6, tailPx: isTight ? arrowLength + 7 : 0 }
}

/** What a dimension takes up from its middle towards the end where a figure that does not fit is written. */
export function dimensionRoom(spanPx: number, text: string): number {
  const textWidthPx = draftingTextWidth(text)
  const { doesTextFit, tailPx } = dimensionFit(spanPx, textWidthPx)
  return spanPx / 2 + (doesTextFit ? 0 : tailPx + textWidthPx + 12)
}
