import fc from 'fast-check'
import { expect, test } from 'vitest'
import { code128 } from '@/lib/papers/code-128'
import { fulfilmentListPdf } from '@/lib/papers/fulfilment-list'
import { groupByContents, toPick } from '@/lib/papers/group-by-contents'
import { packingSlipsPdf } from '@/lib/papers/packing-slips'
import { isWellFormed, readCode128 } from './read-code-128'
import { readPdf, type PdfPage } from './read-pdf'
import { built, kit, list, order, slips } from './sample-papers'

const MODULE_WIDTH = 0.95
const many = (count: number, note: string | null = null) =>
  Array.from({ length: count }, (_, i) =>
    order(String(1001 + i), { note, lines: i % 3 === 0 ? [built] : [kit] }),
  )

/** Bars that stand at one height are one code. */
const codesOn = ({ bars }: PdfPage) => {
  const rows = new Map<number, PdfPage['bars']>()
  for (const bar of bars) rows.set(bar.y, [...(rows.get(bar.y) ?? []), bar])
  return [...rows.values()].map((row) => readCode128(row, MODULE_WIDTH))
}

test('the list says what to take from the shelf and names every order once, its code reading as its number', async () => {
  const pages = readPdf(await fulfilmentListPdf(list(many(30))))
  const texts = pages.flatMap((page) => page.texts)
  // 10 of 30 orders hold 2 built modules each, the other 20 one kit each.
  expect(texts).toContain(
    '30 orders, 40 units, oldest promise first. Orders of the same contents stand together.',
  )
  expect(texts.join('\n')).toContain('20 ×\nFairlead, built and tested\n20 ×\nFairlead, kit;')
  const numbers = many(30).map(({ number }) => number)
  expect(texts.filter((text) => /^\d{4}$/.test(text)).sort()).toEqual(numbers)
  expect(pages.flatMap(codesOn).sort()).toEqual(numbers)
})

test('every sheet ends with its title block, counted', async () => {
  const pages = readPdf(await fulfilmentListPdf(list(many(60))))
  expect(pages.length).toBeGreaterThan(2)
  for (const [i, { texts }] of pages.entries()) {
    expect(texts.slice(-10)).toEqual([
      'What',
      'Fulfilment list: Fairlead, revision B, run 1',
      'Workshop',
      'Hollow Pier Modular',
      'Made by',
      'Lene Quast',
      'Made on',
      '20 September 2027',
      'Sheet',
      `${i + 1} of ${pages.length}`,
    ])
  }
})

test('a sheet that goes on says what its orders hold', async () => {
  const [, second] = readPdf(await fulfilmentListPdf(list(many(60))))
  expect(second?.texts[0]).toMatch(/\(continued\)$/)
})

test('letters beyond ASCII are printed', async () => {
  const name = 'Łódź Åse Őry Ħal İnce Șerban Žižek'
  const [page] = readPdf(await fulfilmentListPdf(list([order('1001', { name, country: 'PL' })])))
  expect(page?.texts.join(' ')).toContain('Łódź Åse Őry Ħal İnce')
  expect(page?.texts.join(' ')).not.toContain('could not be printed')
})

test('a letter the paper has not got leaves a mark and a word about it, on that sheet only', async () => {
  const orders = [order('1001', { name: 'Nguyễn Thị Mơ ก' }), ...many(40)]
  const [first, second] = readPdf(await fulfilmentListPdf(list(orders)))
  expect(first?.texts.join(' ')).toMatch(/Nguyễn Thị Mơ\s+\?/)
  expect(first?.texts.join(' ')).toContain('Some letters could not be printed as written')
  expect(second?.texts.join(' ')).not.toContain('could not be printed')
})

test('an empty list says so', async () => {
  const [page, ...more] = readPdf(await fulfilmentListPdf(list([])))
  expect(page?.texts).toContain('Nothing waits to be packed.')
  expect(more).toEqual([])
})

