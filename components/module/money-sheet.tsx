import { Sheet } from '@/components/ui/sheet'
import type { PageRun } from '@/lib/contracts/module-page'
import { publicWords as words } from '@/lib/messages/public'

/** What happens to a buyer's money, step by step, by the rules of this run where there is one. */
export function MoneySheet({ run }: { run: PageRun | null }) {
  const { money } = words
  const steps = [
    money.deposit,
    money.untilDecision,
    run ? money.decision(run.minimum, run.decideBy) : money.decisionLater,
    money.balance[run?.balanceWhen ?? 'later'],
    money.after,
    money.promise,
  ]
  return (
    <Sheet title={words.moneyTitle} id="money">
      {run ? null : <p className="max-w-words pb-3">{words.moneyInterest}</p>}
      <ol className="max-w-words border-t border-rule">
        {steps.map((step, index) => (
          <li
            key={step}
            className="grid grid-cols-[2rem_minmax(0,1fr)] items-baseline border-b border-rule py-2.5"
          >
            <span className="figures text-quiet" aria-hidden="true">
              {index + 1}
            </span>
            <span>{step}</span>
          </li>
        ))}
      </ol>
    </Sheet>
  )
}
