import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { parseS10, s10CheckDigit } from '@/lib/core/post/s10'
import { refuse } from '@/lib/core/result'

const eightDigits = fc.integer({ min: 0, max: 99_999_999 }).map((n) => String(n).padStart(8, '0'))

describe('s10CheckDigit', () => {
  // Universal Postal Union, S10: the standard's own example and the two exceptions of its rule.
  test.each([
    ['47312482', 9],
    ['00000008', 0],
    ['00000015', 5],
  ])('%s has check digit %i', (digits, check) => expect(s10CheckDigit(digits)).toBe(check))

  test('equals the digit found by trying: the weighted sum and the digit together divide by 11', () => {
    // Second way, from the weights alone: S + c ≡ 0 (mod 11) except where the rule maps 10 to 0 and 11 to 5.
    fc.assert(
      fc.property(eightDigits, (digits) => {
        const sum = [...digits].reduce((s, d, i) => s + Number(d) * Number('86423597'[i]), 0)
        const exact = [0, 1, 2, 3, 4, 5, 6, 7, 8, 9].filter((c) => (sum + c) % 11 === 0)
        const expected = sum % 11 === 0 ? 5 : (exact[0] ?? 0)
        return s10CheckDigit(digits) === expected
      }),
    )
  })

  test('two neighbouring digits changed places are noticed unless they fall on the same exception', () => {
    fc.assert(
      fc.property(eightDigits, fc.integer({ min: 0, max: 6 }), (digits, i) => {
        const swapped = digits.slice(0, i) + digits[i + 1] + digits[i] + digits.slice(i + 2)
        const check = s10CheckDigit(digits)
        return swapped === digits || check === 0 || check === 5 || s10CheckDigit(swapped) !== check
      }),
    )
  })

  test.each(['', '1234567', '123456789', '1234567a', '١٢٣٤٥٦٧٨'])('throws on %j', (digits) =>
    expect(() => s10CheckDigit(digits)).toThrow(RangeError),
  )
})

describe('parseS10', () => {
  test('forgives spaces and case', () => {
    expect(parseS10(' rr 473 124 829 gb ')).toEqual({
      ok: true,
      value: { number: 'RR473124829GB', service: 'RR', serial: '47312482', checkDigit: 9, country: 'GB' },
    })
  })

  test.each([
    ['RR47312482GB', 'length'],
    ['', 'length'],
    ['RR4731248299GB', 'length'],
    ['RR47312482-GB', 'characters'],
    ['R1473124829GB', 'characters'],
    ['RRA73124829GB', 'characters'],
    ['RR473124829QQ', 'country'],
    ['RR473124829XK', 'country'],
    ['RR473124820GB', 'check_digit'],
  ] as const)('refuses %j as %s', (text, reason) => expect(parseS10(text)).toEqual(refuse(reason)))

  test('reads every number built by the rule', () => {
    fc.assert(fc.property(eightDigits, (digits) => parseS10(`cp${digits}${s10CheckDigit(digits)}de`).ok))
  })
})
