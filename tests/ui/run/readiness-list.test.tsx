import { render, screen, within } from '@testing-library/react'
import { expect, test } from 'vitest'
import { ReadinessList } from '@/components/run/readiness-list'
import { READINESS_KEYS } from '@/lib/core/states/run-readiness'
import { readinessTitles } from '@/lib/messages/readiness'

test('each line has its state in words and, unless it is ready, a way to mend it', () => {
  const states = ['ready', 'missing', 'unknown', 'waived'] as const
  const lines = READINESS_KEYS.map((key, i) => ({
    key,
    state: states[i % 4]!,
    title: readinessTitles[key],
    words: `Sentence ${i}.`,
  }))
  render(<ReadinessList lines={lines} workshop="hollow-pier" module="rowlock" />)
  const items = screen.getAllByRole('listitem')
  expect(items).toHaveLength(9)
  const words = { ready: 'ready', missing: 'missing', unknown: 'not known', waived: 'let pass' }
  items.forEach((item, i) => {
    const { state, title } = lines[i]!
    expect(within(item).getByText(words[state])).toBeInTheDocument()
    expect(within(item).queryAllByRole('link', { name: `Mend ${title}` })).toHaveLength(
      state === 'ready' ? 0 : 1,
    )
  })
  expect(screen.getByRole('link', { name: 'Mend Quotes and stock' })).toHaveAttribute(
    'href',
    '/admin/hollow-pier/modules/rowlock/parts',
  )
})
