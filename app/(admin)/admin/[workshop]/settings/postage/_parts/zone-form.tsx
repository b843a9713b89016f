import { filledRows, RowsField } from '@/components/forms/rows-field'
import { Button } from '@/components/ui/button'
import { CheckField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import { typedText, type FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { NumberField, TextField } from '@/components/ui/text-field'
import { settingsWords as words } from '@/lib/messages/settings'
import { paths } from '@/lib/paths'

const kinds = Object.entries(words.kinds).map(([value, label]) => ({ value, label }))

type Props = { slug: string; form: FormState; zone?: string | undefined; currency: string }

/** One zone with its services, each with its prices by weight. */
export function ZoneForm({ slug, form, zone, currency }: Props) {
  const services = Array.from({ length: Math.min(4, Math.max(2, filledRows(form, 'services'))) })
  return (
    <Sheet id="zone" title={zone ? words.zoneChange : words.zoneAdd}>
      <Form
        action={paths.api.adminSettings(slug, 'postage')}
        contract="postage"
        form={form}
        hidden={{ currency, ...(zone && { zone }) }}
        foot={<Button>{words.save}</Button>}
      >
        <TextField name="name" label={words.zoneName} form={form} />
        <TextArea name="countries" label={words.countries} hint={words.countriesHint} rows={2} form={form} />
        {services.map((_, at) => (
          <ServiceFields key={at} at={at} form={form} currency={currency} />
        ))}
      </Form>
    </Sheet>
  )
}

function ServiceFields({ at, form, currency }: { at: number; form: FormState; currency: string }) {
  const name = (field: string) => `services.${at}.${field}`
  const field = { form, required: at === 0 }
  return (
    <fieldset className="flex min-w-0 flex-col gap-4 border-t border-rule pt-3">
      <legend className="text-17 font-semibold">{words.service(at + 1)}</legend>
      {at > 0 ? <p className="text-15 text-quiet">{words.serviceOptional}</p> : null}
      <TextField name={name('name')} label={words.serviceName} {...field} />
      <SelectField
        name={name('kind')}
        label={words.kind}
        options={kinds}
        defaultValue={typedText(form, name('kind')) ?? 'parcel'}
        {...field}
      />
      <div className="flex flex-wrap gap-4">
        <NumberField name={name('maxGrams')} label={words.maxGrams} unit={words.grams} {...field} />
        <NumberField name={name('maxMm')} label={words.maxMm} unit={words.millimetres} {...field} />
      </div>
      <CheckField name={name('tracked')} label={words.tracked} form={form} checked optional />
      <RowsField
        name={name('bands')}
        legend={words.bands}
        rowLabel={words.row}
        form={form}
        spare={2}
        most={8}
        columns={[
          { name: 'upTo', label: words.upTo, kind: 'number', unit: words.grams },
          { name: 'priceMinor', label: words.price, kind: 'decimal', unit: currency },
        ]}
      />
    </fieldset>
  )
}
