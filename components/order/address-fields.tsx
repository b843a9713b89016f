import { Disclosure } from '@/components/ui/disclosure'
import type { FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { TextField } from '@/components/ui/text-field'
import { COUNTRIES } from '@/lib/core/data/countries'
import { addressWords as words } from '@/lib/messages/orders'
import { LatinFields } from './latin-fields'

type Props = {
  /** '' where the body is the address itself, 'address.' where it is part of one. */
  prefix: '' | 'address.'
  form?: FormState
  /** Countries that can be chosen; all of them where none are given. */
  countries?: readonly string[]
}

/** Where something goes: in the buyer's own script, and in Latin letters where they differ. */
export function AddressFields({ prefix, form, countries }: Props) {
  const at = (name: string) => `${prefix}${name}`
  const hasLatin = Boolean(form?.values?.[at('latin.name')])
  return (
    <>
      <SelectField
        name={at('country')}
        label={words.country}
        options={optionsOf(countries)}
        form={form}
        autoComplete="country"
      />
      <TextField name={at('name')} label={words.name} form={form} autoComplete="name" />
      <TextField
        name={at('organization')}
        label={words.organization}
        form={form}
        autoComplete="organization"
        optional
      />
      {[1, 2, 3].map((n) => (
        <TextField
          key={n}
          name={at(`lines.${n - 1}`)}
          label={words.line(n)}
          form={form}
          autoComplete={`address-line${n}`}
          optional={n > 1}
        />
      ))}
      <TextField
        name={at('postcode')}
        label={words.postcode}
        form={form}
        hint={words.postcodeHint}
        autoComplete="postal-code"
        required={false}
      />
      <TextField
        name={at('city')}
        label={words.city}
        form={form}
        autoComplete="address-level2"
        required={false}
      />
      <TextField
        name={at('region')}
        label={words.region}
        form={form}
        autoComplete="address-level1"
        optional
      />
      <TextField
        name={at('phone')}
        type="tel"
        label={words.phone}
        hint={words.phoneHint}
        form={form}
        autoComplete="tel"
        optional
      />
      <TextField
        name={at('taxNumber')}
        label={words.taxNumber}
        hint={words.taxNumberHint}
        form={form}
        optional
      />
      <Disclosure summary={words.latinSummary} open={hasLatin}>
        <LatinFields prefix={prefix} form={form} />
      </Disclosure>
    </>
  )
}

function optionsOf(countries: readonly string[] | undefined) {
  return Object.entries(COUNTRIES)
    .filter(([code]) => countries === undefined || countries.includes(code))
    .map(([value, { name }]) => ({ value, label: name }))
    .sort((a, b) => a.label.localeCompare(b.label))
}
