import { Money } from '@/components/format/money'
import { RowsField } from '@/components/forms/rows-field'
import { Button } from '@/components/ui/button'
import { CheckField } from '@/components/ui/choice-field'
import { DeedForm, Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { NumberField, TextField } from '@/components/ui/text-field'
import type { ChoiceDesk } from '@/lib/contracts/choice-forms'
import type { OfferKind } from '@/lib/contracts/fields'
import { choiceWords as words } from '@/lib/messages/choices'
import { paths } from '@/lib/paths'

type Props = {
  slug: string
  module: string
  offer: OfferKind
  currency: string
  choices: readonly ChoiceDesk[]
  form: FormState | undefined
}

/** The questions an offer asks, and one more. */
export function ChoicesSheet({ slug, module, offer, currency, choices, form }: Props) {
  const at = { ...(form && { form }) }
  return (
    <Sheet title={words.title} id="choices">
      <p className="max-w-words pb-3 text-quiet">{words.lead}</p>
      <ul className="flex flex-col pb-4">
        {choices
          .filter((choice) => choice.offer === offer)
          .map((choice) => (
            <li
              key={choice.id}
              className="flex flex-wrap items-baseline justify-between gap-x-4 border-t border-rule py-2"
            >
              <div>
                <p className="font-semibold">{choice.question}</p>
                <p className="text-15 text-quiet">{words.when(choice)}</p>
                <ul className="text-15">
                  {choice.answers.map((answer) => (
                    <li key={answer.id}>
                      {answer.label} <Money minor={answer.surchargeMinor} currency={currency} />
                      {answer.isDefault ? ` (${words.standsIn})` : ''}
                    </li>
                  ))}
                </ul>
              </div>
              <DeedForm
                action={paths.api.adminModulePart(slug, module, 'choices/retire')}
                hidden={{ choice: choice.id }}
              >
                <Button kind="plain" aria-label={words.retireNamed(choice.question)}>
                  {words.retire}
                </Button>
              </DeedForm>
            </li>
          ))}
      </ul>
      <Form
        action={paths.api.adminModulePart(slug, module, 'choices')}
        hidden={{ offer, currency }}
        {...at}
        foot={<Button kind="secondary">{words.add}</Button>}
      >
        <TextField name="question" label={words.question} hint={words.questionHint} {...at} />
        <RowsField
          name="answers"
          legend={words.answers}
          hint={words.answersHint}
          rowLabel={words.answer}
          spare={4}
          most={4}
          columns={[
            { name: 'label', label: words.label },
            { name: 'surcharge', label: words.surcharge, kind: 'decimal', unit: currency },
            { name: 'isDefault', label: words.standsIn, kind: 'tick' },
          ]}
          {...at}
        />
        <CheckField name="askedAfterLock" label={words.askedAfterLock} optional {...at} />
        <NumberField
          name="answerWithinDays"
          label={words.answerWithinDays}
          hint={words.answerWithinHint}
          unit={words.days}
          optional
          {...at}
        />
      </Form>
    </Sheet>
  )
}
