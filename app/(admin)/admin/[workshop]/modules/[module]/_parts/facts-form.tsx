import { RowsField } from '@/components/forms/rows-field'
import { Button } from '@/components/ui/button'
import { CheckField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { NumberField, TextField } from '@/components/ui/text-field'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { paths } from '@/lib/paths'

const kinds = Object.entries(words.controlKinds).map(([value, label]) => ({ value, label }))
const RAILS = ['plus12Ma', 'minus12Ma', 'plus5Ma'] as const

type Props = { slug: string; module: string; form: FormState }

/** Everything the page of a module says. */
export function FactsForm({ slug, module, form }: Props) {
  return (
    <Form
      action={paths.api.adminModule(slug, module)}
      contract="moduleFacts"
      form={form}
      foot={<Button>{words.save}</Button>}
    >
      <TextField name="name" label={words.name} form={form} />
      <TextField name="oneLine" label={words.oneLine} hint={words.oneLineHint} form={form} width="full" />
      <TextArea name="story" label={words.story} rows={8} form={form} optional />
      <TextArea name="cautions" label={words.cautionsTitle} hint={words.cautionsHint} rows={8} form={form} />
      <Sheet title={words.power}>
        <div className="flex flex-wrap gap-4">
          <NumberField name="widthHp" label={words.widthHp} unit={words.hp} form={form} />
          <NumberField name="depthMm" label={words.depthMm} unit={words.millimetres} form={form} />
          {RAILS.map((rail) => (
            <NumberField key={rail} name={rail} label={words[rail]} unit={words.milliamperes} form={form} />
          ))}
        </div>
      </Sheet>
      <RowsField
        name="controls"
        legend={words.controls}
        hint={words.controlsHint}
        rowLabel={words.controlRow}
        form={form}
        spare={4}
        most={120}
        columns={[
          { name: 'kind', label: words.controlKind, kind: 'select', options: kinds },
          { name: 'label', label: words.label },
          { name: 'xMm', label: words.xMm, kind: 'decimal', unit: words.millimetres },
          { name: 'yMm', label: words.yMm, kind: 'decimal', unit: words.millimetres },
          { name: 'sizeMm', label: words.sizeMm, kind: 'decimal', unit: words.millimetres },
        ]}
      />
      <RowsField
        name="specification"
        legend={words.specification}
        rowLabel={words.specificationRow}
        form={form}
        spare={3}
        most={30}
        columns={[
          { name: 'name', label: words.name },
          { name: 'value', label: words.value },
        ]}
      />
      <TextField name="videoUrl" type="url" label={words.videoUrl} form={form} optional width="full" />
      <CheckField name="hideInterestBelowTen" label={words.hideInterest} form={form} optional />
    </Form>
  )
}
