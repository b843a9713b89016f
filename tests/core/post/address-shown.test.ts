import { expect, test } from 'vitest'
import { isAddressShown } from '@/lib/core/post/address-shown'

// Own rule: thirty days after 1 March 2027, 09:00, is 31 March, 09:00.
test.each([
  ['2027-03-01T09:00:00Z', true],
  ['2027-03-31T09:00:00Z', true],
  ['2027-03-31T09:00:01Z', false],
  ['2028-01-01T00:00:00Z', false],
])('delivered on 1 March 2027, at %s the address is shown: %s', (now, shown) => {
  expect(isAddressShown({ deliveredAt: new Date('2027-03-01T09:00:00Z'), now: new Date(now) })).toBe(shown)
})

test('what has not arrived is shown however old it is', () => {
  expect(isAddressShown({ deliveredAt: null, now: new Date('2040-01-01T00:00:00Z') })).toBe(true)
})
