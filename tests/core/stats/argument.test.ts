import { expect, test } from 'vitest'
import { finite, insideUnit, notNegative, positive, share, wholeFrom } from '@/lib/core/stats/argument'

test('good arguments come back as they were', () => {
  expect([
    wholeFrom(2, 'x', 2),
    positive('x', 1e-300),
    notNegative('x', 0),
    finite('x', -4),
    share('x', 1),
    insideUnit('x', 0.5),
  ]).toEqual([2, 1e-300, 0, -4, 1, 0.5])
})

test.each([
  [() => wholeFrom(2, 'n', 1), 'n must be a whole number from 2, got 1'],
  [() => wholeFrom(0, 'n', 2 ** 53), 'n must be a whole number from 0, got 9007199254740992'],
  [() => positive('a', 0), 'a must be a finite number above 0, got 0'],
  [() => positive('a', Number.POSITIVE_INFINITY), 'a must be a finite number above 0, got Infinity'],
  [() => notNegative('sd', -1), 'sd must be a finite number of 0 or more, got -1'],
  [() => finite('day', Number.NaN), 'day must be a finite number, got NaN'],
  [() => share('s', 1.5), 's must be from 0 to 1, got 1.5'],
  [() => insideUnit('p', 1), 'p must be above 0 and below 1, got 1'],
])('%o names argument and value', (call, message) => {
  expect(call).toThrow(new RangeError(message))
})
