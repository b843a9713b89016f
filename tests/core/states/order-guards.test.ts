import { describe, expect, test } from 'vitest'
import { ok, refuse } from '@/lib/core/result'
import { ORDER_MOVES } from '@/lib/core/states/order'
import {
  isOrderAtEnd,
  mayAccept,
  mayAskBalance,
  mayCancelFreely,
  mayLapse,
  mayPack,
  mayPlace,
  mayRefund,
  mayReserveLate,
} from '@/lib/core/states/order-guards'
import { statesOf } from '@/lib/core/states/next'

test('the ends of an order', () => {
  expect(statesOf(ORDER_MOVES).filter(isOrderAtEnd).toSorted()).toEqual([
    'cancelled',
    'expired',
    'lapsed',
    'posted',
    'returned',
  ])
})

describe('mayPlace', () => {
  const facts = {
    run: 'taking_deposits',
    today: '2026-04-01',
    decideBy: '2026-04-01',
    openToThem: true,
    units: 2,
    unitsBefore: 0,
    limit: 2,
    free: 2,
    waiting: 0,
  } as const
  test.each([
    [{}, ok('place')],
    [{ free: 1 }, ok('queue')],
    [{ free: 0 }, ok('queue')],
    [{ waiting: 1, free: 10 }, ok('queue')],
    [{ run: 'locked' }, refuse('run_not_open')],
    [{ run: 'draft' }, refuse('run_not_open')],
    [{ today: '2026-04-02' }, refuse('decide_by_past')],
    [{ openToThem: false }, refuse('not_open_to_all_yet')],
    [{ unitsBefore: 1 }, refuse('limit_reached')],
  ] as const)('%j', (change, result) => {
    expect(mayPlace({ ...facts, ...change })).toEqual(result)
  })
  test.each([0, -1, 1.5, NaN])('throws for %d units', (units) => {
    expect(() => mayPlace({ ...facts, units })).toThrow(/units/)
    expect(() => mayPlace({ ...facts, units })).toThrow(RangeError)
  })
})

describe('payments', () => {
  const asked = { amount: 2500, currency: 'EUR', order: 'a' }
  test.each([
    [asked, ok(true)],
    [{ ...asked, amount: 2400 }, refuse('amount_differs')],
    [{ ...asked, currency: 'USD' }, refuse('currency_differs')],
    [{ ...asked, order: 'b' }, refuse('order_differs')],
  ])('arrived %j', (arrived, result) => {
    expect(mayAccept(asked, arrived)).toEqual(result)
  })

  test.each([
    ['taking_deposits', 2, ok(true)],
    ['taking_deposits', 1, refuse('no_place')],
    ['locked', 2, refuse('run_not_open')],
    ['called_off', 2, refuse('run_not_open')],
  ] as const)('late, %s with %i free', (run, free, result) => {
    expect(mayReserveLate({ run, units: 2, free })).toEqual(result)
  })

  test.each([
    [2000, 500, false, ok(true)],
    [2000, 501, false, refuse('more_than_paid')],
    [0, 2500, true, refuse('disputed')],
  ])('refunded %i, now %i, disputed %s', (refundedMinor, amountMinor, disputed, result) => {
    expect(mayRefund({ disputed, capturedMinor: 2500, refundedMinor, amountMinor })).toEqual(result)
  })
  test.each([0, -5, 0.5])('throws for a refund of %d', (amountMinor) => {
    const facts = { disputed: false, capturedMinor: 2500, refundedMinor: 0, amountMinor }
    expect(() => mayRefund(facts)).toThrow(/amountMinor/)
  })
})

test.each([
  ['taking_deposits', ok(true)],
  ['locked', refuse('run_locked')],
  ['closed', refuse('run_locked')],
] as const)('cancelling freely while the run is %s', (run, result) => {
  expect(mayCancelFreely(run)).toEqual(result)
})

describe('balances', () => {
  test.each([
    [{}, ok(true)],
    [{ run: 'taking_deposits' }, refuse('run_not_locked')],
    [{ dueMinor: 0 }, refuse('nothing_due')],
    [{ disputed: true }, refuse('disputed')],
  ] as const)('ask %j', (change, result) => {
    expect(mayAskBalance({ run: 'locked', dueMinor: 16400, disputed: false, ...change })).toEqual(result)
  })

  const lapsing = {
    disputed: false,
    paymentInFlight: false,
    mailsBounce: false,
    chargeFailedOn: '2026-06-01',
    lapseAfterDays: 14,
    today: '2026-06-15',
  }
  test.each([
    [{}, ok(true)],
    [{ today: '2026-06-14' }, refuse('not_yet')],
    [{ chargeFailedOn: null }, refuse('not_yet')],
    [{ disputed: true }, refuse('disputed')],
    [{ paymentInFlight: true }, refuse('payment_in_flight')],
    [{ mailsBounce: true }, refuse('mails_bounce')],
  ])('lapse %j', (change, result) => {
    expect(mayLapse({ ...lapsing, ...change })).toEqual(result)
  })
  test('throws for days of grace that are none', () => {
    expect(() => mayLapse({ ...lapsing, lapseAfterDays: -1 })).toThrow(/lapseAfterDays/)
  })
})

test.each([
  [{}, ok(true)],
  [{ disputed: true }, refuse('disputed')],
  [{ destinationPaused: true }, refuse('destination_paused')],
  [{ unitsUnpacked: 1 }, refuse('line_not_packed')],
])('pack %j', (change, result) => {
  expect(mayPack({ disputed: false, destinationPaused: false, unitsUnpacked: 0, ...change })).toEqual(result)
})
