import { type ImportField, type ImportKind, importFields, importKinds } from '@/schemas/import-fields'
import { plainHeading } from './heading-name'

/**
 * What shops, makers' lists and programs head their columns with, beside a field's own name, label and symbol. What
 * could mean two things (`Length` of a cutter, `Taper`) is not here: the person says it once and the shop keeps it.
 */
const otherNames: Readonly<Record<string, string>> = {
  code:
    'code, own number, shop number, crib number, tool number, tool id, id, item code, item ' +
    'number, stock number, tool code, sku, internal number, our number, holder, holder ' +
    'number, holder id, collet number, extension number, shop code, tool, item, number',
  maker: 'maker, manufacturer name, make, maker name',
  partNumber:
    'part number, pn, maker pn, maker number, mfg part number, mfr part number, maker part ' +
    'number, catalog number, catalogue number, cat number, edp, edp number, order number, ' +
    'order code, article number, article, ordering code, mpn, part',
  description: 'description, text, name, tool description, item description, designation, tool name',
  unitCost: 'unit cost, cost, price, unit price, price each, cost each, net price, list price, each',
  rowUnit: 'unit, units, uom, unit of measure, inch metric, system, dimension unit',
  form:
    'form, type, tool type, cutter type, geometry, end, end type, end form, style, shape, ' +
    'tool form, end style, kind',
  cuttingDiameterMm:
    'cutting diameter, diameter, cutter diameter, mill diameter, drill diameter, tool ' +
    'diameter, cut diameter, d, d1, dc, size, flute diameter, drill size, cutting edge diameter, diameter cut, ' +
    'diameter d, diameter d1',
  cornerRadiusMm:
    'corner radius, corner r, radius, cr, nose radius, edge radius, re, tip radius, end ' +
    'radius, bull radius',
  taperHalfAngleDeg:
    'taper per side, taper half angle, taper angle per side, half taper, angle per side, ' +
    'taper side, half angle, taper angle a side, taper deg side',
  pointAngleDeg:
    'point angle, tip angle, included angle, drill point, point, drill point angle, chamfer ' +
    'angle included',
  tipDiameterMm: 'tip diameter, tip flat, chamfer tip diameter, small diameter, minimum cutting diameter',
  lengthOfCutMm:
    'length of cut, loc, cut length, cutting length, ap max, depth of cut maximum, maximum ' +
    'depth of cut, cutting edge length',
  fluteLengthMm: 'flute length, length of flute, fluted length, chip flute length',
  neckDiameterMm: 'neck diameter, relief diameter, neck, reduced diameter, clearance diameter',
  neckTaperHalfAngleDeg:
    'neck taper per side, neck taper, neck angle, neck taper half angle, body half taper ' + 'angle',
  reachLengthMm:
    'reach length, reach, usable length, length below shank, lbs, effective reach, neck ' +
    'reach, length to shank, overall reach, relieved length',
  neckTransitionAngleDeg: 'neck transition angle, transition angle, transition, shank transition angle',
  // d1 and d2 of a cutter are its cutting and its shank diameter in makers' tables (common practice); l1 and l2 are not
  // here, since one table's overall length is another's length of cut.
  shankDiameterMm:
    'shank diameter, shank, shank size, shaft diameter, shank d, d2, diameter shank, shank diameter d2, diameter d2',
  overallLengthMm: 'overall length, oal, total length, length overall, full length',
  fluteCount:
    'flute count, flutes, number of flutes, flute number, teeth, z, number of teeth, fl, ' +
    'zefp, effective teeth, tooth count',
  substrate:
    'substrate, material, tool material, cutting material, carbide hss, grade material, body ' + 'material',
  maximumRpm: 'maximum rpm, max rpm, rpm max, maximum speed, rpm, speed limit',
  taper: 'taper, spindle taper, shank, spindle, connection, interface, machine side, taper size, ' + 'mount',
  gaugeLengthMm:
    'gauge length, gage length, gl, projection, gauge line to nose, gauge, a, holder length, ' +
    'gauge line length',
  boreSeries:
    'collet series, collet, collet size, collet type, series, bore series, er size, collet ' + 'system',
  boreDiameterMm:
    'bore diameter, bore, hole diameter, clamping diameter, shank bore, inside diameter, bore ' +
    'size, clamp diameter, tool bore',
  boreDepthMm: 'bore depth, depth of bore, insertion depth, maximum insertion, shank depth, hole depth',
  minimumGripMm:
    'minimum grip, min grip, grip length, grip, minimum clamping length, clamping length ' +
    'minimum, minimum insertion, clamping length, min clamp length, grip minimum',
  nutTorqueNm: 'nut torque, nut torque nm, torque, tightening torque, clamping torque',
  gripStartMm: 'grip start, grip starts, grip offset, grip begins',
  sideLockInsertionMm: 'side lock insertion, sidelock insertion, set screw depth, flat position, side lock',
  segmentPart: 'part, segment part, nut or holder, segment type, section type',
  segmentNumber: 'segment number, segment order, position, pos, step, sequence, section number, order',
  segmentLengthMm: 'segment length, section length, step length, length',
  segmentNoseDiameterMm:
    'segment nose diameter, diameter nose end, front diameter, lower diameter, segment ' +
    'diameter, small end diameter, diameter at nose, nose end diameter, section diameter, ' +
    'diameter tool side, start diameter',
  segmentSpindleDiameterMm:
    'segment spindle diameter, spindle diameter, diameter spindle end, rear diameter, upper ' +
    'diameter, back diameter, diameter at spindle, spindle end diameter, diameter machine ' +
    'side, end diameter',
  nutDiameterMm: 'nut diameter, nut od, collet nut diameter, nut',
  nutLengthMm: 'nut length, nut height, collet nut length, nut thickness',
  noseDiameterMm: 'nose diameter, nose od, nose',
  noseLengthMm: 'nose length',
  bodyDiameterMm: 'body diameter, body od, holder diameter, od, outside diameter, outer diameter, body',
  bodyLengthMm: 'body length, holder body length',
  series: 'series, collet series, collet, type, collet type, system, style',
  minimumMm:
    'minimum, smallest shank, minimum diameter, clamping minimum, range minimum, from, ' +
    'capacity minimum, diameter minimum, minimum shank, minimum capacity, low',
  maximumMm:
    'maximum, largest shank, maximum diameter, clamping maximum, range maximum, to, capacity ' +
    'maximum, diameter maximum, maximum shank, maximum capacity, high',
  range: 'range, size range, clamping range, collapse range, capacity, grip range, holding range',
  lengthMm: 'length, overall length, oal, collet length',
  projectionMm:
    'projection, extension length, projection length, reach, extension projection, extension, ' +
    'projects, lpr',
  crib: 'crib, crib code, tool crib, store, warehouse, site, store room',
  location:
    'location, where, bin, bin code, location code, bin location, shelf, place, drawer bin, bin ' +
    'number, storage location',
  quantity:
    'quantity, qty, on hand, count, stock, pieces, qty on hand, quantity on hand, pcs, ' +
    'balance, opening stock',
  condition: 'condition, state, status, new used',
  reorderPoint:
    'reorder point, rop, reorder, reorder level, reorder at, minimum, minimum stock, minimum quantity, ' +
    'minimum on hand, minimum level, trigger, low at',
  orderUpTo:
    'order up to, order up to level, up to, maximum, maximum stock, maximum quantity, maximum on hand, ' +
    'maximum level, target, target stock, target level, fill to',
  packSize:
    'pack, pack size, package, package quantity, pack quantity, per pack, box, box quantity, multiple, order multiple',
  minimumOrder: 'minimum order, smallest order, moq, minimum order quantity',
  supplier: 'supplier, supplier name, vendor, vendor name, buy from, bought from',
  supplierPartNumber:
    'supplier number, supplier part number, supplier pn, supplier item number, supplier sku, vendor number, ' +
    'vendor part number, vendor pn, vendor item number',
  leadTimeDays: 'lead time, lead time days, lead days, delivery time, delivery days, delivery',
}

