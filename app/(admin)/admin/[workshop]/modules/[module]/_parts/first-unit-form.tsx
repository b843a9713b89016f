import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { typedText, type FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { DateField } from '@/components/ui/text-field'
import type { MemberView } from '@/lib/contracts/settings'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { paths } from '@/lib/paths'

type Props = {
  slug: string
  module: string
  revisions: readonly string[]
  people: readonly MemberView[]
  today: string
  form?: FormState
}

/** Records that a unit of a revision passed: when, who saw it, how it was established. */
export function FirstUnitForm({ slug, module, revisions, people, today, form }: Props) {
  return (
    <Sheet title={words.firstUnitTitle} id="first-unit">
      <Form
        action={paths.api.adminModulePart(slug, module, 'first-unit')}
        form={form}
        foot={<Button kind="secondary">{words.record}</Button>}
      >
        <p className="max-w-words text-quiet">{words.firstUnitLead}</p>
        <SelectField
          name="revision"
          label={words.revision}
          id="first-unit-revision"
          options={revisions.map((letter) => ({ value: letter, label: letter }))}
          empty={false}
          defaultValue={typedText(form, 'revision') ?? revisions[0]}
          form={form}
          width="short"
        />
        <DateField
          name="on"
          label={words.on}
          form={form}
          defaultValue={typedText(form, 'on') ?? today}
          max={today}
        />
        <TextArea name="how" label={words.how} rows={3} form={form} />
        <SelectField
          name="by"
          label={words.by}
          options={people.map(({ personId, name, email }) => ({ value: personId, label: name ?? email }))}
          form={form}
          optional
        />
      </Form>
    </Sheet>
  )
}
