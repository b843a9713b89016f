import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { ACCOUNTS, kindOfAccount } from '@/lib/core/ledger/accounts'
import {
  balanceOf,
  balancePaid,
  changePaid,
  depositKept,
  depositPaid,
  disputed,
  disputeLost,
  disputeWon,
  feeCharged,
  isBalanced,
  orderPosted,
  paidIn,
  paidOut,
  paidOutside,
  refunded,
  refundFailed,
  reversed,
  type Entry,
} from '@/lib/core/ledger/entries'
import { postings } from '@/lib/core/ledger/postings'

/** The balance of every account that was touched and is not at nothing. */
function standing(entries: readonly Entry[], currency = 'EUR'): Record<string, number> {
  const touched = [...new Set(entries.map((entry) => entry.account))]
  return Object.fromEntries(
    touched
      .map((account) => [account, balanceOf(entries, account, currency)] as const)
      .filter(([, sum]) => sum !== 0),
  )
}

const EUR = 'EUR'

// The stories follow double-entry bookkeeping as any textbook has it; the sums are worked out by hand.
describe('an order from deposit to posting', () => {
  const deposit = depositPaid({ amount: 2500, currency: EUR })
  const depositFee = feeCharged({ amount: 63, currency: EUR })
  const balance = balancePaid({ amount: 16400, currency: EUR })

  test('a deposit is money held and owed', () => {
    expect(standing(deposit)).toEqual({ provider_balance: 2500, customer_deposits: -2500 })
  })

  test('posting makes it sales and tax, and nothing is owed any more', () => {
    // 189.00 gross at 19 % holds 30.18 tax.
    const posted = orderPosted({ gross: 18900, tax: 3018, currency: EUR })
    expect(standing([...deposit, ...depositFee, ...balance, ...posted])).toEqual({
      provider_balance: 18837,
      processing_fees: 63,
      sales: -15882,
      tax_payable: -3018,
    })
  })

  test('tax due on the deposit is owed at once and counted once', () => {
    const taxed = depositPaid({ amount: 2500, currency: EUR, taxNow: 399 })
    expect(standing(taxed)).toEqual({
      provider_balance: 2500,
      customer_deposits: -2500,
      tax_payable: -399,
      tax_on_deposits: 399,
    })
    const posted = orderPosted({ gross: 18900, tax: 3018, taxBooked: 399, currency: EUR })
    expect(standing([...taxed, ...balance, ...posted])).toEqual({
      provider_balance: 18900,
      sales: -15882,
      tax_payable: -3018,
    })
  })

  test('a change paid in addition is owed too', () => {
    const paid = [...deposit, ...changePaid({ amount: 700, currency: EUR }), ...balance]
    expect(balanceOf(paid, 'customer_deposits', EUR)).toBe(-19600)
  })

  test('an order paid elsewhere never touches the provider', () => {
    const entries = [
      ...paidOutside({ amount: 15000, currency: EUR }),
      ...orderPosted({ gross: 15000, tax: 0, currency: EUR }),
    ]
    expect(standing(entries)).toEqual({ outside_receipts: 15000, sales: -15000 })
  })

  test('a payout moves money to the bank and back', () => {
    const out = paidOut({ amount: 2000, currency: EUR })
    expect(standing([...deposit, ...out])).toEqual({
      provider_balance: 500,
      bank: 2000,
      customer_deposits: -2500,
    })
    expect(standing([...deposit, ...out, ...paidIn({ amount: 2000, currency: EUR })])).toEqual(
      standing(deposit),
    )
  })
})

