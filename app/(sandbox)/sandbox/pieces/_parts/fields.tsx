import { Money } from '@/components/format/money'
import { Button, LinkButton } from '@/components/ui/button'
import { CheckField, ChoiceField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { DateField, MoneyField, NumberField, TextField } from '@/components/ui/text-field'
import { TypedConfirmation } from '@/components/ui/typed-confirmation'
import type { FormState } from '@/components/ui/form-state'

const mistaken: FormState = {
  values: {
    email: 'ada@',
    quantity: '1.5',
    price: '12,345',
    offer: 'kit',
    until: '2027-03-01',
    story: 'As typed.',
  },
  errors: {
    email: 'Enter an e-mail address, such as name@example.org.',
    quantity: 'Enter a whole number from 1 to 10.',
    offer: 'Choose one of the offers.',
    country: 'Choose a country.',
    agreed: 'Tick this to go on.',
  },
}

export function Fields() {
  return (
    <Sheet id="fields" title="Fields">
      <div className="grid gap-10 md:grid-cols-2">
        <Filled label="a-" />
        <Filled label="b-" form={mistaken} />
      </div>
    </Sheet>
  )
}

function Filled({ label, form }: { label: string; form?: FormState }) {
  // The second form brings its mistakes; its ids are those the summary links to.
  const id = (name: string) => (form ? undefined : `${label}${name}`)
  return (
    <Form
      action="/sandbox/pieces"
      form={form}
      foot={
        <>
          <Button type="button">Check what you entered</Button>
          <LinkButton href="#fields" kind="plain">
            Leave it
          </LinkButton>
        </>
      }
    >
      <TextField
        name="email"
        id={id('email')}
        form={form}
        label="E-mail"
        type="email"
        autoComplete="email"
        hint="Only used for this run."
      />
      <div className="grid grid-cols-2 gap-4">
        <NumberField name="quantity" id={id('quantity')} form={form} label="How many" />
        <MoneyField name="price" id={id('price')} form={form} label="Price" currency="EUR" optional />
      </div>
      <NumberField name="weight" id={id('weight')} form={form} label="Weight" unit="g" decimal optional />
      <DateField name="until" id={id('until')} form={form} label="Decide by" />
      <SelectField
        name="country"
        id={id('country')}
        form={form}
        label="Country"
        options={[
          { value: 'IE', label: 'Ireland' },
          { value: 'JP', label: 'Japan' },
        ]}
      />
      <ChoiceField
        name="offer"
        id={id('offer')}
        form={form}
        label="Form"
        choices={[
          { value: 'boards', label: 'PCB and front panel set', aside: <Money minor={4500} currency="EUR" /> },
          {
            value: 'kit',
            label: 'Kit',
            hint: 'Surface-mounted parts fitted, the rest in bags',
            aside: <Money minor={9500} currency="EUR" />,
          },
          {
            value: 'built',
            label: 'Built and tested',
            hint: 'Sold out',
            aside: <Money minor={16500} currency="EUR" />,
            disabled: true,
          },
        ]}
      />
      <TextArea
        name="story"
        id={id('story')}
        form={form}
        label="Anything the maker should know, in as many words as it takes to say it"
        optional
        rows={3}
      />
      <CheckField
        name="agreed"
        id={id('agreed')}
        form={form}
        label="I have read what happens to my deposit, and when I can have it back."
      />
      <TypedConfirmation name="words" id={id('words')} form={form} words="41 orders" />
      <TextField
        name="shut"
        id={id('shut')}
        label="Not open now"
        disabled
        optional
        defaultValue="RB123456785IE"
      />
    </Form>
  )
}
