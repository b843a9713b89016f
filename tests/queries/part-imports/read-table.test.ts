import { describe, expect, test } from 'vitest'
import { matchColumns } from '@/lib/queries/part-imports/match-columns'
import { decodeText, delimiterOf, readTable } from '@/lib/queries/part-imports/read-table'
import { PART_HEADINGS } from '@/lib/contracts/parts-list'

const found = { encoding: null, delimiter: null }

describe('the encoding', () => {
  test.each<[string, Buffer, string, string]>([
    ['plain UTF-8', Buffer.from('10 µF; Ω', 'utf8'), 'utf-8', '10 µF; Ω'],
    ['UTF-8 with its mark', Buffer.from('\uFEFFcode', 'utf8'), 'utf-8', 'code'],
    ['UTF-16 with its mark', Buffer.from('\uFEFFµ', 'utf16le'), 'utf-16le', 'µ'],
    // 0xB5 is µ and 0xE4 is ä in Windows-1252; neither is UTF-8 on its own.
    ['Windows-1252', Buffer.from([0x31, 0xb5, 0x46, 0xe4]), 'windows-1252', '1µFä'],
  ])('of %s is found', (_, bytes, encoding, text) => {
    expect(decodeText(bytes, null)).toEqual({ ok: true, value: { encoding, text } })
  })

  test('a picture is no text', () => {
    const png = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 0x0d, 0x49, 0x48, 1, 2])
    expect(readTable(png, found)).toMatchObject({ ok: false, reason: 'not_text' })
  })
})

describe('the separator', () => {
  test.each([
    ['a,b,c\n1,2,3', 'comma'],
    ['a;b;c\n1,5;2;3', 'semicolon'],
    ['a\tb\n1;2,3\t4', 'tab'],
    ['code|value\nR|10k', 'pipe'],
    ['code,breaks\nR,"1: 0.02; 100: 0.01; 500: 0.005"', 'comma'],
  ])('of %j is the %s', (text, sign) => {
    expect(delimiterOf(text)).toBe(sign)
  })
})

test('lines keep the number they begin at, past empty ones and cells of several lines', () => {
  const text = 'code,note\n\nA,"two\nlines"\nB,one\n'
  const read = readTable(Buffer.from(text), found)
  expect(read.ok && read.value.lines.map(({ line, cells }) => [line, cells[0]])).toEqual([
    [4, 'A'],
    [5, 'B'],
  ])
})

test('a quotation mark left open is said with its line', () => {
  const text = 'code,value\nA,1\nB,"two" x\nC,3'
  expect(readTable(Buffer.from(text), found)).toMatchObject({ ok: false, reason: 'broken', line: 3 })
})

test('headings of other programs are understood, each of ours once', () => {
  const headings = ['Reference', 'Qty', 'Comment', 'MPN', 'Order code', 'Footprint']
  expect(matchColumns(headings, PART_HEADINGS)).toEqual(['designators', 'per_unit', 'value', 'code', '', ''])
  // A column called as ours comes before one that only means it, wherever it stands.
  expect(matchColumns(['MPN', 'Code'], PART_HEADINGS)).toEqual(['', 'code'])
})
