import { Button } from '@/components/ui/button'
import { Disclosure } from '@/components/ui/disclosure'
import { Form } from '@/components/ui/form'
import { typedText, type FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import type { PartsDesk } from '@/lib/contracts/module-desk'
import { PART_HEADINGS } from '@/lib/contracts/parts-list'
import { partsAdminWords as words } from '@/lib/messages/parts-admin'
import { paths } from '@/lib/paths'

type Props = { slug: string; module: string; parts: PartsDesk; form: FormState }

/** The list as text, to be pasted or edited as a whole. */
export function PartsForm({ slug, module, parts, form }: Props) {
  return (
    <Sheet title={words.csv} id="list">
      <Form
        action={paths.api.adminModulePart(slug, module, 'parts')}
        form={form}
        foot={<Button>{words.save}</Button>}
      >
        <SelectField
          name="revision"
          label={words.revision}
          options={parts.revisions.map((letter) => ({ value: letter, label: letter }))}
          empty={false}
          defaultValue={typedText(form, 'revision') ?? parts.revision ?? ''}
          form={form}
          width="short"
        />
        <TextArea
          name="csv"
          label={words.csv}
          hint={words.csvHint}
          rows={12}
          form={form}
          className="figures max-w-none"
          spellCheck={false}
          wrap="off"
        />
        <Disclosure summary={words.columns}>
          <p className="figures text-13 break-words">{PART_HEADINGS.join(', ')}</p>
        </Disclosure>
      </Form>
    </Sheet>
  )
}
