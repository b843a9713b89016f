import { render, screen, within } from '@testing-library/react'
import { expect, test } from 'vitest'
import { CheckField, ChoiceField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import { fieldId } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { TextArea } from '@/components/ui/text-area'
import { MoneyField, NumberField, TextField } from '@/components/ui/text-field'
import { TypedConfirmation } from '@/components/ui/typed-confirmation'

const form = {
  values: {
    email: 'ada@',
    quantity: '1.5',
    colour: ['red', 'blue'],
    country: 'IE',
    story: 'As typed.',
    agreed: 'on',
  },
  errors: { email: 'Enter an e-mail address.', colour: 'Choose fewer.' },
}

test('a field is named by its label and described by hint and error', () => {
  render(<TextField name="email" label="E-mail" hint="Only for this." form={form} type="email" />)
  const input = screen.getByRole('textbox', { name: 'E-mail' })
  expect(input).toHaveAccessibleDescription('Only for this. Error: Enter an e-mail address.')
  expect(input).toBeInvalid()
  expect(input).toHaveValue('ada@')
  expect(input).toBeRequired()
})

test('a field without trouble is neither invalid nor described', () => {
  render(<TextField name="name" label="Name" optional />)
  const input = screen.getByRole('textbox', { name: 'Name (optional)' })
  expect(input).toBeValid()
  expect(input).not.toBeRequired()
  expect(input).not.toHaveAttribute('aria-describedby')
})

test('what was typed stands again where a field starts with something, emptied ones too', () => {
  const kept = { values: { quantity: '', country: 'FR', story: 'Mine.' } }
  const countries = ['FR', 'IE'].map((value) => ({ value, label: value }))
  render(
    <>
      <NumberField name="quantity" label="Quantity" defaultValue="1" form={kept} />
      <SelectField name="country" label="Country" options={countries} defaultValue="IE" form={kept} />
      <TextArea name="story" label="Story" defaultValue="Theirs." form={kept} />
      <TextField name="email" label="E-mail" defaultValue="ada@example.org" />
    </>,
  )
  expect(screen.getByRole('textbox', { name: 'Quantity' })).toHaveValue('')
  expect(screen.getByRole('combobox', { name: 'Country' })).toHaveValue('FR')
  expect(screen.getByRole('textbox', { name: 'Story' })).toHaveValue('Mine.')
  expect(screen.getByRole('textbox', { name: 'E-mail' })).toHaveValue('ada@example.org')
})

test('numbers and sums are typed as text, with their unit read out', () => {
  render(
    <>
      <NumberField name="quantity" label="How many" form={form} />
      <MoneyField name="price" label="Price" currency="EUR" />
    </>,
  )
  expect(screen.getByRole('textbox', { name: 'How many' })).toHaveValue('1.5')
  expect(screen.getByRole('textbox', { name: 'How many' })).toHaveAttribute('inputmode', 'numeric')
  expect(screen.getByRole('textbox', { name: 'Price' })).toHaveAccessibleDescription('EUR')
  expect(screen.getByRole('textbox', { name: 'Price' })).toHaveAttribute('inputmode', 'decimal')
})

test('lists, long text and tick boxes bring back what was chosen', () => {
  render(
    <>
      <SelectField name="country" label="Country" form={form} options={[{ value: 'IE', label: 'Ireland' }]} />
      <TextArea name="story" label="Story" form={form} />
      <CheckField name="agreed" label="I have read it" form={form} />
      <CheckField name="more" label="Send more" form={form} checked optional />
    </>,
  )
  expect(screen.getByRole('combobox', { name: 'Country' })).toHaveValue('IE')
  expect(screen.getByRole('textbox', { name: 'Story' })).toHaveValue('As typed.')
  expect(screen.getByRole('checkbox', { name: 'I have read it' })).toBeChecked()
  // It was not among the values that came back, so it had been unticked.
  expect(screen.getByRole('checkbox', { name: 'Send more' })).not.toBeChecked()
})

test('a group is named by its legend, and its first choice is where the summary leads', () => {
  const choices = ['red', 'green', 'blue'].map((value) => ({
    value,
    label: value,
    disabled: value === 'green',
  }))
  render(<ChoiceField name="colour" label="Colour" choices={choices} many form={form} />)
  const group = screen.getByRole('group', { name: 'Colour' })
  expect(group).toHaveAccessibleDescription('Error: Choose fewer.')
  const boxes = within(group).getAllByRole('checkbox')
  expect(boxes.map((box) => (box as HTMLInputElement).checked)).toEqual([true, false, true])
  expect(boxes[0]).toHaveAttribute('id', fieldId('colour'))
  expect(boxes[1]).toBeDisabled()
})

test('one of a group can be chosen when it is not many', () => {
  const choices = ['red', 'blue'].map((value) => ({ value, label: value }))
  render(<ChoiceField name="one" label="Colour" choices={choices} chosen="blue" />)
  expect(screen.getByRole('radio', { name: 'blue' })).toBeChecked()
})

test('the words to be typed stand in the label', () => {
  render(<TypedConfirmation name="words" words="41 orders" />)
  expect(screen.getByRole('textbox', { name: 'Type this to go on: 41 orders' })).toHaveAttribute(
    'autocomplete',
    'off',
  )
})

test('a form is posted by the browser, with what goes along unseen and its errors on top', () => {
  const { container } = render(
    <Form action="/api/x" form={form} hidden={{ draft: 'd1' }} foot={<button>Go</button>}>
      <TextField name="email" label="E-mail" form={form} />
    </Form>,
  )
  const element = container.querySelector('form')!
  expect(element).toHaveAttribute('method', 'post')
  expect(element).toHaveAttribute('action', '/api/x')
  expect(element).toHaveFormValues({ draft: 'd1', email: 'ada@' })
  expect(screen.getByRole('alert')).toHaveFocus()
})
