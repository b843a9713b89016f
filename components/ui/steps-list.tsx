import { ui } from '@/lib/messages/ui'
import { Mark, type MarkKind } from './state-mark'

export type StepState = 'done' | 'now' | 'to_come'
type Step = { key: string; title: React.ReactNode; state: StepState; detail?: React.ReactNode }

const marks: Record<StepState, MarkKind> = { done: 'done', now: 'attention', to_come: 'open' }
const words: Record<StepState, string> = { done: ui.stepDone, now: ui.stepNow, to_come: ui.stepToCome }
const colours: Record<StepState, string> = { done: 'text-kelp', now: 'text-straw', to_come: 'text-quiet' }

/** What comes in which order, and how far it is. */
export function StepsList({ steps }: { steps: readonly Step[] }) {
  return (
    <ol className="border-rule border-t">
      {steps.map((step, index) => (
        <li
          key={step.key}
          aria-current={step.state === 'now' ? 'step' : undefined}
          className="border-rule grid grid-cols-[2rem_minmax(0,1fr)_auto] items-baseline gap-x-2 border-b py-2.5"
        >
          <span className="figures text-quiet">{index + 1}</span>
          <span className={step.state === 'now' ? 'font-semibold' : undefined}>{step.title}</span>
          <span className={`text-13 inline-flex items-baseline gap-1.5 font-semibold ${colours[step.state]}`}>
            <Mark kind={marks[step.state]} />
            {words[step.state]}
          </span>
          {step.detail ? <div className="text-15 text-quiet col-start-2 col-end-4">{step.detail}</div> : null}
        </li>
      ))}
    </ol>
  )
}
