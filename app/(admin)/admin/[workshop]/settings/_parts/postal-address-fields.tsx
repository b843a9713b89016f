import type { FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { TextField } from '@/components/ui/text-field'
import { COUNTRIES } from '@/lib/core/data/countries'
import { settingsWords as words } from '@/lib/messages/settings'

const countries = Object.entries(COUNTRIES).map(([value, { name }]) => ({ value, label: name }))

/** Where the workshop can be written to. */
export function PostalAddressFields({ form }: { form: FormState }) {
  return (
    <Sheet title={words.address}>
      <div className="flex flex-col gap-5">
        <p className="max-w-words text-quiet">{words.addressLead}</p>
        <TextField name="postalAddress.name" label={words.addressName} form={form} autoComplete="name" />
        <TextField name="postalAddress.organization" label={words.organization} form={form} optional />
        {[0, 1, 2].map((line) => (
          <TextField
            key={line}
            name={`postalAddress.lines.${line}`}
            label={words.addressLine(line + 1)}
            form={form}
            optional={line > 0}
          />
        ))}
        <TextField name="postalAddress.postcode" label={words.postcode} form={form} width="short" optional />
        <TextField name="postalAddress.city" label={words.city} form={form} optional />
        <TextField name="postalAddress.region" label={words.region} form={form} optional />
        <SelectField name="postalAddress.country" label={words.country} options={countries} form={form} />
      </div>
    </Sheet>
  )
}
