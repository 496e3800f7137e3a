import type { CutterForm, Substrate } from '@/core/tooling'

/** What the trade calls each form. */
export const cutterFormNames: Readonly<Record<CutterForm, string>> = {
  square: 'Square end mill',
  cornerRadius: 'Corner radius end mill',
  ball: 'Ball end mill',
  tapered: 'Tapered end mill',
  drill: 'Drill',
  reamer: 'Reamer',
  tap: 'Tap',
  faceMill: 'Face mill',
  slotting: 'Slotting cutter',
  threadMill: 'Thread mill',
  chamfer: 'Chamfer mill',
}

export const substrateNames: Readonly<Record<Substrate, string>> = { carbide: 'Carbide', hss: 'HSS' }