test('long notes push orders to the next sheet, never into the title block', async () => {
  const note = 'Put the invoice outside and leave the bag open. '.repeat(12)
  const pages = readPdf(await fulfilmentListPdf(list(many(25, note))))
  const lowest = pages.flatMap(({ operators }) =>
    [...operators.matchAll(/^1 0 0 1 [\d.]+ ([\d.]+) Tm/gm)].map((found) => Number(found[1])),
  )
  expect(pages.flatMap(codesOn)).toHaveLength(25)
  // Margin 42 and the block's own lowest line stand above the paper's edge.
  expect(Math.min(...lowest)).toBeGreaterThan(42)
})

test('papers are black on white', async () => {
  const papers = [await fulfilmentListPdf(list(many(5))), await packingSlipsPdf(slips())]
  for (const { operators } of papers.flatMap(readPdf)) {
    const colours = [...operators.matchAll(/^([\d. ]+) (?:scn|SCN|rg|RG|g|G)$/gm)].map((found) => found[1])
    expect(new Set(colours.flatMap((colour) => colour?.split(' ')))).toEqual(new Set(['0']))
  }
})

test('a slip names the order, the parcel, both addresses and every line', async () => {
  const [page] = readPdf(await packingSlipsPdf(slips()))
  const text = page?.texts.join('\n') ?? ''
  for (const part of [
    'Order 1042\nParcel 1 of 2',
    'Mara Quill\nHollow Pier Modular\nAm Kai 3\n20457 Hamburg\nGERMANY',
    'Hanako Mori\n1-2 Honmachi, Minato-ku\nTokyo 105-0001\nJAPAN',
    '1\nFairlead, kit\nFront panel finish: sand\nKnob colour: slate',
    '2\nFairlead, built and tested\nSerial numbers FL-B-0031, FL-B-0032',
    'The rest of the order comes in another parcel.',
    'https://brimline.example/account/orders/7c0e',
    'This is not an invoice.',
  ]) {
    expect(text).toContain(part)
  }
  expect(page && codesOn(page)).toEqual(['1042'])
})

test('each slip counts its own sheets', async () => {
  const [slip] = slips().slips
  const long = { ...slip!, orderNumber: '1043', lines: Array.from({ length: 15 }, () => kit) }
  const pages = readPdf(
    await packingSlipsPdf(slips({ slips: [slip!, long, { ...slip!, orderNumber: '1044' }] })),
  )
  expect(pages.map(({ texts }) => texts.at(-1))).toEqual(['1 of 1', '1 of 2', '2 of 2', '1 of 1'])
  expect(pages.flatMap(codesOn)).toEqual(['1042', '1043', '1044'])
})

test('a replacement says so, and the last parcel promises no other', async () => {
  const [slip] = slips().slips
  const replaced = readPdf(await packingSlipsPdf(slips({ slips: [{ ...slip!, isReplacement: true }] })))[0]
  expect(replaced?.texts).toContain('Replacement')
  expect(replaced?.texts.join(' ')).not.toContain('comes in another parcel')
  const last = readPdf(await packingSlipsPdf(slips({ slips: [{ ...slip!, parcel: { nth: 2, of: 2 } }] })))[0]
  expect(last?.texts.join(' ')).not.toContain('comes in another parcel')
})

test('an address in a script without letters here is left out whole, and said so', async () => {
  const [slip] = slips().slips
  const own = { ...slip!, toOwnScript: ['สมชาย ใจดี', 'ถนนสุขุมวิท 1'] }
  const text =
    readPdf(await packingSlipsPdf(slips({ slips: [own] })))[0]
      ?.texts.join(' ')
      .replaceAll(/\s+/g, ' ') ?? ''
  expect(text).toContain('own script is on the screen')
  expect(text).not.toContain('ถนน')
  expect(text).not.toContain('??')
})

