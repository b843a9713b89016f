import type { Metadata } from 'next'
import { DayText } from '@/components/format/day-text'
import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { CheckAnswers } from '@/components/ui/check-answers'
import { Form } from '@/components/ui/form'
import { TypedConfirmation } from '@/components/ui/typed-confirmation'
import { formatMoney } from '@/lib/core/money/format'
import { addDays } from '@/lib/core/time/day'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { DeedPage } from '../_parts/deed-page'
import { runOfPage } from '../_parts/run-of-page'

export const metadata: Metadata = { title: words.askTitle }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string }>
}

export default async function AskBalancesPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const here = paths.adminRunDeed(workshop, run, 'ask-balances')
  const { page } = await runOfPage({ params, deed: 'run:ask_balances', here })
  const kept = keptForm(await getFormDraft((await searchParams).draft, 'run-ask-balances'))
  const { orders, money, currency, today, module } = page
  const count = orders['reserved'] ?? 0
  const sum = formatMoney(money.balancesMinor, currency, page.workshop.locale)
  return (
    <DeedPage
      page={page}
      title={words.askTitle}
      lead={count > 0 ? words.askLead : words.askNone}
      isPossible={page.state === 'locked'}
    >
      {count === 0 ? null : (
        <Form
          action={paths.api.adminRunDeed(workshop, run, 'ask-balances')}
          form={kept}
          foot={<Button>{words.askButton(count, sum)}</Button>}
        >
          <CheckAnswers
            answers={[
              { key: 'orders', question: words.ordersTitle, answer: count },
              { key: 'sum', question: words.balances, answer: sum },
              { key: 'announced', question: words.announced, answer: <DayText day={today} /> },
              { key: 'charged', question: words.chargedOn, answer: <DayText day={addDays(today, 7)} /> },
            ]}
          />
          <TypedConfirmation name="typed" words={words.confirmAsk(module.slug)} form={kept} />
        </Form>
      )}
    </DeedPage>
  )
}
