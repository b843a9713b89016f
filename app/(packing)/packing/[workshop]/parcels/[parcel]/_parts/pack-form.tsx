import { Button } from '@/components/ui/button'
import { CheckField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { NumberField } from '@/components/ui/text-field'
import type { ParcelPage } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { TickLines } from './tick-lines'

type Props = {
  slug: string
  parcel: ParcelPage
  form?: FormState
  /** Whether the scale surprised just now: only then may somebody say that the weight is right. */
  surprise: boolean
}

/** Tick what goes in, weigh it. Posted by the browser itself, so that a scanner's Enter is enough. */
export function PackForm({ slug, parcel, form, surprise }: Props) {
  const { expectedGrams, toleranceGrams, noticesLightest } = parcel
  const expected =
    expectedGrams === null || toleranceGrams === null
      ? words.noExpected
      : words.expected(expectedGrams, toleranceGrams)
  return (
    <Sheet title={words.lines} id="pack">
      <Form
        action={paths.api.packingParcel(slug, parcel.parcel, 'pack')}
        form={form}
        foot={<Button>{words.packed}</Button>}
      >
        <TickLines lines={parcel.lines} form={form} />
        <NumberField
          name="grams"
          label={words.grams}
          unit="g"
          hint={expectedGrams !== null && !noticesLightest ? `${expected} ${words.scaleBlind}` : expected}
          form={form}
          width="medium"
        />
        {surprise ? <CheckField name="weightConfirmed" label={words.confirm} optional /> : null}
        <fieldset>
          <legend className="pb-3 text-15 font-semibold">{words.size}</legend>
          <div className="flex flex-wrap gap-3">
            <NumberField name="lengthMm" label={words.length} unit="mm" form={form} optional />
            <NumberField name="widthMm" label={words.width} unit="mm" form={form} optional />
            <NumberField name="heightMm" label={words.height} unit="mm" form={form} optional />
          </div>
        </fieldset>
      </Form>
    </Sheet>
  )
}
