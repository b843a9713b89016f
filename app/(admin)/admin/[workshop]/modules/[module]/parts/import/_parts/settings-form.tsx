import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { typedText, type FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { DELIMITERS, ENCODINGS, type ImportPreview } from '@/lib/contracts/part-import'
import { importWords as words } from '@/lib/messages/part-imports'
import { offerWords } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

const OFFERS = ['boards', 'kit', 'built'] as const
const placers = Object.entries(words.placers).map(([value, label]) => ({ value, label }))

type Props = { slug: string; module: string; preview: ImportPreview; form: FormState | undefined }

/** How the file was read, to be put right. */
export function SettingsForm({ slug, module, preview, form }: Props) {
  const { id, encoding, delimiter, columns, headings, placedBy, kind, fileName, lines } = preview
  const known = [
    { value: '', label: words.leftOut },
    ...headings.map((heading) => ({ value: heading, label: heading })),
  ]
  const given = (name: string, now: string) => ({
    name,
    empty: false as const,
    defaultValue: typedText(form, name) ?? now,
    ...(form && { form }),
  })
  return (
    <Sheet title={words.how} id="how">
      <Form
        action={paths.api.adminModulePart(slug, module, 'parts/import/settings')}
        hidden={{ import: id }}
        {...(form && { form })}
        foot={<Button kind="secondary">{words.readAgain}</Button>}
      >
        <p className="text-quiet">{words.fromFile(fileName, lines)}</p>
        <div className="grid gap-4 sm:grid-cols-2">
          <SelectField
            label={words.encoding}
            hint={words.encodingHint}
            options={ENCODINGS.map((value) => ({ value, label: words.encodings[value] }))}
            {...given('encoding', encoding)}
          />
          <SelectField
            label={words.delimiter}
            options={DELIMITERS.map((value) => ({ value, label: words.delimiters[value] }))}
            {...given('delimiter', delimiter)}
          />
        </div>
        {columns.length > 0 ? (
          <fieldset className="min-w-0">
            <legend className="text-17 font-semibold">{words.columns}</legend>
            <p className="pb-3 text-13 text-quiet">{words.columnsHint}</p>
            <div className="grid items-end gap-4 sm:grid-cols-2 lg:grid-cols-3">
              {columns.map(({ heading, as, example }, i) => (
                <SelectField
                  key={i}
                  label={heading || String(i + 1)}
                  hint={as === '' ? undefined : words.example(example)}
                  options={known}
                  {...given(`columns.${i}`, as)}
                />
              ))}
            </div>
          </fieldset>
        ) : null}
        {kind === 'lines' ? (
          <fieldset className="min-w-0">
            <legend className="pb-3 text-17 font-semibold">{words.placedBy}</legend>
            <div className="grid gap-4 sm:grid-cols-3">
              {OFFERS.map((offer) => (
                <SelectField
                  key={offer}
                  label={offerWords[offer]}
                  options={placers}
                  {...given(`placedBy.${offer}`, placedBy[offer] ?? '')}
                />
              ))}
            </div>
          </fieldset>
        ) : null}
      </Form>
    </Sheet>
  )
}
