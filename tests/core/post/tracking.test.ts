import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { s10CheckDigit } from '@/lib/core/post/s10'
import { readTracking } from '@/lib/core/post/tracking'
import { ok, refuse } from '@/lib/core/result'

describe('readTracking', () => {
  test('a number of the post is verified: RR473124829GB, the example of UPU standard S10', () => {
    expect(readTracking(' rr 473 124 829 gb ')).toEqual(ok({ number: 'RR473124829GB', kind: 's10' }))
  })

  test('any other ninth digit is refused', () => {
    for (const digit of '012345678')
      expect(readTracking(`RR47312482${digit}GB`)).toEqual(refuse('check_digit'))
  })

  test.each(['00340434161094042557', '1Z999AA10123456784', 'H1001-2345', 'RR473124828'])(
    '%s is another carrier’s and cannot be verified',
    (number) => {
      expect(readTracking(number)).toEqual(ok({ number, kind: 'other' }))
    },
  )

  test.each([
    ['', 'characters'],
    ['NUMBERLESS', 'characters'],
    ['12<script>', 'characters'],
    ['１２３', 'characters'],
    ['1'.repeat(41), 'length'],
  ])('%s is refused: %s', (typed, reason) => {
    expect(readTracking(typed)).toEqual(refuse(reason))
  })

  test('every right number of the post passes, however it is spaced', () => {
    const serial = fc.integer({ min: 0, max: 99_999_999 }).map((n) => String(n).padStart(8, '0'))
    fc.assert(
      fc.property(serial, (eight) => {
        const number = `CP${eight}${s10CheckDigit(eight)}DE`
        expect(readTracking(number.split('').join(' '))).toEqual(ok({ number, kind: 's10' }))
      }),
    )
  })
})
