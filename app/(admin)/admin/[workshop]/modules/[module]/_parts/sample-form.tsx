import { Button } from '@/components/ui/button'
import { ChoiceField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { DateField, TextField } from '@/components/ui/text-field'
import type { PartsDesk } from '@/lib/contracts/module-desk'
import { partsAdminWords as words } from '@/lib/messages/parts-admin'
import { paths } from '@/lib/paths'

type Props = {
  slug: string
  module: string
  lines: readonly Pick<PartsDesk['lines'][number], 'partId' | 'code' | 'sample'>[]
  today: string
}

/** Records whether a sample of a marked part fits; nothing where no part is marked. */
export function SampleForm({ slug, module, lines, today }: Props) {
  const marked = lines.filter(({ sample }) => sample !== 'not_needed')
  if (marked.length === 0) return null
  return (
    <Sheet title={words.sampleTitle} id="sample">
      <Form
        action={paths.api.adminModulePart(slug, module, 'samples')}
        foot={<Button kind="secondary">{words.record}</Button>}
      >
        <p className="max-w-words text-quiet">{words.sampleLead}</p>
        <SelectField
          name="part"
          label={words.samplePart}
          options={marked.map(({ partId, code, sample }) => ({
            value: partId,
            label: `${code} (${words.samples[sample]})`,
          }))}
        />
        <ChoiceField
          name="fits"
          label={words.sampleFits}
          choices={[
            { value: 'yes', label: words.yes },
            { value: 'no', label: words.no },
          ]}
        />
        <DateField name="on" label={words.sampleOn} defaultValue={today} max={today} />
        <TextField name="note" label={words.sampleNote} optional width="full" />
      </Form>
    </Sheet>
  )
}
