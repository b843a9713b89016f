import { StateMark, type MarkKind } from '@/components/ui/state-mark'
import type { RunState } from '@/lib/core/states/run'
import { runWords } from '@/lib/messages/runs'

const MARKS: Readonly<Record<RunState, MarkKind>> = {
  draft: 'open',
  taking_deposits: 'attention',
  locked: 'done',
  closed: 'done',
  called_off: 'stopped',
}

/** Where a run stands, with its mark and its word. */
export function RunStateMark({ state }: { state: RunState }) {
  return <StateMark kind={MARKS[state]}>{runWords.states[state]}</StateMark>
}
