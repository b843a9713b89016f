import fc from 'fast-check'
import { expect, test } from 'vitest'
import { readShare, writeShare } from '@/lib/core/plain/share'
import { readUnitPrice, writeUnitPrice } from '@/lib/core/plain/unit-price'
import { ok, refuse } from '@/lib/core/result'

test.each([
  ['0', 0],
  ['100', 10_000],
  ['2.5', 250],
  ['2,05', 205],
  [' 19 ', 1900],
  ['0.01', 1],
])('a share of "%s" %%', (text, basisPoints) => {
  expect(readShare(text)).toEqual(ok(basisPoints))
})

test.each(['', '-1', '1e1', '100.01', '101', '2.555', '1,000', '5 %'])('"%s" is no share', (text) => {
  expect(readShare(text)).toEqual(refuse('not_a_share'))
})

test('every share is read back as written', () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 10_000 }), (share) => {
      expect(readShare(writeShare(share))).toEqual(ok(share))
    }),
  )
  expect(() => writeShare(10_001)).toThrow('basisPoints')
  expect(() => writeShare(1.5)).toThrow('1.5')
})

test.each([
  ['0.12', 'EUR', '12'],
  ['0.0041', 'EUR', '0.41'],
  ['12,5', 'EUR', '1250'],
  ['3', 'JPY', '3'],
  ['0.4', 'JPY', '0.4'],
  ['1.2345', 'KWD', '1234.5'],
  ['007', 'EUR', '700'],
])('one piece at %s %s', (text, code, minor) => {
  expect(readUnitPrice(text, code)).toEqual(ok(minor))
})

test.each(['', '-1', '1e3', '1 000', '1.000,00', '0.123456789', '12345678901'])(
  '"%s" is no price',
  (text) => {
    expect(readUnitPrice(text, 'EUR')).toEqual(refuse('not_a_price'))
  },
)

test('every price is read back as written, whatever the currency', () => {
  const code = fc.constantFrom('EUR', 'JPY', 'KWD')
  const price = fc.tuple(fc.integer({ min: 0, max: 99_999_999 }), fc.integer({ min: 0, max: 999_999 }))
  fc.assert(
    fc.property(price, code, ([whole, millionths], currency) => {
      const behind = String(millionths).padStart(6, '0').replace(/0+$/, '')
      const text = behind === '' ? String(whole) : `${whole}.${behind}`
      expect(readUnitPrice(writeUnitPrice(text, currency), currency)).toEqual(ok(text))
    }),
  )
  expect(() => writeUnitPrice('-1', 'EUR')).toThrow('-1')
})
