import { describe, expect, test } from 'vitest'
import { ok, refuse } from '@/lib/core/result'
import { mayWithdraw } from '@/lib/core/states/withdrawal-guards'

// Source: product.md, "After the lock": by law until 14 days after the last piece arrived, others until packing.
const facts = { run: 'locked', state: 'paid', hasRight: true, endsOn: null, today: '2027-05-10' } as const

describe('mayWithdraw', () => {
  test.each(['reserved', 'balance_due', 'paid'] as const)(
    '%s is cancelled, with or without a right by law',
    (state) => {
      expect(mayWithdraw({ ...facts, state })).toEqual(ok('cancel'))
      expect(mayWithdraw({ ...facts, state, hasRight: false })).toEqual(ok('cancel'))
    },
  )
  test('packed is unpacked for who has the right, and refused to others', () => {
    expect(mayWithdraw({ ...facts, state: 'packed' })).toEqual(ok('cancel'))
    expect(mayWithdraw({ ...facts, state: 'packed', hasRight: false })).toEqual(refuse('packed_already'))
  })
  test('posted comes back until the last day, that day included, and without an end while it has not arrived', () => {
    const posted = { ...facts, state: 'posted' } as const
    expect(mayWithdraw(posted)).toEqual(ok('return'))
    expect(mayWithdraw({ ...posted, endsOn: '2027-05-10' })).toEqual(ok('return'))
    expect(mayWithdraw({ ...posted, endsOn: '2027-05-09' })).toEqual(refuse('withdrawal_over'))
    expect(mayWithdraw({ ...posted, hasRight: false })).toEqual(refuse('packed_already'))
    expect(mayWithdraw({ ...posted, run: 'closed' })).toEqual(ok('return'))
  })
  test('nothing before the lock, and nothing that has ended', () => {
    expect(mayWithdraw({ ...facts, run: 'taking_deposits' })).toEqual(refuse('run_not_locked'))
    for (const state of [
      'waiting',
      'awaiting_deposit',
      'cancelled',
      'expired',
      'lapsed',
      'withdrawn',
      'returned',
    ] as const)
      expect(mayWithdraw({ ...facts, state })).toEqual(refuse('not_allowed'))
  })
})
