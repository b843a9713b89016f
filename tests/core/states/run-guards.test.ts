import { describe, expect, test } from 'vitest'
import { ok, refuse } from '@/lib/core/result'
import {
  callOffDueOn,
  mayChangeMaximum,
  mayLowerMinimum,
  mayMoveDecideBy,
} from '@/lib/core/states/run-changes'
import {
  mayCallOff,
  mayClose,
  mayLock,
  mayOpen,
  type LockFacts,
  type OpenFacts,
} from '@/lib/core/states/run-guards'
import { READINESS_KEYS } from '@/lib/core/states/run-readiness'

const offer = { priceMinor: 18900, depositMinor: 2500, postedBy: '2026-09-01' }
const opening: OpenFacts = {
  minimum: 60,
  maximum: 100,
  today: '2026-03-01',
  decideBy: '2026-04-01',
  currency: 'EUR',
  offers: [offer, { priceMinor: 4500, depositMinor: 4500, postedBy: '2026-07-01' }],
  accountCanCharge: true,
  pagePublished: true,
  termsSet: true,
  holdingLimitDays: 90,
  statedPlan: null,
}

describe('mayOpen', () => {
  test('opens a run that has everything', () => {
    expect(mayOpen(opening)).toEqual(ok(true))
    expect(
      mayOpen({ ...opening, minimum: 1, maximum: 1, decideBy: '2026-03-02', holdingLimitDays: null }),
    ).toEqual(ok(true))
  })

  test.each<[string, Partial<OpenFacts>]>([
    ['minimum_out_of_range', { minimum: 0 }],
    ['minimum_out_of_range', { minimum: 101 }],
    ['minimum_out_of_range', { minimum: 1.5 }],
    ['minimum_out_of_range', { maximum: NaN }],
    ['decide_by_past', { decideBy: '2026-03-01' }],
    ['decide_by_past', { decideBy: '2026-02-28' }],
    ['no_offer', { offers: [] }],
    ['offer_without_date', { offers: [offer, { ...offer, postedBy: null }] }],
    ['posted_by_before_decide_by', { offers: [offer, { ...offer, postedBy: '2026-04-01' }] }],
    ['offer_without_price', { offers: [offer, { ...offer, priceMinor: null }] }],
    ['offer_without_price', { offers: [offer, { ...offer, priceMinor: 0 }] }],
    ['offer_without_price', { offers: [offer, { ...offer, depositMinor: null }] }],
    ['deposit_out_of_range', { offers: [offer, { ...offer, depositMinor: 0 }] }],
    ['deposit_out_of_range', { offers: [offer, { ...offer, depositMinor: 18901 }] }],
    ['amount_not_chargeable', { offers: [offer, { ...offer, depositMinor: 49 }] }],
    ['amount_not_chargeable', { currency: 'KWD', offers: [{ ...offer, depositMinor: 2505 }] }],
    ['amount_not_chargeable', { offers: [{ ...offer, priceMinor: 100_000_000 }] }],
    ['account_cannot_charge', { accountCanCharge: false }],
    ['page_not_published', { pagePublished: false }],
    ['terms_missing', { termsSet: false }],
    ['beyond_holding_limit', { holdingLimitDays: 30 }],
    ['beyond_holding_limit', { holdingLimitDays: 30, statedPlan: '  ' }],
  ])('refuses: %s %#', (reason, change) => {
    expect(mayOpen({ ...opening, ...change })).toEqual({ ok: false, reason })
  })

  test('a stated plan or a limit of exactly the days will do', () => {
    expect(mayOpen({ ...opening, holdingLimitDays: 31 })).toEqual(ok(true))
    expect(mayOpen({ ...opening, holdingLimitDays: 30, statedPlan: 'Held in a client account.' })).toEqual(
      ok(true),
    )
  })

  test('a day that is none is a bug of the caller', () => {
    expect(() => mayOpen({ ...opening, decideBy: '2026-04-31' })).toThrow(RangeError)
    expect(() => mayOpen({ ...opening, currency: 'XYZ' })).toThrow(RangeError)
  })
})

const ready = READINESS_KEYS.map((key) => ({ key, state: 'ready' as const }))
const locking: LockFacts = {
  deposited: 60,
  minimum: 60,
  reason: null,
  readiness: ready,
  openSessions: 0,
  unknownAttempts: 0,
}
const withLine = (state: 'missing' | 'unknown' | 'waived') =>
  ready.map((line) => (line.key === 'quotes' ? { ...line, state } : line))

