import { Button } from '@/components/ui/button'
import { CheckField, ChoiceField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { NumberField, TextField } from '@/components/ui/text-field'
import type { TaxRateView } from '@/lib/contracts/settings'
import { settingsWords as words } from '@/lib/messages/settings'
import { writtenDay, writtenPercent } from '@/lib/messages/written'
import { paths } from '@/lib/paths'
import { PostalAddressFields } from './postal-address-fields'

type Props = { slug: string; form: FormState; homeRate: TaxRateView | null }

/** Who the workshop is, where it can be written to, how it charges tax, what new runs start from. */
export function DetailsForm({ slug, form, homeRate }: Props) {
  return (
    <Form
      action={paths.api.adminSettings(slug, 'details')}
      contract="details"
      form={form}
      foot={<Button>{words.save}</Button>}
    >
      <Sheet title={words.who}>
        <div className="flex flex-col gap-5">
          <TextField name="name" label={words.name} form={form} />
          <TextField name="legalName" label={words.legalName} form={form} />
          <TextField name="replyTo" type="email" label={words.replyTo} form={form} />
          <TextField name="phone" type="tel" label={words.phone} form={form} optional />
          <TextArea name="about" label={words.about} hint={words.aboutHint} form={form} optional />
        </div>
      </Sheet>
      <PostalAddressFields form={form} />
      <Sheet title={words.tax}>
        <div className="flex flex-col gap-5">
          <p className="max-w-words text-quiet">{words.taxLead}</p>
          <ChoiceField
            name="taxMode"
            label={words.taxMode}
            form={form}
            choices={Object.entries(words.taxModes).map(([value, label]) => ({ value, label }))}
          />
          <p className="text-15 text-quiet">
            {homeRate
              ? words.homeRate(
                  writtenPercent(homeRate.basisPoints / 10_000, {
                    digits: homeRate.basisPoints % 100 === 0 ? 0 : 1,
                  }),
                  writtenDay(homeRate.validFrom),
                  homeRate.source,
                )
              : words.noHomeRate}
          </p>
          <CheckField name="pricesIncludeTax" label={words.pricesIncludeTax} form={form} optional />
          <CheckField
            name="depositsTaxed"
            label={words.depositsTaxed}
            hint={words.depositsTaxedHint}
            form={form}
            optional
          />
          <TextField name="taxNumber" label={words.taxNumber} form={form} optional />
          <TextField name="taxNote" label={words.taxNote} form={form} optional width="full" />
        </div>
      </Sheet>
      <Sheet title={words.runs}>
        <div className="flex flex-col gap-5">
          <NumberField name="headStartHours" label={words.headStartHours} unit={words.hours} form={form} />
          <NumberField name="limitPerPerson" label={words.limitPerPerson} unit={words.units} form={form} />
          <NumberField name="lapseAfterDays" label={words.lapseAfterDays} unit={words.days} form={form} />
        </div>
      </Sheet>
    </Form>
  )
}
