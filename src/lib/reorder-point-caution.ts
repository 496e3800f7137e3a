/** What may be wrong with a reorder point that can be: said beside the order-up-to level, never refused. */
export function reorderPointCaution({
  reorderPoint,
  orderUpTo,
}: {
  reorderPoint: number
  orderUpTo: number
}): string | null {
  if (reorderPoint !== orderUpTo) return null
  return 'Ordering up to the reorder point itself leaves the item low, so its alert stays open. Order up to more.'
}
