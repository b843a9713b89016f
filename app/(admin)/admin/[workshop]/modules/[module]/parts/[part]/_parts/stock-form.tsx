import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { typedText, type FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { NumberField, TextField } from '@/components/ui/text-field'
import type { PartDesk } from '@/lib/contracts/part-forms'
import { partWords as words } from '@/lib/messages/parts'
import { paths } from '@/lib/paths'

type Props = { slug: string; module: string; part: PartDesk; form: FormState | undefined }

/** Says how many were counted. */
export function StockForm({ slug, module, part, form }: Props) {
  const at = { ...(form && { form }) }
  return (
    <Sheet title={words.countStock} id="stock">
      <Form
        action={paths.api.adminModulePart(slug, module, 'parts/stock')}
        hidden={{ part: part.id }}
        {...at}
        foot={<Button kind="secondary">{words.countStock}</Button>}
      >
        <NumberField
          name="onHand"
          label={words.onHand}
          hint={words.onHandHint}
          defaultValue={typedText(form, 'onHand') ?? String(part.onHand)}
          {...at}
        />
        <TextField name="note" label={words.note} optional {...at} />
      </Form>
    </Sheet>
  )
}