describe('refunds', () => {
  const paid = [...depositPaid({ amount: 2500, currency: EUR }), ...feeCharged({ amount: 63, currency: EUR })]

  test('a deposit paid back in full leaves only the fee, as a cost of the refund', () => {
    expect(standing([...paid, ...refunded({ amount: 2500, currency: EUR, feeLost: 63 })])).toEqual({
      provider_balance: -63,
      fees_lost_on_refunds: 63,
    })
  })

  test('where the provider gives its fee back nothing is left', () => {
    expect(standing([...paid, ...refunded({ amount: 2500, currency: EUR, feeReturned: 63 })])).toEqual({})
  })

  test('tax that fell due on the deposit is no longer owed', () => {
    const taxed = depositPaid({ amount: 2500, currency: EUR, taxNow: 399 })
    expect(standing([...taxed, ...refunded({ amount: 2500, currency: EUR, tax: 399 })])).toEqual({})
  })

  test('after posting it lessens sales and tax', () => {
    const posted = [
      ...balancePaid({ amount: 11900, currency: EUR }),
      ...orderPosted({ gross: 11900, tax: 1900, currency: EUR }),
      ...refunded({ amount: 11900, currency: EUR, posted: true, tax: 1900 }),
    ]
    expect(standing(posted)).toEqual({ sales: -10000, sales_returned: 10000 })
  })

  test('outside the provider it leaves the provider alone', () => {
    const entries = [
      ...paidOutside({ amount: 900, currency: EUR }),
      ...refunded({ amount: 900, currency: EUR, outside: true }),
    ]
    expect(standing(entries)).toEqual({})
  })

  test('one that fails later leaves the books as before it', () => {
    const refund = { amount: 2500, currency: EUR, tax: 399, feeLost: 63 }
    expect(standing([...paid, ...refunded(refund), ...refundFailed(refund)])).toEqual(standing(paid))
  })

  test('reversed turns every sign', () => {
    expect(reversed(paidOut({ amount: 5, currency: EUR }))).toEqual(
      paidIn({ amount: 5, currency: EUR }).toReversed(),
    )
  })
})

describe('disputes', () => {
  const paid = depositPaid({ amount: 2500, currency: EUR })
  const open = disputed({ amount: 2500, currency: EUR, fee: 2000 })

  test('open: the money is held back and the fee is gone', () => {
    expect(standing([...paid, ...open])).toEqual({
      provider_balance: -2000,
      disputed_funds: 2500,
      dispute_fees: 2000,
      customer_deposits: -2500,
    })
  })

  test('won: the money is back, the fee where the provider returns it', () => {
    expect(standing([...paid, ...open, ...disputeWon({ amount: 2500, currency: EUR, fee: 2000 })])).toEqual(
      standing(paid),
    )
    expect(standing([...paid, ...open, ...disputeWon({ amount: 2500, currency: EUR })])).toEqual({
      provider_balance: 500,
      dispute_fees: 2000,
      customer_deposits: -2500,
    })
  })

  test('lost before posting: the buyer has the money and is owed no more', () => {
    expect(
      standing([...paid, ...open, ...disputeLost({ amount: 2500, currency: EUR, posted: false })]),
    ).toEqual({
      provider_balance: -2000,
      dispute_fees: 2000,
    })
  })

  test('lost after posting: a loss', () => {
    const posted = orderPosted({ gross: 2500, tax: 0, currency: EUR })
    const lost = disputeLost({ amount: 2500, currency: EUR, posted: true })
    expect(standing([...paid, ...posted, ...open, ...lost])).toEqual({
      provider_balance: -2000,
      dispute_fees: 2000,
      dispute_losses: 2500,
      sales: -2500,
    })
  })
})

test('a deposit that is kept is income, with tax only where it is taxable', () => {
  const paid = depositPaid({ amount: 2500, currency: EUR, taxNow: 399 })
  expect(standing([...paid, ...depositKept({ amount: 2500, currency: EUR, taxBooked: 399 })])).toEqual({
    provider_balance: 2500,
    kept_deposits: -2500,
  })
  expect(
    standing([...paid, ...depositKept({ amount: 2500, currency: EUR, tax: 399, taxBooked: 399 })]),
  ).toEqual({
    provider_balance: 2500,
    kept_deposits: -2101,
    tax_payable: -399,
  })
})

const amount = fc.integer({ min: 1, max: 1e12 })
const currency = fc.constantFrom('EUR', 'JPY', 'KWD', 'USD')
const part = fc.double({ min: 0, max: 1, noNaN: true })
const event: fc.Arbitrary<Entry[]> = fc
  .record({ amount, currency, a: part, b: part, posted: fc.boolean(), outside: fc.boolean() })
  .chain((x) => {
    const tax = Math.floor(x.amount * x.a)
    const taxBooked = Math.floor(tax * x.b)
    const fee = Math.floor(x.amount * x.b)
    return fc.constantFrom(
      depositPaid({ ...x, taxNow: tax }),
      balancePaid({ ...x, taxNow: tax }),
      changePaid(x),
      paidOutside(x),
      orderPosted({ gross: x.amount, tax, taxBooked, currency: x.currency }),
      depositKept({ ...x, tax, taxBooked }),
      feeCharged(x),
      refunded({ ...x, tax, feeLost: fee }),
      refunded({ ...x, tax, feeReturned: fee }),
      refundFailed({ ...x, tax, feeLost: fee }),
      disputed({ ...x, fee }),
      disputeWon({ ...x, fee }),
      disputeLost(x),
      paidOut(x),
      paidIn(x),
    )
  })

