import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { TextField } from '@/components/ui/text-field'
import type { ParcelPage } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'

/** The service, offered from the country's zone or typed, and the tracking number as scanned. */
export function HandOverForm({ slug, parcel, form }: { slug: string; parcel: ParcelPage; form?: FormState }) {
  const { services, quotedService } = parcel
  const usual = quotedService ?? services[0]?.name ?? ''
  const values = { service: usual, ...form?.values }
  const hint = quotedService ? `${words.serviceHint} ${words.quoted(quotedService)}` : words.serviceHint
  return (
    <Sheet title={words.handOverTitle} id="hand-over">
      <Form
        action={paths.api.packingParcel(slug, parcel.parcel, 'hand-over')}
        form={form}
        foot={<Button>{words.handOverButton}</Button>}
      >
        <TextField
          name="service"
          label={words.service}
          hint={hint}
          form={{ ...form, values }}
          list="services"
          autoComplete="off"
        />
        <datalist id="services">
          {services.map(({ name }) => (
            <option key={name} value={name} />
          ))}
        </datalist>
        <TextField
          name="tracking"
          label={words.tracking}
          hint={words.trackingHint}
          form={form}
          className="figures"
          autoComplete="off"
          autoCapitalize="characters"
          spellCheck={false}
          optional
        />
        <p className="max-w-words text-15 text-quiet">{words.handOverNote}</p>
      </Form>
    </Sheet>
  )
}