test('US Letter is 612 by 792 points, A4 595.28 by 841.89', async () => {
  const sizeOf = async (size: 'A4' | 'Letter') =>
    /\/MediaBox \[([^\]]+)\]/.exec((await packingSlipsPdf(slips({ size }))).toString('latin1'))?.[1]
  expect(await sizeOf('Letter')).toBe('0 0 612 792')
  expect(await sizeOf('A4')).toBe('0 0 595.28 841.89')
})

test('the table of the independent reader is one', () => {
  expect(isWellFormed()).toBe(true)
})

test('any order number reads back from its bars', () => {
  const drawn = (text: string) => {
    let x = 0
    return code128(text).flatMap((width, i) => {
      const bar = { x, y: 0, width, height: 10 }
      x += width
      return i % 2 === 0 ? [bar] : []
    })
  }
  const number = fc.stringMatching(/^[ -~]{1,20}$/)
  fc.assert(fc.property(number, (text) => readCode128(drawn(text), 1) === text))
})

test.each(['', 'Ü1', '10\n42', '森'])('a number that Code 128 cannot carry throws: %j', (text) => {
  expect(() => code128(text)).toThrow(RangeError)
})

const lineOf = fc.record({
  module: fc.constantFrom('Fairlead', 'Kedge'),
  offer: fc.constantFrom('kit' as const, 'built' as const),
  quantity: fc.integer({ min: 1, max: 4 }),
  choices: fc.shuffledSubarray(['sand', 'slate']),
  serials: fc.constant([]),
})
const ordersOf = fc
  .array(fc.array(lineOf, { minLength: 1, maxLength: 3 }), { maxLength: 12 })
  .map((all) => all.map((lines, i) => order(String(i), { lines })))

test('grouping loses no order, keeps their turn, and puts only equals together', () => {
  fc.assert(
    fc.property(ordersOf, (orders) => {
      const groups = groupByContents(orders)
      const firsts = groups.map((group) => Number(group.orders[0]?.number))
      expect(
        groups
          .flatMap((group) => group.orders)
          .map(({ number }) => number)
          .sort(),
      ).toEqual(orders.map(({ number }) => number).sort())
      expect(firsts).toEqual([...firsts].sort((a, b) => a - b))
      for (const group of groups) {
        const picks = group.orders.map((one) =>
          JSON.stringify(
            toPick([one])
              .map((pick) => pick.quantity)
              .sort(),
          ),
        )
        expect(new Set(picks).size).toBe(1)
      }
    }),
  )
})

test('what is taken from the shelf is what the orders hold', () => {
  const total = (lines: readonly { quantity: number }[]) =>
    lines.reduce((sum, line) => sum + line.quantity, 0)
  fc.assert(
    fc.property(ordersOf, (orders) => {
      expect(total(toPick(orders))).toBe(total(orders.flatMap((one) => one.lines)))
    }),
  )
})

test.each([
  ['de', 'Packzettel', 'Bestellung 1042', 'Fairlead, Bausatz', 'Dies ist keine Rechnung.'],
  ['fr', 'Bon de colisage', 'Commande 1042', 'Fairlead, kit à monter', 'Ceci n’est pas une facture.'],
  ['es', 'Nota de embalaje', 'Pedido 1042', 'Fairlead, kit para montar', 'Esto no es una factura.'],
] as const)(
  'a slip speaks %s where the buyer does; its title block stays the packer’s',
  async (language, ...said) => {
    const [slip] = slips().slips
    const [page] = readPdf(await packingSlipsPdf(slips({ slips: [{ ...slip!, language }] })))
    for (const words of said) expect(page?.texts.join('\n')).toContain(words)
    expect(page?.texts).toContain('Packing slip, Order 1042, Parcel 1 of 2')
  },
)

test('what is to be taken stands in the order of the shelf, place 2 before place 10, what has none last', () => {
  const at = (place: string, module: string) => order('1', { lines: [{ ...kit, module, place }] })
  const picks = toPick([at('Shelf 10', 'C'), at('', 'D'), at('Shelf 2', 'B')])
  expect(picks.map(({ module }) => module)).toEqual(['B', 'C', 'D'])
})
