import type { Condition, MovementKind } from '@/core/stock/kinds'

export const conditionNames: Readonly<Record<Condition, string>> = {
  new: 'New',
  used: 'Used',
  reground: 'Reground',
  worn: 'Worn',
}

export const movementNames: Readonly<Record<MovementKind, string>> = {
  receipt: 'Receipt',
  issue: 'Issue',
  return: 'Return',
  relocation: 'Relocation',
  transfer: 'Transfer',
  regrind: 'Regrind',
  scrap: 'Scrap',
  adjustment: 'Adjustment',
  reversal: 'Reversal',
}
