import { keptForm } from '@/components/forms/kept-form'
import { Button, LinkButton } from '@/components/ui/button'
import { ChoiceField } from '@/components/ui/choice-field'
import { Empty } from '@/components/ui/empty'
import { Form } from '@/components/ui/form'
import { SelectField } from '@/components/ui/select-field'
import { TextArea } from '@/components/ui/text-area'
import { DateField, NumberField } from '@/components/ui/text-field'
import { atTypedRows } from '@/lib/contracts/run-forms'
import type { RunTemplate } from '@/lib/contracts/run-page'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import type { KeptForm } from '@/lib/queries/forms/get-form-draft'
import { OfferRow } from './offer-row'

type Kept = KeptForm | null
type Props = { workshop: string; template: RunTemplate; kept: Kept }

const balances = (['at_lock', 'units_passed', 'before_packing'] as const).map((value) => ({
  value,
  label: words.balanceChoices[value],
}))

/** A run before anybody sees it: how many, until when, at which price and by when. */
export function RunForm({ workshop, template, kept }: Props) {
  const { module, revisions, offers, currency, headStartHours } = template
  const usable = revisions.filter(({ state }) => state !== 'superseded')
  const lacks = offers.length === 0 ? words.noOffers : usable.length === 0 ? words.noRevisions : null
  if (lacks !== null)
    return (
      <Empty action={<LinkButton href={paths.adminModule(workshop, module.slug)}>{module.name}</LinkButton>}>
        {lacks}
      </Empty>
    )
  const form = keptForm(kept && { ...kept, errors: atTypedRows(kept, 'offers', 'postedBy') })
  return (
    <Form
      action={paths.api.adminRuns(workshop)}
      form={form}
      hidden={{ module: module.slug, currency }}
      foot={<Button>{words.draft}</Button>}
    >
      <SelectField
        name="revision"
        label={words.revision}
        options={usable.map(({ letter }) => ({ value: letter, label: letter }))}
        empty={false}
        width="short"
        form={form}
      />
      <NumberField name="minimum" label={words.minimumLabel} hint={words.minimumHint} form={form} />
      <NumberField name="maximum" label={words.maximumLabel} hint={words.maximumHint} form={form} />
      <DateField name="decideBy" label={words.decideByLabel} hint={words.decideByHint} form={form} />
      <NumberField
        name="headStartHours"
        label={words.headStart}
        unit={words.headStartUnit}
        {...(form ? {} : { defaultValue: headStartHours })}
        form={form}
      />
      <ChoiceField
        name="balanceWhen"
        label={words.balanceWhen}
        hint={words.balanceWhenHint}
        choices={balances}
        chosen="before_packing"
        form={form}
      />
      <fieldset className="min-w-0 border border-quiet px-3 pb-4">
        <legend className="-ml-0.5 px-1.5 text-13 font-semibold">{words.offersLegend}</legend>
        <p className="pb-3 text-13 text-quiet">{words.offersHint}</p>
        {offers.map((offer, index) => (
          <OfferRow key={offer.offer} index={index} currency={currency} form={form} {...offer} />
        ))}
      </fieldset>
      <TextArea
        name="holdingPlan"
        label={words.holdingPlan}
        hint={words.holdingPlanHint}
        optional
        form={form}
      />
    </Form>
  )
}
