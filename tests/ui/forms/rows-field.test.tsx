import { render, screen, within } from '@testing-library/react'
import { expect, test } from 'vitest'
import { RowsField } from '@/components/forms/rows-field'

const columns = [
  { name: 'name', label: 'Name' },
  { name: 'amount', label: 'Amount', kind: 'decimal' as const, unit: 'EUR' },
  { name: 'currency', label: 'Currency', preset: 'EUR' },
]
const rows = (values: Record<string, string>, over: object = {}) => (
  <RowsField
    name="sums"
    legend="Sums"
    columns={columns}
    rowLabel={(row) => `Row ${row}`}
    form={{ values, errors: { 'sums.1.amount': 'Enter an amount.' } }}
    most={4}
    {...over}
  />
)

test('rows that hold something are followed by empty ones, each with a name of its own', () => {
  render(rows({ 'sums.0.name': 'Tools', 'sums.1.amount': 'x', 'summary.7.name': 'other' }))
  const shown = screen.getAllByRole('group', { name: /^Row/ })
  expect(shown).toHaveLength(4)
  expect(within(shown[0]!).getByRole('textbox', { name: 'Name' })).toHaveValue('Tools')
  const wrong = within(shown[1]!).getByRole('textbox', { name: 'Amount' })
  expect(wrong).toBeInvalid()
  expect(wrong).toHaveAttribute('name', 'sums.1.amount')
  expect(within(shown[3]!).getByRole('textbox', { name: 'Currency' })).toHaveValue('EUR')
  expect(within(shown[3]!).getByRole('textbox', { name: 'Name' })).not.toBeRequired()
})

test('there are never more rows than the list can hold', () => {
  render(rows({ 'sums.3.name': 'Last' }, { spare: 5 }))
  expect(screen.getAllByRole('group', { name: /^Row/ })).toHaveLength(4)
})
