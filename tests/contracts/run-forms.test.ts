import { describe, expect, test } from 'vitest'
import { isConfirmedBy } from '@/lib/contracts/bulk'
import { atTypedRows, readLockForm, readRunForm, readTypedForm } from '@/lib/contracts/run-forms'

describe('a run as its form sends it', () => {
  test('leaves out offers without a date, and an empty head start', () => {
    const row = { offer: 'kit', postedBy: '2027-09-30' }
    expect(readRunForm({ headStartHours: '', offers: [{ offer: 'boards', postedBy: ' ' }, row] })).toEqual({
      offers: [row],
    })
    expect(readRunForm({ headStartHours: '0', offers: 'none' })).toEqual({ headStartHours: '0', offers: [] })
  })

  test('has its sentences back at the rows as they were typed', () => {
    const values = {
      'offers.0.postedBy': '',
      'offers.1.postedBy': '2027-09-30',
      'offers.2.postedBy': '2027-10-30',
    }
    const errors = { minimum: 'M.', 'offers.0.depositMinor': 'A.', 'offers.1.priceMinor': 'B.' }
    expect(atTypedRows({ values, errors }, 'offers', 'postedBy')).toEqual({
      minimum: 'M.',
      'offers.1.depositMinor': 'A.',
      'offers.2.priceMinor': 'B.',
    })
  })
})

test('a lock drops lines without a reason, and always carries the typed words', () => {
  const waivers = [
    { key: 'quotes', reason: ' ' },
    { key: 'repay', reason: 'I pay it in.' },
  ]
  expect(readLockForm({ waivers })).toEqual({ waivers: [waivers[1]], typed: '' })
  expect(readTypedForm({ typed: 'x' })).toEqual({ typed: 'x' })
})

test.each([
  ['lock rowlock', true],
  ['  LOCK   Rowlock ', true],
  ['lockrowlock', false],
  ['lock', false],
  ['', false],
])('typed words "%s": %s', (typed, is) => {
  expect(isConfirmedBy(typed, 'lock rowlock')).toBe(is)
})
