/** A catalogue of any length that never was: the same number always makes the same rows. */

const makers = [
  'Norrhult',
  'Brackwater Tool',
  'Kollin',
  'Halden Works',
  'Tarnfield',
  'Ostby & Lund',
  'Varga Cut',
]
const coatings = ['TiAlN', 'AlCrN', 'uncoated', 'DLC', 'TiCN', 'diamond']
const lengths = ['stub', 'regular', 'long', 'extra long']
const uses = ['steel', 'stainless', 'aluminium', 'titanium', 'graphite', 'hardened', 'cast iron', 'plastics']
const forms = [
  'square',
  'square',
  'square',
  'ball',
  'ball',
  'corner radius',
  'corner radius',
  'drill',
  'drill',
  'chamfer',
]
const formNames: Readonly<Record<string, string>> = {
  square: 'End mill',
  ball: 'Ball nose',
  'corner radius': 'Corner radius end mill',
  drill: 'Drill',
  chamfer: 'Chamfer mill',
}
const shanksMm = [3, 4, 6, 8, 10, 12, 16, 20, 25, 32]

const headings =
  'Tool #,Description,Mfr,Mfr P/N,Price,Type,DC,RE,Taper/Side,SIG,Tip dia,APMX,LCF,DN,BHTA,LU,Transition angle,DMM,OAL,NOF,Material,RPMX,Unit,Coating,Remarks'

/** A list of cutters in 25 columns, as CSV: the shapes a shop has, so that every check of an import has its work. */
export function cutterCsv(count: number): string {
  const lines = Array.from({ length: count }, (_, at) => cutterRow(at).join(','))
  return `${headings}\r\n${lines.join('\r\n')}\r\n`
}

export function cutterCode(at: number): string {
  return `BIG-${String(at).padStart(6, '0')}`
}

function cutterRow(at: number): (string | number)[] {
  const form = forms[at % forms.length] ?? ''
  // Steps without a common factor, so that each property goes with every other one.
  const diameterMm = 1 + 0.5 * ((at * 7) % 39)
  const size = (at * 11) % lengths.length
  const use = uses[(at * 3) % uses.length]
  const coating = coatings[(at * 5) % coatings.length]
  const flutes = form === 'drill' ? 2 : 2 + (at % 5)
  const cutMm = form === 'chamfer' ? diameterMm : diameterMm * (2 + size)
  const fluteMm = cutMm + 2
  const isNecked = size > 1 && (form === 'ball' || form === 'square' || form === 'corner radius')
  const reachMm = fluteMm + 3 * diameterMm
  const shankMm = shanksMm.find((shank) => shank >= diameterMm) ?? 32
  const overallMm = Math.ceil(reachMm + 36)
  return [
    cutterCode(at),
    `"${formNames[form]} ${diameterMm} mm, ${lengths[size]}, for ${use}"`,
    makers[at % makers.length] ?? '',
    `${form.slice(0, 2).toUpperCase()}-${at % 997}-${Math.floor(at / 997)}`,
    (12 + (at % 400) / 4).toFixed(2),
    form,
    diameterMm,
    form === 'corner radius' ? diameterMm / 8 : '',
    '',
    form === 'drill' ? 140 : form === 'chamfer' ? 90 : '',
    form === 'chamfer' ? 0 : '',
    cutMm,
    fluteMm,
    isNecked ? (diameterMm * 0.94).toFixed(3) : '',
    '',
    isNecked ? reachMm : '',
    '',
    shankMm,
    overallMm,
    flutes,
    at % 9 === 0 ? 'HSS' : 'Carbide',
    Math.round(90_000 / diameterMm),
    'mm',
    coating ?? '',
    `"bought for job ${at % 211}, see sheet"`,
  ]
}

/** Opening stock of every third cutter, spread over these bins. */
export function stockCsv(count: number, bins: readonly { crib: string; bin: string }[]): string {
  const lines = ['Crib,Bin,Tool #,Qty on hand,Condition']
  for (let at = 0; at < count; at += 3) {
    const place = bins[(at / 3) % bins.length]
    if (place)
      lines.push(`${place.crib},${place.bin},${cutterCode(at)},${1 + (at % 20)},${at % 4 ? 'new' : 'used'}`)
  }
  return `${lines.join('\r\n')}\r\n`
}
