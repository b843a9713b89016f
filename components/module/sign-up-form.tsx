import { Button } from '@/components/ui/button'
import { ChoiceField, CheckField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { NumberField, TextField } from '@/components/ui/text-field'
import { Money } from '@/components/format/money'
import type { PageOffer } from '@/lib/contracts/module-page'
import { COUNTRIES } from '@/lib/core/data/countries'
import { offerNames } from '@/lib/messages/mails/words'
import { offerWords } from '@/lib/messages/public'
import { signUpWords as words } from '@/lib/messages/signups'
import { paths } from '@/lib/paths'

type Props = {
  workshop: string
  module: string
  currency: string
  offers: readonly PageOffer[]
  /** What was typed, when it comes back with its mistakes. */
  form?: FormState
}

const countries = Object.entries(COUNTRIES).map(([value, { name }]) => ({ value, label: name }))
const sureness = Object.entries(words.certainties).map(([value, [label, hint]]) => ({ value, label, hint }))

/** The statement of interest, posted by the browser itself; the same on the kept page and where it comes back. */
export function SignUpForm({ workshop, module, currency, offers, form }: Props) {
  const prices = topPrices(offers)
  const only = offers.length === 1 ? offers[0]?.offer : undefined
  return (
    <Form
      action={paths.api.signUps}
      contract="signUp"
      form={form}
      hidden={{ workshop, module }}
      foot={<Button>{words.send}</Button>}
    >
      <ChoiceField
        name="offer"
        label={words.offer}
        form={form}
        chosen={only}
        choices={offers.map(({ offer, priceMinor }) => ({
          value: offer,
          label: offerWords[offer],
          aside: priceMinor === null ? null : <Money minor={priceMinor} currency={currency} />,
        }))}
      />
      <NumberField
        name="quantity"
        label={words.quantity}
        hint={words.quantityHint}
        form={form}
        defaultValue={form ? undefined : '1'}
      />
      <SelectField
        name="country"
        label={words.country}
        options={countries}
        form={form}
        autoComplete="country"
      />
      <ChoiceField name="certainty" label={words.certainty} form={form} choices={sureness} />
      {prices.length > 0 ? (
        <ChoiceField
          name="topPriceMinor"
          label={words.topPrice}
          hint={topPriceHint(offers)}
          form={form}
          optional
          choices={[
            ...prices.map(({ minor, hint }) => ({
              value: String(minor),
              label: <Money minor={minor} currency={currency} />,
              hint,
            })),
            { value: '', label: words.noTopPrice },
          ]}
        />
      ) : null}
      <TextField
        name="email"
        type="email"
        label={words.email}
        hint={words.emailHint}
        form={form}
        autoComplete="email"
      />
      <CheckField name="updates" label={words.updates} form={form} optional />
    </Form>
  )
}

const isOpen = ({ priceListMinor }: PageOffer) => priceListMinor.length > 0
const named = (offers: readonly PageOffer[]) => offers.map(({ offer }) => offerNames[offer]).join(', ')

/** Names the forms it is asked for, where other forms have their price. */
function topPriceHint(offers: readonly PageOffer[]): string {
  const open = offers.filter(isOpen)
  return open.length < offers.length
    ? `${words.topPriceHint} ${words.topPriceOnly(named(open))}`
    : words.topPriceHint
}

/** Each price once, naming its forms where the open ones are asked by different lists. */
function topPrices(offers: readonly PageOffer[]): { minor: number; hint?: string }[] {
  const open = offers.filter(isOpen)
  const prices = [...new Set(open.flatMap(({ priceListMinor }) => priceListMinor))].sort((a, b) => a - b)
  return prices.map((minor) => {
    const asking = open.filter(({ priceListMinor }) => priceListMinor.includes(minor))
    return { minor, ...(open.length > 1 && { hint: words.topPriceFor(named(asking)) }) }
  })
}
