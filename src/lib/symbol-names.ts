/** The preferred name of each ISO 13399 symbol that stands anywhere in the product. */
export const symbolNames: Readonly<Record<string, string>> = {
  APMX: 'depth of cut maximum',
  BD: 'body diameter',
  BHTA: 'body half taper angle',
  DC: 'cutting diameter',
  DCN: 'cutting diameter minimum',
  DCONMS: 'connection diameter machine side',
  DCONWS: 'connection diameter workpiece side',
  DCONWSN: 'connection diameter workpiece side minimum',
  DCONWSX: 'connection diameter workpiece side maximum',
  DMM: 'shank diameter',
  DN: 'neck diameter',
  LB: 'body length',
  LCF: 'length chip flute',
  LSCN: 'clamping length minimum',
  LU: 'usable length',
  NOF: 'flute count',
  OAL: 'overall length',
  RE: 'corner radius',
  RPMX: 'rotational speed maximum',
  SIG: 'point angle',
}

/**
 * What a symbol beside a dimension stands for, in a sentence for hover; undefined where no ISO 13399 symbol is in it.
 *
 * @example
 * symbolTitle('LU · mm') // => 'LU: usable length (ISO 13399)'
 */
export function symbolTitle(text: string): string | undefined {
  const known = text.split(/[^A-Z]+/).flatMap((symbol) => {
    const name = Object.hasOwn(symbolNames, symbol) ? symbolNames[symbol] : undefined
    return name === undefined ? [] : [`${symbol}: ${name}`]
  })
  return known.length > 0 ? `${known.join('; ')} (ISO 13399)` : undefined
}
