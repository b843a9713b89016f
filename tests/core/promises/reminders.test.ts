import { expect, test } from 'vitest'
import { remindersOf } from '@/lib/core/promises/reminders'

test('before decide-by and after it, before each promise, in order; by the calendar', () => {
  const reminders = remindersOf({
    decideBy: '2028-03-01',
    postedBy: [{ offer: 'kit', on: '2028-03-31' }],
  })
  // 2028 has a 29 February: three days before 1 March is the 27th of it.
  expect(reminders.map(({ about, day }) => [about, day])).toEqual([
    ['decide_by', '2028-02-16'],
    ['decide_by', '2028-02-27'],
    ['decide_by', '2028-03-01'],
    ['posted_by', '2028-03-01'],
    ['decide_by', '2028-03-05'],
    ['posted_by', '2028-03-17'],
    ['posted_by', '2028-03-28'],
  ])
})

test('a day that is none is a bug of the caller', () => {
  expect(() => remindersOf({ decideBy: '2027-02-30', postedBy: [] })).toThrow(RangeError)
})
