import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { typedText, type FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { paths } from '@/lib/paths'

type Props = { slug: string; module: string; revisions: readonly string[]; form?: FormState }

/** Writes down what was learned on a revision. */
export function LessonForm({ slug, module, revisions, form }: Props) {
  return (
    <Sheet title={words.writeLesson} id="lesson">
      <Form
        action={paths.api.adminModulePart(slug, module, 'lessons')}
        form={form}
        foot={<Button kind="secondary">{words.writeLesson}</Button>}
      >
        <SelectField
          name="revision"
          label={words.revision}
          id="lesson-revision"
          options={revisions.map((letter) => ({ value: letter, label: letter }))}
          empty={false}
          defaultValue={typedText(form, 'revision') ?? revisions[0]}
          form={form}
          width="short"
        />
        <TextArea name="symptom" label={words.symptom} rows={2} form={form} />
        <TextArea name="howFound" label={words.howFound} rows={2} form={form} optional />
        <TextArea name="cause" label={words.cause} rows={2} form={form} optional />
        <TextArea name="remedy" label={words.remedy} rows={2} form={form} optional />
      </Form>
    </Sheet>
  )
}
