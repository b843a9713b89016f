import { Button } from '@/components/ui/button'
import { DeedForm, Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { TextField } from '@/components/ui/text-field'
import type { PartDesk } from '@/lib/contracts/part-forms'
import { partWords as words } from '@/lib/messages/parts'
import { paths } from '@/lib/paths'

type Props = { slug: string; module: string; part: PartDesk; form: FormState | undefined }

/** What may stand in for a part. */
export function AlternatesSheet({ slug, module, part, form }: Props) {
  const at = { ...(form && { form }) }
  return (
    <Sheet title={words.alternates} id="alternates">
      {part.alternates.length === 0 ? (
        <p className="pb-3 text-quiet">{words.noAlternates}</p>
      ) : (
        <ul className="flex flex-col gap-2 pb-4">
          {part.alternates.map(({ id, code, value, note, onHand }) => (
            <li key={id} className="flex flex-wrap items-baseline justify-between gap-x-4">
              <span>
                <a href={paths.adminPart(slug, module, id)}>{code}</a> {value}
                <span className="block text-15 text-quiet">
                  {words.inDrawer(onHand)} {note}
                </span>
              </span>
              <DeedForm
                action={paths.api.adminModulePart(slug, module, 'parts/alternates/remove')}
                hidden={{ part: part.id, alternate: id }}
              >
                <Button kind="plain" aria-label={words.removeAlternateOf(code)}>
                  {words.removeAlternate}
                </Button>
              </DeedForm>
            </li>
          ))}
        </ul>
      )}
      <Form
        action={paths.api.adminModulePart(slug, module, 'parts/alternates')}
        hidden={{ part: part.id }}
        {...at}
        foot={<Button kind="secondary">{words.addAlternate}</Button>}
      >
        <TextField name="code" label={words.alternateCode} {...at} />
        <TextField name="note" label={words.note} id="alternate-note" optional {...at} />
      </Form>
    </Sheet>
  )
}
