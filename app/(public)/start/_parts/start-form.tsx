import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { TextField } from '@/components/ui/text-field'
import { COUNTRIES } from '@/lib/core/data/countries'
import { workshopWords as words } from '@/lib/messages/workshops'
import { paths } from '@/lib/paths'

const countries = Object.entries(COUNTRIES).map(([value, { name }]) => ({ value, label: name }))

/** What a workshop needs to exist; everything else is entered at its desk. */
export function StartForm({ form, email }: { form?: FormState; email: string }) {
  return (
    <Form action={paths.api.workshops} contract="workshop" form={form} foot={<Button>{words.start}</Button>}>
      <TextField
        name="name"
        label={words.name}
        hint={words.nameHint}
        form={form}
        autoComplete="organization"
      />
      <TextField name="slug" label={words.slug} hint={words.slugHint} form={form} autoCapitalize="none" />
      <TextField name="legalName" label={words.legalName} hint={words.legalNameHint} form={form} />
      <SelectField name="country" label={words.country} options={countries} form={form} />
      <TextField name="currency" label={words.currency} hint={words.currencyHint} width="short" form={form} />
      <TextField name="timeZone" label={words.timeZone} hint={words.timeZoneHint} form={form} />
      <TextField
        name="replyTo"
        type="email"
        label={words.replyTo}
        form={form}
        {...(form ? {} : { defaultValue: email })}
      />
    </Form>
  )
}