describe('laws', () => {
  test('the entries of any sequence of events balance, in every currency', () => {
    fc.assert(
      fc.property(fc.array(event, { maxLength: 40 }), (events) => {
        const entries = events.flat()
        expect(isBalanced(entries)).toBe(true)
        for (const code of ['EUR', 'JPY', 'KWD', 'USD']) {
          const all = Object.values(standing(entries, code)).reduce((sum, each) => sum + BigInt(each), 0n)
          expect(all).toBe(0n)
        }
      }),
    )
  })

  test('no event leaves an entry of nothing or of a fraction', () => {
    fc.assert(
      fc.property(event, (entries) => {
        expect(entries.length).toBeGreaterThan(1)
        expect(entries.every((entry) => Number.isSafeInteger(entry.amount) && entry.amount !== 0)).toBe(true)
      }),
    )
  })
})

describe('isBalanced', () => {
  const entry = (account: Entry['account'], code: string, sum: number): Entry => ({
    account,
    currency: code,
    amount: minor(sum),
  })
  test('currencies do not make up for one another', () => {
    expect(isBalanced([entry('bank', 'EUR', 5), entry('provider_balance', 'USD', -5)])).toBe(false)
    expect(isBalanced([entry('bank', 'EUR', 5), entry('provider_balance', 'EUR', -4)])).toBe(false)
    expect(isBalanced([])).toBe(true)
  })
  test('is exact beyond a safe integer', () => {
    const large = Number.MAX_SAFE_INTEGER
    const entries = [entry('bank', 'EUR', large), entry('bank', 'EUR', large), entry('bank', 'EUR', 2)]
    expect(isBalanced([...entries, entry('sales', 'EUR', -large), entry('sales', 'EUR', -large)])).toBe(false)
  })
  test('throws for a fraction', () => {
    expect(() => isBalanced([{ account: 'bank', currency: 'EUR', amount: 0.5 as Entry['amount'] }])).toThrow(
      RangeError,
    )
  })
})

test.each([
  ['amount', () => depositPaid({ amount: 0, currency: EUR })],
  ['amount', () => balancePaid({ amount: -1, currency: EUR })],
  ['amount', () => changePaid({ amount: 0.5, currency: EUR })],
  ['amount', () => feeCharged({ amount: NaN, currency: EUR })],
  ['amount', () => refunded({ amount: 0, currency: EUR })],
  ['amount', () => disputed({ amount: 0, currency: EUR })],
  ['amount', () => disputeWon({ amount: 0, currency: EUR })],
  ['amount', () => disputeLost({ amount: 0, currency: EUR, posted: false })],
  ['amount', () => paidOut({ amount: 0, currency: EUR })],
  ['amount', () => paidIn({ amount: 0, currency: EUR })],
  ['amount', () => paidOutside({ amount: 0, currency: EUR })],
  ['amount', () => depositKept({ amount: 0, currency: EUR })],
  ['taxNow', () => depositPaid({ amount: 100, currency: EUR, taxNow: 101 })],
  ['gross', () => orderPosted({ gross: 0, tax: 0, currency: EUR })],
  ['tax ', () => orderPosted({ gross: 100, tax: 101, currency: EUR })],
  ['taxBooked', () => orderPosted({ gross: 100, tax: 10, taxBooked: 11, currency: EUR })],
  ['tax ', () => refunded({ amount: 100, currency: EUR, tax: -1 })],
  ['feeLost', () => refunded({ amount: 100, currency: EUR, feeLost: -1 })],
  ['feeReturned', () => refunded({ amount: 100, currency: EUR, feeReturned: 0.5 })],
  ['fee ', () => disputed({ amount: 100, currency: EUR, fee: -1 })],
  ['currency', () => depositPaid({ amount: 100, currency: 'XYZ' })],
  ['sum to 0', () => postings(EUR, { bank: 5, provider_balance: -4 })],
])('throws and names %s %#', (argument, call) => {
  expect(call).toThrow(RangeError)
  expect(call).toThrow(argument)
})

test('every account is of one of four kinds', () => {
  const kinds = Object.keys(ACCOUNTS).map((account) => kindOfAccount(account as keyof typeof ACCOUNTS))
  expect(new Set(kinds)).toEqual(new Set(['asset', 'liability', 'income', 'expense']))
})
