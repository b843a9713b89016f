import 'server-only'
import type { DecisionTaken } from '@/lib/contracts/run-outcome'
import type { RunFigures, RunWeighed } from '@/lib/contracts/runs'
import type { Decision } from '@/models'

/** Each decision about a run with what it was taken on, as it was frozen, oldest first. */
export function decisionsOf(decisions: readonly Decision[]): DecisionTaken[] {
  return decisions.map(({ id, kind, at, reason, byPersonId, coreVersion, inputs, figures }) => ({
    id,
    kind,
    at: at.toISOString(),
    reason,
    byClock: byPersonId === null,
    coreVersion,
    change:
      kind === 'lower_minimum' || kind === 'move_decide_by'
        ? { from: String(inputs['before']), to: String(figures['minimum'] ?? figures['decideBy']) }
        : null,
    figures: kind === 'lock' ? (figures as unknown as RunFigures & { weighed: RunWeighed }) : null,
  }))
}

/** Units under deposit as the run was locked or called off; null while it is neither. */
export function decidedUnitsOf(decisions: readonly Decision[]): number | null {
  const ended = decisions.find(({ kind }) => kind === 'lock' || kind === 'call_off')
  const units = ended?.figures['deposited']
  return typeof units === 'number' ? units : null
}
