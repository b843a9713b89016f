import { When } from '@/components/format/when'
import { Disclosure } from '@/components/ui/disclosure'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import type { DecisionTaken, RunOutcome } from '@/lib/contracts/run-outcome'
import { decision } from '@/lib/messages/decision'
import { outcomeWords as words } from '@/lib/messages/outcome'
import { readinessTitles } from '@/lib/messages/readiness'
import type { ReadinessKey } from '@/lib/core/states/run-readiness'

/** Every decision about the run with the figures it was taken on, frozen as they stood. */
export function DecisionsSheet({ outcome }: { outcome: RunOutcome }) {
  const { decisions, waivers, workshop } = outcome
  return (
    <Sheet title={words.decisions} id="decisions">
      <ol className="border-t border-rule">
        {decisions.map((taken) => (
          <li key={taken.id} className="border-b border-rule py-3">
            <div className="flex flex-wrap items-baseline justify-between gap-x-4">
              <h3 className="text-17">
                {words.decisionKinds[taken.kind] ?? taken.kind}
                {taken.byClock ? ` ${words.byClock}` : ''}
              </h3>
              <span className="text-13 text-quiet">
                <When at={taken.at} zone={workshop.timeZone} />, {words.version(taken.coreVersion)}
              </span>
            </div>
            {taken.change ? <p>{words.changed(taken.change, taken.kind)}</p> : null}
            {taken.reason ? <p className="max-w-words whitespace-pre-line">{taken.reason}</p> : null}
            {taken.figures ? <Frozen taken={taken} outcome={outcome} /> : null}
          </li>
        ))}
      </ol>
      {waivers.length > 0 ? (
        <div className="pt-4">
          <h3 className="pb-2 text-17">{words.waivers}</h3>
          <Facts
            facts={waivers.map(({ key, reason }) => ({
              name: readinessTitles[key as ReadinessKey],
              value: reason,
            }))}
          />
        </div>
      ) : null}
    </Sheet>
  )
}

function Frozen({ taken, outcome }: { taken: DecisionTaken; outcome: RunOutcome }) {
  const { weighed, ...figures } = taken.figures!
  const { run, workshop } = outcome
  const facts = {
    state: 'locked' as const,
    ...{ figures, weighed, minimum: run.minimum, maximum: run.maximum, notReady: 0 },
    ...{ currency: run.currency, locale: workshop.locale },
  }
  const shown = [...decision.figures(facts), ...decision.weighedFacts(facts)]
  return (
    <Disclosure summary={words.frozen} open>
      <p className="max-w-words pb-2">{decision.carried(facts)}</p>
      <Facts facts={shown.map((fact) => ({ ...fact, kind: 'figures' as const }))} />
    </Disclosure>
  )
}
