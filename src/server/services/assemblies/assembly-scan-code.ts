import bwipjs from 'bwip-js/node'
import { env } from '../../env'

export interface ScanCode {
  /** What a scanner reads out of it: the address of the assembly's page. */
  text: string
  /** Modules a side. */
  size: number
  /** The modules row by row, `1` dark. */
  rows: string[]
}

/** The code of an assembly's set-up sheet: a Data Matrix (ISO/IEC 16022) with the address of its page. */
export function assemblyScanCode(assemblyId: string): ScanCode {
  return scanCode(`${env().publicUrl.replace(/\/$/, '')}/assemblies/${assemblyId}`)
}

/** A text as a Data Matrix, module by module, so that it can be drawn as sharp as the paper. */
export function scanCode(text: string): ScanCode {
  const [symbol] = bwipjs.raw({ bcid: 'datamatrix', text })
  if (!symbol || !('pixs' in symbol)) throw new Error('The code came out as no matrix.')
  const { pixs, pixx, pixy } = symbol
  const rows = Array.from({ length: pixy }, (_, y) =>
    Array.from({ length: pixx }, (_cell, x) => (pixs[y * pixx + x] ? '1' : '0')).join(''),
  )
  return { text, size: pixx, rows }
}
