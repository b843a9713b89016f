import { render, screen, within } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { ChangeCheck } from '@/app/(account)/account/orders/[order]/change/check/_parts/change-check'
import { CompareSheet } from '@/app/(admin)/admin/[workshop]/money/_parts/compare-sheet'
import { StuckSheet } from '@/app/(admin)/admin/[workshop]/money/_parts/stuck-sheet'
import { TaxTable } from '@/app/(admin)/admin/[workshop]/money/_parts/tax-table'
import { StatementSheet } from '@/components/money/statement-sheet'

const at = '2027-03-01T09:00:00.000Z'
const zone = 'Europe/Berlin'

describe('the comparison with the provider', () => {
  test('says that nothing differs', () => {
    render(<CompareSheet slug="pier" zone={zone} compared={{ at, items: 12, differences: [] }} />)
    expect(screen.getByText('No difference')).toBeTruthy()
    expect(screen.getByText(/12 movements/)).toBeTruthy()
    expect(screen.getByRole('button', { name: 'Compare now' })).toBeTruthy()
  })

  test('names each difference with its order and both sums', () => {
    const differences = [
      {
        kind: 'amount' as const,
        id: 'pi_1',
        isFee: false,
        ours: { amount: 2500, currency: 'EUR' },
        theirs: { amount: 2400, currency: 'EUR' },
        order: 'o1',
        orderNumber: 7,
      },
      {
        kind: 'missing_here' as const,
        id: 'pi_2',
        isFee: true,
        ours: null,
        theirs: { amount: -63, currency: 'EUR' },
        order: null,
        orderNumber: null,
      },
    ]
    render(<CompareSheet slug="pier" zone={zone} compared={{ at, items: 12, differences }} />)
    const table = within(screen.getByRole('table'))
    expect(table.getByRole('link', { name: '7' }).getAttribute('href')).toBe('/admin/pier/orders/o1')
    expect(screen.getByRole('table').textContent).toContain('€25.00')
    expect(screen.getByRole('table').textContent).toContain('€24.00')
    expect(table.getByText('pi_2')).toBeTruthy()
    expect(table.getByText('nothing')).toBeTruthy()
  })
})

test('what is stuck has one button each, with its own row in the form', () => {
  const stuck = [
    {
      kind: 'refund' as const,
      id: 'r1',
      state: 'failed',
      order: 'o1',
      orderNumber: 7,
      amountMinor: 2500,
      currency: 'EUR',
      since: at,
      detail: null,
    },
  ]
  const { container } = render(<StuckSheet slug="pier" zone={zone} stuck={stuck} />)
  expect(screen.getByText('Paying back failed. Nothing has gone back.')).toBeTruthy()
  expect(screen.getByRole('button', { name: /Take it up again/ })).toBeTruthy()
  expect(container.querySelector('input[name=id]')?.getAttribute('value')).toBe('r1')
})

test('a statement tells every movement in words, and what stands in the end', () => {
  render(
    <StatementSheet
      zone={zone}
      statement={{
        lines: [
          {
            id: 't1',
            at,
            kind: 'deposit_paid',
            order: 'o1',
            orderNumber: 7,
            entries: [
              { account: 'provider_balance', currency: 'EUR', amountMinor: 2500 },
              { account: 'customer_deposits', currency: 'EUR', amountMinor: -2500 },
            ],
          },
        ],
        sums: [{ account: 'customer_deposits', currency: 'EUR', amountMinor: -2500 }],
      }}
    />,
  )
  expect(screen.getByText('Deposit arrived (order 7)')).toBeTruthy()
  expect(screen.getAllByText('Owed to buyers')).toHaveLength(2)
})

test('the tax of a year stands by month, country and rate', () => {
  const row = {
    month: '2027-03',
    country: 'DE',
    basisPoints: 1900,
    netMinor: 2101,
    taxMinor: 399,
    grossMinor: 2500,
  }
  render(
    <TaxTable
      report={{ year: '2027', years: ['2027', '2026'], currency: 'EUR', isTaxedOnArrival: true, rows: [row] }}
      here="/admin/pier/money/tax"
      csv="/api/admin/pier/tax.csv?year=2027"
    />,
  )
  expect(screen.getByText('March 2027')).toBeTruthy()
  expect(screen.getByRole('table').textContent).toContain('€3.99')
  expect(screen.getByRole('link', { name: '2026' }).getAttribute('href')).toContain('year=2026')
})

test.each([
  { deposit: 4000, words: /rises by €15.00/, button: /obligation to pay €15.00 now/ },
  { deposit: 1000, words: /falls by €15.00/, button: 'Change the order' },
  { deposit: 2500, words: /stays as it is/, button: 'Change the order' },
])('the check page says what a deposit of $deposit means', ({ deposit, words, button }) => {
  render(
    <ChangeCheck
      draft="d1"
      change="/back"
      values={{ 'lines.0.quantity': '1' }}
      quote={{
        order: 'o1',
        number: 7,
        currency: 'EUR',
        lines: [{ offer: 'built', quantity: 1, totalMinor: 16500, choices: [], postedBy: '2027-08-31' }],
        before: { totalMinor: 9990, depositMinor: 2500, balanceMinor: 7490 },
        after: {
          goodsMinor: 16500,
          postageMinor: 490,
          taxMinor: 2713,
          totalMinor: 16990,
          depositMinor: deposit,
          balanceMinor: 16990 - deposit,
        },
      }}
    />,
  )
  expect(screen.getByText(words)).toBeTruthy()
  expect(screen.getByRole('button', { name: button })).toBeTruthy()
})
