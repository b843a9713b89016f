import { Disclosure } from '@/components/ui/disclosure'
import { Table } from '@/components/ui/table'
import { DayText } from '@/components/format/day-text'
import { charts } from '@/lib/messages/charts'
import { ui } from '@/lib/messages/ui'
import { RunLineAcross } from './run-line-across'
import { RunLineDown } from './run-line-down'
import type { RunLineFacts, RunStep } from './run-line-scale'

export type { RunStep } from './run-line-scale'

/**
 * The steps of a run as one ruled line with dates in true proportion: across where there is room, downwards on a
 * phone. The sentence and the table say the same.
 */
export function RunLine(facts: RunLineFacts) {
  const { steps, postedBy, chance } = facts
  if (steps.length === 0) return <p className="text-15 text-quiet">{charts.noSteps}</p>
  const now = steps.filter((step) => step.state === 'now').map((step) => step.name)
  return (
    <figure className="@container">
      <RunLineAcross {...facts} />
      <RunLineDown {...facts} />
      <figcaption className="text-15 pt-2">{charts.runLine(now, postedBy, chance)}</figcaption>
      <Disclosure summary={ui.inTable}>
        <StepTable steps={steps} />
      </Disclosure>
    </figure>
  )
}

const words = { done: ui.stepDone, now: ui.stepNow, to_come: ui.stepToCome }

function StepTable({ steps }: { steps: readonly RunStep[] }) {
  return (
    <Table
      caption={charts.runLineCaption}
      captionHidden
      rows={steps}
      rowKey={(step) => step.key}
      empty={charts.noSteps}
      columns={[
        { key: 'name', heading: charts.step, cell: (step) => step.name },
        { key: 'from', heading: charts.from, cell: (step) => <DayText day={step.from} /> },
        { key: 'to', heading: charts.to, cell: (step) => <DayText day={step.to} /> },
        { key: 'state', heading: charts.howFar, cell: (step) => words[step.state] },
      ]}
    />
  )
}
