import { render, screen, within } from '@testing-library/react'
import { expect, test } from 'vitest'
import { Table, type Column } from '@/components/ui/table'
import { withParams } from '@/components/ui/with-params'

type Row = { id: string; sum: number }
const columns: Column<Row>[] = [
  { key: 'id', heading: 'Number', cell: (row) => row.id, sort: { href: '?sort=id', direction: 'ascending' } },
  { key: 'sum', heading: 'Sum', cell: (row) => row.sum, kind: 'figures', sort: { href: '?sort=sum' } },
]
const base = { caption: 'Orders', columns, rowKey: (row: Row) => row.id, empty: 'None yet. Start one.' }

test('it has a caption, row headers, sort links and says which way it is sorted', () => {
  render(
    <Table
      {...base}
      rows={[{ id: 'A', sum: 3 }]}
      actions={(row) => <a href={`/${row.id}`}>Open</a>}
      csvHref="/x.csv"
      nextHref="?after=A"
    />,
  )
  const table = screen.getByRole('table', { name: 'Orders' })
  const [number, sum] = within(table).getAllByRole('columnheader')
  expect(number).toHaveAttribute('aria-sort', 'ascending')
  expect(sum).not.toHaveAttribute('aria-sort')
  expect(within(sum!).getByRole('link', { name: 'Sort by Sum' })).toHaveAttribute('href', '?sort=sum')
  expect(within(table).getByRole('rowheader', { name: 'A' })).toBeVisible()
  expect(within(table).getByRole('cell', { name: '3' })).toBeVisible()
  expect(within(table).getByRole('columnheader', { name: 'Actions' })).toBeInTheDocument()
  expect(screen.getByRole('link', { name: /CSV/ })).toHaveAttribute('href', '/x.csv')
  expect(screen.getByRole('link', { name: 'Next page' })).toHaveAttribute('rel', 'next')
})

test('without rows it says what to do next, and offers no file of nothing', () => {
  render(<Table {...base} rows={[]} csvHref="/x.csv" />)
  expect(screen.queryByRole('table')).toBeNull()
  expect(screen.getByText('None yet. Start one.')).toBeVisible()
  expect(screen.queryByRole('link', { name: /CSV/ })).toBeNull()
})

test('a table that scrolls sideways can be reached by keyboard', () => {
  render(<Table {...base} rows={[{ id: 'A', sum: 3 }]} narrow="scroll" />)
  expect(screen.getByRole('region', { name: 'Orders' })).toHaveAttribute('tabindex', '0')
})

test('addresses keep the rest of their query', () => {
  const now = { state: 'paid', sort: 'id', tag: ['a', 'b'], after: 'x' }
  expect(withParams('/orders', now, { sort: 'sum', after: null })).toBe(
    '/orders?state=paid&tag=a&tag=b&sort=sum',
  )
  expect(withParams('/orders', {}, { sort: null })).toBe('/orders')
})
