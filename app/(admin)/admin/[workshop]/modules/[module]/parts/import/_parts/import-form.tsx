import { Button } from '@/components/ui/button'
import { ChoiceField } from '@/components/ui/choice-field'
import { Disclosure } from '@/components/ui/disclosure'
import { FileField } from '@/components/ui/file-field'
import { Form } from '@/components/ui/form'
import { typedText, type FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import type { PartsDesk } from '@/lib/contracts/module-desk'
import { IMPORT_KINDS, type ImportKind } from '@/lib/contracts/part-import'
import { PART_HEADINGS, QUOTE_HEADINGS } from '@/lib/contracts/parts-list'
import { importWords as words } from '@/lib/messages/part-imports'
import { paths } from '@/lib/paths'

type Props = {
  slug: string
  module: string
  parts: Pick<PartsDesk, 'revisions' | 'revision' | 'csv'>
  kind: ImportKind
  form: FormState | undefined
}

/** Sends a file or a text to be looked at; the list there is stands in the text, to be edited as a whole. */
export function ImportForm({ slug, module, parts, kind, form }: Props) {
  const headings = kind === 'lines' ? PART_HEADINGS : QUOTE_HEADINGS
  return (
    <Sheet title={words.start} id="start">
      <Form
        action={paths.api.adminModulePart(slug, module, 'parts/import')}
        encType="multipart/form-data"
        {...(form && { form })}
        foot={<Button>{words.look}</Button>}
      >
        <ChoiceField
          name="kind"
          label={words.kind}
          choices={IMPORT_KINDS.map((value) => ({ value, label: words.kinds[value] }))}
          chosen={typedText(form, 'kind') ?? kind}
          {...(form && { form })}
        />
        <SelectField
          name="revision"
          label={words.revision}
          options={parts.revisions.map((letter) => ({ value: letter, label: letter }))}
          empty={false}
          defaultValue={typedText(form, 'revision') ?? parts.revision ?? ''}
          width="short"
          {...(form && { form })}
        />
        <FileField
          name="file"
          label={words.file}
          hint={words.fileHint}
          accept=".csv,.tsv,.txt,text/csv,text/tab-separated-values,text/plain"
          optional
          {...(form && { form })}
        />
        <TextArea
          name="text"
          label={words.text}
          hint={words.textHint}
          rows={12}
          className="figures max-w-none"
          spellCheck={false}
          wrap="off"
          optional
          defaultValue={typedText(form, 'text') ?? (kind === 'lines' ? parts.csv : '')}
          {...(form && { form })}
        />
        <Disclosure summary={words.columnsUsed}>
          <p className="figures text-13 break-words">{headings.join(', ')}</p>
        </Disclosure>
      </Form>
    </Sheet>
  )
}
