import type { Bar } from './read-pdf'

// Code set B of ISO/IEC 15417, table 1: bar and space widths of the values 0 to 102 (from memory; every pattern has
// eleven modules and an even number of black ones, which the test checks), and the start characters A, B, C.
const PATTERNS =
  `212222 222122 222221 121223 121322 131222 122213 122312 132212 221213 221312 231212 112232 122132 122231
113222 123122 123221 223211 221132 221231 213212 223112 312131 311222 321122 321221 312212 322112 322211 212123 212321
232121 111323 131123 131321 112313 132113 132311 211313 231113 231311 112133 112331 132131 113123 113321 133121 313121
211331 231131 213113 213311 213131 311123 311321 331121 312113 312311 332111 314111 221411 431111 111224 111422 121124
121421 141122 141221 112214 112412 122114 122411 142112 142211 241211 221114 413111 241112 134111 111242 121142 121241
114212 124112 124211 411212 421112 421211 212141 214121 412121 111143 111341 131141 114113 114311 411113 411311 113141
114131 311141 411131 211412 211214 211232`.split(/\s+/)
const STOP = '2331112'

export const isWellFormed = () =>
  PATTERNS.length === 106 &&
  PATTERNS.every((pattern) => {
    const widths = [...pattern].map(Number)
    const black = widths.filter((_, i) => i % 2 === 0).reduce((sum, width) => sum + width, 0)
    return widths.reduce((sum, width) => sum + width, 0) === 11 && black % 2 === 0
  })

/** Reads a drawn bar code as a scanner does, check character included; throws where it is none. */
export function readCode128(bars: readonly Bar[], moduleWidth: number): string {
  const row = [...bars].sort((a, b) => a.x - b.x)
  const widths = row.flatMap((bar, i) => {
    const next = row[i + 1]
    const gap = next ? [next.x - bar.x - bar.width] : []
    return [bar.width, ...gap].map((width) => Math.round(width / moduleWidth))
  })
  const body = widths.join('')
  if (!body.endsWith(STOP)) throw new Error(`no stop character in ${body}`)
  const values = (body.slice(0, -STOP.length).match(/.{6}/g) ?? []).map((pattern) =>
    PATTERNS.indexOf(pattern),
  )
  const check = values.pop()
  const sum = values.reduce((total, value, i) => total + value * Math.max(i, 1), 0)
  if (sum % 103 !== check) throw new Error(`check character ${check}, expected ${sum % 103}`)
  return lettersOf(values)
}

function lettersOf([start, ...values]: number[]): string {
  let set = start === 105 ? 'C' : start === 104 ? 'B' : 'A'
  let text = ''
  for (const value of values) {
    if (set === 'C' && value < 100) text += String(value).padStart(2, '0')
    else if (value === 99) set = 'C'
    else if (value === 100) set = 'B'
    else if (value === 101) set = 'A'
    else text += String.fromCharCode(value + 32)
  }
  return text
}
