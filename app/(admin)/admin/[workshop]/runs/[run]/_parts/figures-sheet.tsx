import { StepChart } from '@/components/charts/step-chart'
import { Interval } from '@/components/format/interval'
import { Money } from '@/components/format/money'
import { Percent } from '@/components/format/percent'
import { LinkButton } from '@/components/ui/button'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import type { RunPage } from '@/lib/contracts/run-page'
import { formatMoney } from '@/lib/core/money/format'
import { daysBetween } from '@/lib/core/time/day'
import { decision } from '@/lib/messages/decision'
import { runWords as words } from '@/lib/messages/runs'
import { writtenNumber } from '@/lib/messages/written'
import { paths } from '@/lib/paths'

/** Everything else the decision is taken on, and profit at every quantity. */
export function FiguresSheet({ page }: { page: RunPage }) {
  const { figures, curve, currency, workshop, minimum, maximum } = page
  const { deposited, forecast } = figures
  const isOpen = page.state === 'draft' || page.state === 'taking_deposits'
  const daysLeft = Math.max(0, daysBetween(page.today, page.decideBy))
  return (
    <Sheet title={words.figures}>
      <Facts facts={factsOf(page).map((fact) => ({ ...fact, kind: 'figures' as const }))} />
      {isOpen ? (
        <p className="max-w-words pt-3 text-13 text-quiet">{decision.madeOf(page.weighed, daysLeft)}</p>
      ) : null}
      <div className="pt-4">
        {curve ? (
          <>
            <p className="pb-2 text-13 text-quiet">{decision.mixOf[curve.mixOf]}</p>
            <StepChart
              profits={curve.profits}
              breakEven={curve.breakEven}
              {...{ currency, minimum, maximum, deposited }}
              locale={workshop.locale}
              {...(isOpen && { forecast })}
            />
          </>
        ) : (
          <>
            <p className="max-w-words pb-3">{decision.noPlan}</p>
            <LinkButton href={paths.adminModulePage(workshop.slug, page.module.slug, 'plan')}>
              {decision.toPlan}
            </LinkButton>
          </>
        )}
      </div>
    </Sheet>
  )
}

function factsOf(page: RunPage) {
  const { figures, currency, workshop, money, repay, signUps } = page
  const sum = (minor: number) => <Money minor={minor} currency={currency} locale={workshop.locale} />
  const { held, waiting, forecast, starts } = figures
  const isOpen = page.state === 'draft' || page.state === 'taking_deposits'
  return [
    { name: words.held, value: writtenNumber(held) },
    { name: words.waiting, value: writtenNumber(waiting) },
    ...(isOpen
      ? [
          { name: words.signUps, value: writtenNumber(signUps.notOrdered) },
          {
            name: words.expected,
            value: (
              <Interval value={Math.round(forecast.mean)} low={forecast.low} high={forecast.high} unit="" />
            ),
          },
          { name: words.chance, value: <Percent ratio={forecast.chance} /> },
        ]
      : []),
    ...(starts === null ? [] : [{ name: words.starts, value: decision.starts(starts) }]),
    ...decision.weighedFacts({ ...page, locale: workshop.locale }),
    { name: words.withdrawable, value: writtenNumber(page.withdrawableUnits) },
    { name: words.heldMoney, value: sum(money.heldMinor) },
    { name: words.balances, value: sum(money.balancesMinor) },
    {
      name: words.repayQuestion,
      value:
        repay.state === 'short'
          ? decision.repay.short(formatMoney(repay.shortByMinor, currency, workshop.locale))
          : decision.repay[repay.state],
    },
  ]
}
