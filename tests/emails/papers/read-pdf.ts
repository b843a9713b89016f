import { inflateSync } from 'node:zlib'

export type Bar = { x: number; y: number; width: number; height: number }
export type PdfPage = {
  /** Texts in the order they were drawn, one per drawn line. */
  texts: string[]
  /** Filled rectangles. */
  bars: Bar[]
  /** The drawing operators as text. */
  operators: string
}

/** Reads what this project's papers are made of: enough of PDF 1.3 to see their words and bars, and nothing more. */
export function readPdf(pdf: Buffer): PdfPage[] {
  const objects = new Map<string, string>()
  for (const found of pdf.toString('latin1').matchAll(/^(\d+) 0 obj\n([\s\S]*?)\nendobj/gm)) {
    objects.set(found[1] ?? '', found[2] ?? '')
  }
  const of = (reference: string | undefined) => objects.get(reference ?? '') ?? ''
  const pages = [...objects.values()].filter((body) => /\/Type \/Page\b(?!s)/.test(body))
  return pages.map((page) => {
    const operators = streamOf(of(/\/Contents (\d+) 0 R/.exec(page)?.[1]))
    const resources = of(/\/Resources (\d+) 0 R/.exec(page)?.[1])
    const fonts = new Map<string, Map<string, string>>()
    for (const [, name, font] of resources.matchAll(/\/(F\d+) (\d+) 0 R/g)) {
      fonts.set(name ?? '', lettersOf(streamOf(of(/\/ToUnicode (\d+) 0 R/.exec(of(font))?.[1]))))
    }
    return { operators, texts: textsOf(operators, fonts), bars: barsOf(operators) }
  })
}

function streamOf(body: string): string {
  const start = body.indexOf('stream\n')
  if (start < 0) return ''
  const bytes = Buffer.from(body.slice(start + 7, body.lastIndexOf('\nendstream')), 'latin1')
  return (body.includes('/FlateDecode') ? inflateSync(bytes) : bytes).toString('latin1')
}

/** From glyph numbers to letters, as the paper itself says for readers that copy its text. */
function lettersOf(map: string): Map<string, string> {
  const letters = new Map<string, string>()
  for (const [, first, list] of map.matchAll(/<([0-9a-f]{4})> <[0-9a-f]{4}> \[([^\]]*)\]/gi)) {
    for (const [i, [, code]] of [...(list ?? '').matchAll(/<([0-9a-f]+)>/gi)].entries()) {
      const glyph = (parseInt(first ?? '', 16) + i).toString(16).padStart(4, '0')
      letters.set(
        glyph,
        Buffer.from(code ?? '', 'hex')
          .swap16()
          .toString('utf16le'),
      )
    }
  }
  return letters
}

function textsOf(operators: string, fonts: Map<string, Map<string, string>>): string[] {
  let letters = new Map<string, string>()
  const texts: string[] = []
  for (const [, font, shown] of operators.matchAll(
    /\/(F\d+) [\d.]+ Tf|\[((?:<[0-9a-f]*>|[\s\d.-])*)\] TJ/g,
  )) {
    if (font) letters = fonts.get(font) ?? new Map()
    else {
      const glyphs = [...(shown ?? '').matchAll(/<([0-9a-f]*)>/g)].flatMap(
        ([, hex]) => (hex ?? '').match(/.{4}/g) ?? [],
      )
      texts.push(glyphs.map((glyph) => letters.get(glyph) ?? '\uFFFD').join(''))
    }
  }
  return texts
}

const barsOf = (operators: string): Bar[] =>
  [...operators.matchAll(/([\d.]+) ([\d.]+) ([\d.]+) ([\d.]+) re\n(?:\/\w+ cs\n)?(?:[\d. ]+ scn\n)?f/g)].map(
    (found) => {
      const [x, y, width, height] = found.slice(1, 5).map(Number) as [number, number, number, number]
      return { x, y, width, height }
    },
  )
