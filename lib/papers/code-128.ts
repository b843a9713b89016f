import barcodes from 'bwip-js/node'

/** Bars and spaces in turn, a bar first, each as a count of modules. */
type Widths = readonly number[]

/** Modules a scanner needs blank on either side (ISO/IEC 15417: ten). */
export const QUIET_MODULES = 10

/**
 * The bars of a text in Code 128.
 * Domain: printable ASCII → otherwise RangeError.
 */
export function code128(text: string): Widths {
  if (!/^[\x20-\x7e]+$/.test(text)) throw new RangeError(`code128: text must be printable ASCII, got ${text}`)
  const [symbol] = barcodes.raw('code128', text)
  if (!symbol || !('sbs' in symbol)) throw new Error('The barcode package answered without bars.')
  return symbol.sbs
}
