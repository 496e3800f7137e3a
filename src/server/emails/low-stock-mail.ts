import { escapeHtml, type MailContent } from './mail-content'

export interface LowStockLine {
  itemCode: string
  description: string
  /** Bins of the crib, fullest first; none where it never lay in one. */
  places: readonly string[]
  onHand: number
  position: number
  reorderPoint: number | null
  suggestedQuantity: number | null
  supplierName: string | null
  supplierPartNumber: string | null
  leadTimeDays: number | null
  /** The item's own page, or the list where it has none. */
  url: string
  /** Between the alert and this mail the position rose above the point again. */
  isOverMeanwhile: boolean
}

export interface LowStock {
  shopName: string
  cribName: string
  /** The list of all that is low. */
  listUrl: string
  lines: readonly LowStockLine[]
}

/** Of a mail with many lines these are shown; the rest stands in the list. */
const mostLines = 50

/** Tells what fell to its reorder point: what, where, how many, from whom, how many to order, and where to look. */
export function lowStockMail(low: LowStock): MailContent {
  const shown = low.lines.slice(0, mostLines)
  const further = low.lines.length - shown.length
  return {
    subject: subjectOf(low),
    text: textOf(low, shown, further),
    html: htmlOf(low, shown, further),
  }
}

function subjectOf({ lines, cribName }: LowStock): string {
  const [only, ...others] = lines
  const what = only && others.length === 0 ? only.itemCode : `${lines.length} items`
  return `Low stock in ${cribName}: ${what}`
}

function introOf({ lines, cribName }: LowStock): string {
  return lines.length === 1
    ? `One item in ${cribName} has fallen to its reorder point.`
    : `${lines.length} items in ${cribName} have fallen to their reorder points.`
}

/** The facts of a line in the order a buyer asks for them. */
function factsOf(line: LowStockLine): [string, string][] {
  const facts: [string, string][] = [
    ['Bin', line.places.join(', ') || 'none yet'],
    ['On hand', String(line.onHand)],
    ['Available and coming', String(line.position)],
  ]
  if (line.reorderPoint !== null) facts.push(['Reorder point', String(line.reorderPoint)])
  if (line.suggestedQuantity !== null) facts.push(['Suggested order', String(line.suggestedQuantity)])
  facts.push(['Supplier', supplierOf(line)])
  return facts
}

function supplierOf(line: LowStockLine): string {
  if (line.supplierName === null) return 'none named'
  const number = line.supplierPartNumber === null ? '' : `, their number ${line.supplierPartNumber}`
  const days = line.leadTimeDays === null ? '' : `, ${line.leadTimeDays} days`
  return `${line.supplierName}${number}${days}`
}

const overMeanwhile = 'Meanwhile it is above its reorder point again.'

function furtherOf(further: number): string {
  return further === 1 ? 'One more stands in the list.' : `${further} more stand in the list.`
}

function textOf(low: LowStock, shown: readonly LowStockLine[], further: number): string {
  const parts = shown.map((line) =>
    [
      line.description ? `${line.itemCode}: ${line.description}` : line.itemCode,
      ...factsOf(line).map(([name, value]) => `  ${name}: ${value}`),
      ...(line.isOverMeanwhile ? [`  ${overMeanwhile}`] : []),
      `  ${line.url}`,
    ].join('\n'),
  )
  if (further > 0) parts.push(furtherOf(further))
  return [introOf(low), ...parts, `Everything that is low: ${low.listUrl}`, low.shopName]
    .filter((part) => part !== '')
    .join('\n\n')
    .concat('\n')
}

const cell = 'padding:2px 16px 2px 0;text-align:left;vertical-align:top'

function htmlOf(low: LowStock, shown: readonly LowStockLine[], further: number): string {
  const parts = shown.map((line) => {
    const facts = factsOf(line)
      .map(
        ([name, value]) =>
          `<tr><th style="${cell};font-weight:normal;color:#5a6470">${escapeHtml(name)}</th>` +
          `<td style="${cell}">${escapeHtml(value)}</td></tr>`,
      )
      .join('')
    return [
      '<h2 style="font-size:17px;margin:20px 0 4px">',
      `<a href="${escapeHtml(line.url)}">${escapeHtml(line.itemCode)}</a></h2>`,
      line.description ? `<p style="margin:0 0 4px">${escapeHtml(line.description)}</p>` : '',
      `<table style="border-collapse:collapse">${facts}</table>`,
      line.isOverMeanwhile ? `<p style="margin:4px 0 0">${overMeanwhile}</p>` : '',
    ].join('')
  })
  return [
    '<!doctype html><html lang="en"><head><meta charset="utf-8">',
    `<title>${escapeHtml(subjectOf(low))}</title></head>`,
    '<body style="font-family:sans-serif;font-size:15px;line-height:1.4;color:#1b1f24;background:#fff;margin:24px">',
    `<p>${escapeHtml(introOf(low))}</p>`,
    ...parts,
    further > 0 ? `<p>${furtherOf(further)}</p>` : '',
    `<p style="margin-top:24px"><a href="${escapeHtml(low.listUrl)}">Everything that is low</a></p>`,
    `<p style="color:#5a6470">${escapeHtml(low.shopName)}</p>`,
    '</body></html>',
  ].join('\n')
}
