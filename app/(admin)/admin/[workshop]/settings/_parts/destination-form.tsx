import { Button } from '@/components/ui/button'
import { ChoiceField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { TextField } from '@/components/ui/text-field'
import { COUNTRIES } from '@/lib/core/data/countries'
import { settingsWords as words } from '@/lib/messages/settings'
import { paths } from '@/lib/paths'

const countries = Object.entries(COUNTRIES).map(([value, { name }]) => ({ value, label: name }))
const states = Object.entries(words.destinationStates).map(([value, label]) => ({ value, label }))

type Props = {
  slug: string
  form?: FormState
  modules: readonly { slug: string; name: string }[]
}

/** Opens, closes or pauses one country. */
export function DestinationForm({ slug, form, modules }: Props) {
  return (
    <Form
      action={paths.api.adminSettings(slug, 'destinations')}
      form={form}
      foot={<Button>{words.save}</Button>}
    >
      <SelectField name="country" label={words.country} options={countries} form={form} />
      <SelectField
        name="module"
        label={words.destinationModule}
        options={modules.map((each) => ({ value: each.slug, label: each.name }))}
        empty={words.allModules}
        form={form}
        optional
      />
      <ChoiceField name="state" label={words.destinationState} choices={states} form={form} />
      <TextField name="reason" label={words.reason} form={form} optional width="full" />
    </Form>
  )
}
