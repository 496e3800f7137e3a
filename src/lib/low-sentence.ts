import type { AlertResponse } from '@/schemas/reordering'

/** That an item has just become low, with what is left and the point it fell to. */
export function lowSentence(
  alert: Pick<AlertResponse, 'itemCode' | 'cribCode' | 'onHand' | 'position' | 'reorderPoint'>,
): string {
  const { itemCode, cribCode, onHand, position, reorderPoint } = alert
  const left = position === onHand ? `${onHand} left` : `${onHand} left, ${position} available and coming`
  const point = reorderPoint === null ? '' : `, reorder point ${reorderPoint}`
  return `${itemCode} is now low in ${cribCode}: ${left}${point}.`
}