describe('mayLock', () => {
  test('locks at the minimum, below it with a reason, and with a waived line', () => {
    expect(mayLock(locking)).toEqual(ok(true))
    expect(
      mayLock({ ...locking, deposited: 59, reason: 'A friend of the workshop takes the rest.' }),
    ).toEqual(ok(true))
    expect(mayLock({ ...locking, readiness: withLine('waived') })).toEqual(ok(true))
  })

  test.each<[string, Partial<LockFacts>]>([
    ['below_minimum', { deposited: 59 }],
    ['below_minimum', { deposited: 59, reason: ' ' }],
    ['not_ready', { readiness: withLine('missing') }],
    ['not_ready', { readiness: withLine('unknown') }],
    ['not_ready', { readiness: [] }],
    ['not_ready', { readiness: ready.slice(1) }],
    ['session_open', { openSessions: 1 }],
    ['attempt_unknown', { unknownAttempts: 1 }],
  ])('refuses: %s %#', (reason, change) => {
    expect(mayLock({ ...locking, ...change })).toEqual({ ok: false, reason })
  })
})

describe('mayCallOff', () => {
  test('with a reason, until the first hand-over', () => {
    expect(mayCallOff({ reason: 'Not enough of you.', handedOver: 0 })).toEqual(ok(true))
    expect(mayCallOff({ reason: '\n', handedOver: 0 })).toEqual(refuse('reason_missing'))
    expect(mayCallOff({ reason: 'Too late.', handedOver: 1 })).toEqual(refuse('already_handed_over'))
  })
})

describe('mayClose', () => {
  const closing = {
    ordersShortOfEnd: 0,
    openProblems: 0,
    pendingRefunds: 0,
    unknownAttempts: 0,
    conversionsStored: true,
  }
  test('closes when nothing is open', () => {
    expect(mayClose(closing)).toEqual(ok(true))
  })
  test.each([
    ['order_short_of_end', { ordersShortOfEnd: 1 }],
    ['problem_open', { openProblems: 2 }],
    ['refund_pending', { pendingRefunds: 1 }],
    ['attempt_unknown', { unknownAttempts: 1 }],
    ['conversions_missing', { conversionsStored: false }],
  ])('refuses: %s', (reason, change) => {
    expect(mayClose({ ...closing, ...change })).toEqual({ ok: false, reason })
  })
})

describe('changes of a run', () => {
  test('the clock calls off seven days after decide-by', () => {
    expect(callOffDueOn('2026-12-28')).toBe('2027-01-04')
  })

  test.each([
    ['taking_deposits', 60, 59, ok(true)],
    ['taking_deposits', 60, 60, refuse('not_lower')],
    ['taking_deposits', 60, 61, refuse('not_lower')],
    ['taking_deposits', 60, 0, refuse('minimum_out_of_range')],
    ['taking_deposits', 60, 1.5, refuse('minimum_out_of_range')],
    ['locked', 60, 50, refuse('not_taking_deposits')],
  ] as const)('minimum, %s: %i to %i', (state, minimum, proposed, result) => {
    expect(mayLowerMinimum({ state, minimum, proposed })).toEqual(result)
  })

  const moving = {
    state: 'taking_deposits',
    decideBy: '2026-04-01',
    proposed: '2026-05-01',
    movedBefore: false,
    today: '2026-03-20',
    postedBy: ['2026-09-01', '2026-05-02'],
  } as const
  test.each([
    [{}, ok(true)],
    [{ proposed: '2026-05-02' }, refuse('too_far')],
    [{ proposed: '2026-04-01' }, refuse('not_later')],
    [{ proposed: '2026-03-25' }, refuse('not_later')],
    [{ movedBefore: true }, refuse('already_moved')],
    [{ state: 'locked' }, refuse('not_taking_deposits')],
    [{ today: '2026-05-01' }, refuse('decide_by_past')],
    [{ postedBy: ['2026-05-01'] }, refuse('posted_by_before_decide_by')],
  ] as const)('decide-by %j', (change, result) => {
    expect(mayMoveDecideBy({ ...moving, ...change })).toEqual(result)
  })

  test.each([
    ['taking_deposits', 72, ok(true)],
    ['locked', 200, ok(true)],
    ['taking_deposits', 71, refuse('below_committed')],
    ['taking_deposits', 72.5, refuse('maximum_out_of_range')],
    ['closed', 200, refuse('run_over')],
    ['called_off', 200, refuse('run_over')],
  ] as const)('maximum, %s: %d', (state, proposed, result) => {
    expect(mayChangeMaximum({ state, minimum: 60, committed: 72, proposed })).toEqual(result)
  })
  test('maximum below the minimum', () => {
    const change = { state: 'taking_deposits', minimum: 60, committed: 10, proposed: 59 } as const
    expect(mayChangeMaximum(change)).toEqual(refuse('below_minimum'))
  })
})
