import { expect, test, describe } from 'vitest'
import { LABEL_SIZES, type PaperKind, SHEET_SIZES } from '@/lib/contracts/packing'
import type { BagList, ParcelPaper, PaperIssue } from '@/lib/contracts/papers'
import { declarationSentence } from '@/lib/messages/declaration'
import { paperPdf } from '@/lib/papers/paper-pdf'
import { buildPaper } from '@/lib/papers/parcel-papers'
import { readPdf } from './read-pdf'
import { codesOf, textsOf } from './render'
import { issue } from './sample-papers'
import { parcel, parcelPapers, samples } from './sample-parcels'

const bag: BagList = {
  what: 'Fairlead, revision B, kit',
  choices: ['Knob colour: slate'],
  bags: 17,
  parts: [
    { quantity: 4, name: 'Potentiometer', value: 'B100K', place: 'Drawer 3', designators: 'RV1-RV4' },
    { quantity: 12, name: 'Jack', value: '', place: 'Drawer 1', designators: 'J1-J12' },
  ],
}
const print = (kind: PaperKind, parcels: readonly ParcelPaper[], size: PaperIssue['size'] = 'A4') => {
  const { name, parts } = buildPaper(kind, parcelPapers(parcels), [bag])
  return paperPdf({ ...issue, size }, name, parts)
}

