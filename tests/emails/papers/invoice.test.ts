import { expect, test } from 'vitest'
import type { InvoicePaper } from '@/lib/contracts/papers'
import { invoicePdf } from '@/lib/papers/invoice'
import { readPdf } from './read-pdf'

const line = { quantity: 1, unitMinor: 0, setsOff: false, taxBasisPoints: 1900 }
// By hand: 119.00 holds 19.00 at 19 %; a payment of 23.80 before held 3.80.
const paper: InvoicePaper = {
  workshop: 'Hollow Pier Modular',
  size: 'A4',
  kind: 'final',
  number: 12,
  orderNumber: 7,
  issuedOn: '2027-03-03',
  corrects: null,
  seller: { name: 'Mara Quill', lines: ['Kaischuppen 9', '20457 Hamburg'], taxNumber: 'DE 1', taxNote: null },
  buyer: ['A. Berg', 'Hof 1', '89073 Ulm'],
  buyerVatNumber: null,
  currency: 'EUR',
  locale: 'en-GB',
  taxCountry: 'DE',
  isTaxedLater: false,
  lines: [
    { ...line, text: 'Rowlock, kit', grossMinor: 11900, taxMinor: 1900 },
    { ...line, text: 'Less invoice 3', grossMinor: -2380, taxMinor: -380, setsOff: true },
  ],
}
const textOf = async (given: InvoicePaper) =>
  readPdf(await invoicePdf(given))
    .flatMap(({ texts }) => texts)
    .join('\n')

test('an invoice names seller, buyer, number, day, each line and what is left to pay with its tax', async () => {
  const text = await textOf(paper)
  for (const words of [
    'Invoice',
    'Number 12',
    '3 March 2027',
    'Order 7',
    'Mara Quill',
    'DE 1',
    'Hof 1',
    'Rowlock, kit',
    'Less invoice 3',
  ])
    expect(text).toContain(words)
  expect(text).toContain('€80.00')
  expect(text).toContain('€15.20')
  expect(text).toContain('€95.20')
})

test('a paper without tax carries the sentence the law wants; one whose tax comes later says so', async () => {
  const free = {
    ...paper,
    seller: { ...paper.seller, taxNote: 'No tax under the rule for small businesses.' },
  }
  const lines = [{ ...line, taxBasisPoints: 0, text: 'Deposit', grossMinor: 2500, taxMinor: 0 }]
  expect(await textOf({ ...free, lines })).toContain('No tax under the rule for small businesses.')
  expect(await textOf({ ...free, lines, isTaxedLater: true })).toContain(
    'The tax falls due when the goods are posted',
  )
})

test('forty lines go on to a second sheet, none lost', async () => {
  const lines = Array.from({ length: 40 }, (_, i) => ({
    ...line,
    text: `Thing ${i + 1}`,
    grossMinor: 119,
    taxMinor: 19,
  }))
  const pages = readPdf(await invoicePdf({ ...paper, lines }))
  expect(pages.length).toBeGreaterThan(1)
  const texts = pages.flatMap((page) => page.texts)
  for (let i = 1; i <= 40; i += 1) expect(texts).toContain(`Thing ${i}`)
})
