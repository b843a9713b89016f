import { render, screen } from '@testing-library/react'
import { expect, test } from 'vitest'
import { ErrorSummary } from '@/components/ui/error-summary'
import { TextField } from '@/components/ui/text-field'

test('it takes the focus, counts, and leads to each field', () => {
  const errors = { 'lines.0.quantity': 'Enter a whole number from 1 to 10.', '': 'The run has been closed.' }
  render(
    <>
      <ErrorSummary errors={errors} />
      <TextField name="lines.0.quantity" label="How many" />
    </>,
  )
  expect(screen.getByRole('alert')).toHaveFocus()
  expect(screen.getByRole('heading')).toHaveTextContent('2 things need changing')
  const link = screen.getByRole('link', { name: 'Enter a whole number from 1 to 10.' })
  const target = document.getElementById(link.getAttribute('href')!.slice(1))
  expect(target).toBe(screen.getByRole('textbox', { name: 'How many' }))
  expect(screen.getByText('The run has been closed.').closest('a')).toBeNull()
})

test('one error is said in the singular, and a new set takes the focus again', () => {
  const { rerender } = render(<ErrorSummary errors={{ a: 'First.' }} />)
  expect(screen.getByRole('heading')).toHaveTextContent('One thing needs changing')
  ;(document.activeElement as HTMLElement).blur()
  rerender(<ErrorSummary errors={{ a: 'Second.' }} />)
  expect(screen.getByRole('alert')).toHaveFocus()
})

test('nothing is shown without errors', () => {
  const { container } = render(<ErrorSummary errors={{}} />)
  expect(container).toBeEmptyDOMElement()
})
