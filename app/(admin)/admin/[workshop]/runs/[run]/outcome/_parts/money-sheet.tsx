import { Money } from '@/components/format/money'
import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { Disclosure } from '@/components/ui/disclosure'
import { Facts } from '@/components/ui/facts'
import { Form } from '@/components/ui/form'
import { Sheet } from '@/components/ui/sheet'
import { MoneyField, NumberField } from '@/components/ui/text-field'
import type { RunOutcome } from '@/lib/contracts/run-outcome'
import { plainMoney } from '@/lib/core/money/plain'
import { outcomeWords as words } from '@/lib/messages/outcome'
import { writtenNumber, writtenPercent } from '@/lib/messages/written'
import { paths } from '@/lib/paths'
import type { KeptForm } from '@/lib/queries/forms/get-form-draft'

type Props = { outcome: RunOutcome; kept: KeptForm | null }

/** Units, planned and actual cost, yield, and what was taken and paid back. */
export function MoneySheet({ outcome, kept }: Props) {
  const { money, run, units, workshop, decisions } = outcome
  const { actual, plannedCostMinor, plannedYield } = money
  const sum = (minor: number) => <Money minor={minor} currency={run.currency} locale={workshop.locale} />
  const weighed = decisions.find(({ figures }) => figures)?.figures?.weighed
  const facts = [
    ...(weighed ? [{ name: words.likelyToPay, value: writtenNumber(Math.round(weighed.likelyToPay)) }] : []),
    ...(['paid', 'open', 'lapsed', 'cancelled', 'withdrawn'] as const)
      .filter((sort) => sort === 'paid' || units[sort] > 0)
      .map((sort) => ({ name: words[sort], value: writtenNumber(units[sort]) })),
    { name: words.plannedCost, value: plannedCostMinor === null ? words.notKnown : sum(plannedCostMinor) },
    { name: words.actualCost, value: actual ? sum(actual.costMinor) : words.notTyped },
    ...(actual && plannedCostMinor !== null
      ? [{ name: words.costDifference, value: sum(actual.costMinor - plannedCostMinor) }]
      : []),
    {
      name: words.plannedYield,
      value: plannedYield === null ? words.notKnown : writtenPercent(plannedYield),
    },
    {
      name: words.actualYield,
      value: actual ? words.yieldOf(actual.good, actual.started) : words.notTyped,
    },
    { name: words.received, value: sum(money.receivedMinor) },
    { name: words.refunded, value: sum(money.refundedMinor) },
  ]
  const isBuilt = run.state === 'locked' || run.state === 'closed'
  return (
    <Sheet title={words.money} id="cost">
      <Facts facts={facts.map((fact) => ({ ...fact, kind: 'figures' as const }))} />
      {isBuilt ? <ActualsForm outcome={outcome} kept={kept} /> : null}
    </Sheet>
  )
}

function ActualsForm({ outcome, kept }: Props) {
  const { run, workshop, money } = outcome
  const { actual } = money
  const form = keptForm(kept)
  const start = (value: string | undefined) => (form || value === undefined ? {} : { defaultValue: value })
  return (
    <Disclosure summary={words.actualsTitle} open={kept !== null || actual === null}>
      <Form
        action={paths.api.adminRunActuals(workshop.slug, run.id)}
        form={form}
        hidden={{ currency: run.currency }}
        foot={<Button kind="secondary">{words.save}</Button>}
      >
        <MoneyField
          name="costMinor"
          label={words.costLabel}
          hint={words.actualsHint}
          currency={run.currency}
          {...start(actual ? plainMoney(actual.costMinor, run.currency) : undefined)}
          form={form}
        />
        <NumberField
          name="started"
          label={words.startedLabel}
          {...start(actual ? String(actual.started) : undefined)}
          form={form}
        />
        <NumberField
          name="good"
          label={words.goodLabel}
          {...start(actual ? String(actual.good) : undefined)}
          form={form}
        />
      </Form>
    </Disclosure>
  )
}