// Other programs read the papers back, which takes its time on a busy machine.
describe('papers of parcels', { timeout: 120_000 }, () => {
  describe.each(LABEL_SIZES)('labels on %s', (size) => {
    test('one sheet each, with every line of both scripts, and bars another program reads', async () => {
      const pdf = await print('labels', samples, size)
      const texts = textsOf(pdf)
      expect(texts).toHaveLength(samples.length)
      for (const [i, { to, toOwnScript }] of samples.entries())
        for (const line of [...to, ...(toOwnScript ?? [])]) expect(texts[i]).toContain(line)
      expect(codesOf(pdf)).toEqual(
        samples.map(({ orderNumber, tracking }) => [orderNumber, ...(tracking ? [tracking] : [])].sort()),
      )
    })
  })

  test('nothing on a label is lost: no letter stands for one that could not be printed', async () => {
    for (const text of textsOf(await print('labels', samples, 'A6'))) expect(text).not.toContain('?')
  })

  test('sizes in points: 4 × 6 in, 100 × 150 mm, A6, roll 62 mm', async () => {
    const sizeOf = async (size: PaperIssue['size']) =>
      /MediaBox \[0 0 ([\d.]+) ([\d.]+)\]/.exec((await print('labels', [parcel()], size)).toString('latin1'))
    expect((await sizeOf('4x6'))?.slice(1).map(Number)).toEqual([288, 432])
    // 100 mm is 283.46 points, 150 mm 425.20; 105 × 148 mm is 297.64 × 419.53; 62 mm is 175.75.
    for (const [size, width] of [
      ['100x150', 283.46],
      ['A6', 297.64],
      ['roll62', 175.75],
    ] as const)
      expect(Number((await sizeOf(size))?.[1])).toBeCloseTo(width, 1)
  })

  test('a customs form states what is in the parcel, its weight, value, code and origin, and who signs', async () => {
    const [full, small] = textsOf(await print('customs', [samples[1]!, samples[5]!]))
    for (const words of [
      'Customs declaration CN 23',
      '1 × Kit for an audio',
      '380',
      '420',
      '€165.00',
      '8543709000',
      'DE',
      'P123456789012',
      'collected from the addressee',
      'Lene Quast, 2027-09-20',
      'Mara Quill',
      'Kim Min-jun',
    ])
      expect(full).toContain(words)
    expect(small).toContain('Customs declaration CN 22')
    expect(small).toContain('€165.00')
    expect(small).not.toContain('Gross weight')
  })

  test('inside the customs area there is no form and no invoice; the small form needs no invoice', () => {
    const kinds = (kind: PaperKind) => buildPaper(kind, parcelPapers(), []).parts.length
    expect(kinds('customs')).toBe(4)
    expect(kinds('invoices')).toBe(3)
    expect(kinds('labels')).toBe(6)
  })

  test('a parcel whose declaration lacks something gets no label, form or invoice, and is named with a sentence', () => {
    const problems = [{ field: 'lines.0.code', problem: 'missing', severity: 'error' }] as const
    const stopped = parcel({ customs: { ...parcel().customs, problems } })
    for (const kind of ['labels', 'customs', 'invoices'] as const) {
      const { parts, blocked } = buildPaper(kind, parcelPapers([stopped, samples[1]!]), [])
      expect(parts).toHaveLength(1)
      expect(blocked).toEqual([stopped])
    }
    expect(declarationSentence(problems[0])).toBe(
      'Customs want the customs code, and it is missing. The owner enters it at the offer, under “Post and customs”.',
    )
    const asked = [{ field: 'from.eori', problem: 'missing', severity: 'ask' }] as const
    const free = parcel({ customs: { ...parcel().customs, problems: asked } })
    expect(buildPaper('labels', parcelPapers([free]), []).blocked).toEqual([])
  })

  test('a commercial invoice adds up and says why nothing was paid for a replacement', async () => {
    const two = { ...parcel().customs.lines[0]!, quantity: 2, value: 33_000 as never }
    const customs = { ...parcel().customs, lines: [two], valueMinor: 33_000 }
    const [text] = textsOf(await print('invoices', [parcel({ customs, isReplacement: true })]))
    for (const words of ['1042-7', '€165.00', '€330.00', 'Replacement free of charge', 'JAPAN'])
      expect(text).toContain(words)
  })

  test('a return slip names the things and where they go back to, its bars read as the order', async () => {
    const pdf = await print('returns', [samples[3]!])
    const [text] = textsOf(pdf)
    for (const words of ['Am Kai 3', 'Fairlead, built and tested', 'FL-B-0031', 'Does not work'])
      expect(text).toContain(words)
    expect(codesOf(pdf)).toEqual([['1045']])
  })

  test('a bag list counts a bag and all of them', async () => {
    const [text] = textsOf(await print('bags', []))
    // 17 bags of 4 potentiometers are 68; 17 of 12 jacks are 204.
    for (const words of ['17 bags', '68', '204', 'Drawer 3', 'RV1-RV4', 'Knob colour: slate'])
      expect(text).toContain(words)
  })

  test('a hand-over list counts and weighs what it names', async () => {
    const [text] = textsOf(await print('hand-over', samples))
    // Six parcels of 420 g.
    expect(text).toContain('6 parcels, 2520 g together.')
    expect(text).toContain('RR473124829GB')
  })

  test('a list longer than a sheet repeats its headings and counts its sheets', async () => {
    const many = Array.from({ length: 80 }, (_, i) =>
      parcel({ orderNumber: String(2000 + i), number: i + 1 }),
    )
    const texts = textsOf(await print('hand-over', many, 'Letter'))
    expect(texts.length).toBeGreaterThan(1)
    for (const [i, text] of texts.entries()) {
      expect(text).toContain(`${i + 1} of ${texts.length}`)
      if (i < texts.length - 1) expect(text).toContain('Tracking')
    }
    for (let i = 0; i < 80; i += 1) expect(texts.join('\n')).toContain(String(2000 + i))
  })

  test('two hundred labels are one file, and no more than a sheet or two is kept while it is made', async () => {
    const many = Array.from({ length: 200 }, (_, i) =>
      parcel({ ...samples[i % samples.length]!, orderNumber: String(3000 + i), number: i + 1 }),
    )
    const pdf = await print('labels', many, 'A6')
    const pages = readPdf(pdf)
    expect(pages).toHaveLength(200)
    expect(textsOf(pdf)[199]).toContain('3199')
    // The faces are in the file once, as the letters that were used.
    expect(pdf.byteLength).toBeLessThan(1_500_000)
  })

  test.each(SHEET_SIZES)('every paper is made on %s', async (size) => {
    for (const kind of ['labels', 'customs', 'invoices', 'returns', 'bags', 'hand-over'] as const)
      expect(readPdf(await print(kind, samples, size)).length).toBeGreaterThan(0)
  })
})
