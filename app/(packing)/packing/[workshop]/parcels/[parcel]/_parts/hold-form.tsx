import { Button } from '@/components/ui/button'
import { Disclosure } from '@/components/ui/disclosure'
import { DeedForm, Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { TextField } from '@/components/ui/text-field'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'

type Props = { slug: string; parcel: string; isOnHold: boolean; form?: FormState }

/** Sets a parcel aside with the reason, or lets it go on. */
export function HoldForm({ slug, parcel, isOnHold, form }: Props) {
  if (isOnHold)
    return (
      <DeedForm action={paths.api.packingParcel(slug, parcel, 'release')}>
        <Button kind="secondary">{words.hold.release}</Button>
      </DeedForm>
    )
  return (
    <Disclosure summary={words.hold.title} open={form !== undefined}>
      <Form
        action={paths.api.packingParcel(slug, parcel, 'hold')}
        form={form}
        foot={<Button kind="secondary">{words.hold.button}</Button>}
      >
        <TextField
          name="reason"
          label={words.hold.reason}
          hint={words.hold.hint}
          form={form}
          width="full"
          autoComplete="off"
        />
      </Form>
    </Disclosure>
  )
}
