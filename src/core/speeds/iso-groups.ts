/** Groups of workpiece materials after ISO 513, in the order the standard lists them. */
export const isoGroups = ['P', 'M', 'K', 'N', 'S', 'H'] as const
export type IsoGroup = (typeof isoGroups)[number]

export const isoGroupNames: Readonly<Record<IsoGroup, string>> = {
  P: 'Steel',
  M: 'Stainless steel',
  K: 'Cast iron',
  N: 'Non-ferrous metals',
  S: 'Heat-resistant alloys and titanium',
  H: 'Hardened materials',
}