/** Where one name serves two fields of a kind, the field that has it. */
const ofKind: Partial<Record<ImportKind, Readonly<Record<string, string>>>> = {
  holders: { part: 'segmentPart' },
}

function namesOf(kind: ImportKind): Map<string, string> {
  const names = new Map<string, string>()
  const add = (name: string, field: string) => {
    if (name !== '' && !names.has(name)) names.set(name, field)
  }
  for (const field of importFields[kind])
    add(plainHeading(field.field.replace(/(?:Mm|Deg)$/, '')), field.field)
  for (const field of importFields[kind]) for (const symbol of symbolsOf(field)) add(symbol, field.field)
  for (const field of importFields[kind]) {
    add(plainHeading(field.label), field.field)
    for (const name of (otherNames[field.field] ?? '').split(', ')) add(plainHeading(name), field.field)
  }
  for (const [name, field] of Object.entries(ofKind[kind] ?? {})) names.set(plainHeading(name), field)
  return names
}

/** The field that has an ISO 13399 symbol, as it is written: in capitals. */
export function fieldOfSymbol(kind: ImportKind, symbol: string): string | undefined {
  return importFields[kind].find((field) => symbolsOf(field).includes(symbol.toLowerCase()))?.field
}

function symbolsOf(field: ImportField): string[] {
  return (field.symbol ?? '').toLowerCase().split(/,\s*/)
}

const known = new Map(importKinds.map((kind) => [kind, namesOf(kind)]))

/** The field a plain heading name or symbol stands for, or undefined where it is not known or not certain. */
export function fieldNamed(kind: ImportKind, name: string): string | undefined {
  return known.get(kind)?.get(name)
}
