import { Button } from '@/components/ui/button'
import { CheckField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { MoneyField, NumberField, TextField } from '@/components/ui/text-field'
import type { OfferKind } from '@/lib/contracts/fields'
import { COUNTRIES } from '@/lib/core/data/countries'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { offerWords } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

const countries = Object.entries(COUNTRIES).map(([value, { name }]) => ({ value, label: name }))
const taxClasses = Object.entries(words.taxClasses).map(([value, label]) => ({ value, label }))

type Props = { slug: string; module: string; offer: OfferKind; currency: string; form: FormState }

/** One form in which a module is sold. */
export function OfferForm({ slug, module, offer, currency, form }: Props) {
  const size = { unit: words.millimetres, form, optional: true } as const
  const weight = { unit: words.grams, form, optional: true } as const
  return (
    <Form
      action={paths.api.adminModulePart(slug, module, 'offers')}
      contract="offer"
      form={form}
      hidden={{ offer, currency }}
      foot={<Button>{words.save}</Button>}
    >
      <Sheet title={offerWords[offer]}>
        <div className="flex flex-col gap-5">
          <p className="text-quiet">{words.priceHint}</p>
          <MoneyField name="priceMinor" label={words.price} currency={currency} form={form} optional />
          <MoneyField name="depositMinor" label={words.deposit} currency={currency} form={form} optional />
          <TextField
            name="priceList"
            label={words.priceList}
            hint={words.priceListHint}
            form={form}
            optional
          />
          <SelectField
            name="taxClass"
            label={words.taxClass}
            options={taxClasses}
            empty={false}
            form={form}
            width="short"
          />
          <TextArea name="contents" label={words.contents} form={form} optional />
        </div>
      </Sheet>
      <Sheet title={words.post}>
        <div className="flex flex-wrap gap-4">
          <NumberField name="netWeightG" label={words.netWeightG} {...weight} />
          <NumberField name="packedWeightG" label={words.packedWeightG} {...weight} />
          <NumberField name="lengthMm" label={words.lengthMm} {...size} />
          <NumberField name="widthMm" label={words.widthOfParcel} {...size} />
          <NumberField name="heightMm" label={words.heightMm} {...size} />
        </div>
      </Sheet>
      <Sheet title={words.customs}>
        <div className="flex flex-col gap-5">
          <TextField
            name="customsDescription"
            label={words.customsDescription}
            form={form}
            optional
            width="full"
          />
          <TextField
            name="customsCode"
            label={words.customsCode}
            hint={words.customsCodeHint}
            form={form}
            inputMode="numeric"
            optional
          />
          <SelectField
            name="customsOrigin"
            label={words.customsOrigin}
            options={countries}
            form={form}
            optional
          />
          <TextField
            name="storagePlace"
            label={words.storagePlace}
            hint={words.storagePlaceHint}
            form={form}
            optional
          />
        </div>
      </Sheet>
      <TextArea name="cautions" label={words.offerCautions} form={form} optional />
      <NumberField name="ageFrom" label={words.ageFrom} unit={words.years} form={form} />
      <CheckField name="withdrawn" label={words.withdrawn} form={form} optional />
    </Form>
  )
}
