import { render, screen, waitFor } from '@testing-library/react'
import { afterEach, expect, test, vi } from 'vitest'
import { BulkProgressLine } from '@/components/run/bulk-progress-line'

afterEach(() => vi.unstubAllGlobals())

const line = (known: { total: number; done: number; failed: number }) => (
  <BulkProgressLine workshop="hollow-pier" bulk="b1" label="Charging balances" known={known} />
)

test('starts with what the server knew, and asks until nothing waits any more', async () => {
  const answers = [
    { total: 3, done: 2, failed: 0 },
    { total: 3, done: 2, failed: 1 },
  ]
  const ask = vi.fn(() => Promise.resolve(Response.json(answers.shift() ?? { total: 3, done: 2, failed: 1 })))
  vi.stubGlobal('fetch', ask)
  render(line({ total: 3, done: 0, failed: 0 }))
  expect(screen.getByRole('progressbar')).toHaveAttribute('aria-valuetext', '0 of 3')
  await waitFor(() => expect(screen.getByText('All done.')).toBeInTheDocument(), { timeout: 5000 })
  expect(screen.getByRole('progressbar')).toHaveAttribute('aria-valuetext', '3 of 3')
  expect(screen.getByText('1 did not succeed')).toBeInTheDocument()
  expect(ask).toHaveBeenCalledWith('/api/admin/hollow-pier/bulk/b1', expect.anything())
})

test('says that all is done when it was before', () => {
  vi.stubGlobal('fetch', () => Promise.resolve(Response.json({ total: 2, done: 2, failed: 0 })))
  render(line({ total: 2, done: 2, failed: 0 }))
  expect(screen.getByText('All done.')).toBeInTheDocument()
})
