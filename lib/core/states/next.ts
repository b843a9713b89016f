import { ok, refuse, type Result } from '@/lib/core/result'

/** One allowed move: from a state (null = creation) by an event to a state. */
export type Move<State extends string, Event extends string = string> = {
  readonly from: State | null
  readonly event: Event
  readonly to: State
}

/**
 * The state an event leads to, or the refusal that leaves everything as it was.
 * Refuses: 'not_allowed' when the table has no such move; null as state asks for a creation.
 * Source: states.md of the design: nothing else changes a state.
 * @example next([{ from: 'draft', event: 'publish', to: 'published' }], 'draft', 'publish')  // → ok('published')
 * @example next([{ from: 'draft', event: 'publish', to: 'published' }], 'published', 'publish')  // → refuse('not_allowed')
 */
export function next<State extends string, Event extends string>(
  moves: readonly Move<State, Event>[],
  state: State | null,
  event: Event,
): Result<State, 'not_allowed'> {
  const move = moves.find((each) => each.from === state && each.event === event)
  return move ? ok(move.to) : refuse('not_allowed')
}

/**
 * The same move from each of several states, for spreading into a table.
 * @example movesFrom(['draft', 'testing'], 'supersede', 'superseded').length  // → 2
 */
export function movesFrom<const From extends string, const Event extends string, const To extends string>(
  states: readonly From[],
  event: Event,
  to: To,
): { readonly from: From; readonly event: Event; readonly to: To }[] {
  return states.map((from) => ({ from, event, to }))
}

/**
 * Every state of a table, in the order in which the table first names it.
 * @example statesOf([{ from: null, event: 'open', to: 'open' }, { from: 'open', event: 'answer', to: 'answered' }])  // → ['open', 'answered']
 */
export function statesOf<State extends string>(moves: readonly Move<State>[]): State[] {
  const named = moves.flatMap((move) => (move.from === null ? [move.to] : [move.from, move.to]))
  return [...new Set(named)]
}

/**
 * The events that lead on from a state, in the order of the table; none from a terminal state.
 * @example eventsFrom([{ from: 'draft', event: 'publish', to: 'published' }], 'draft')  // → ['publish']
 */
export function eventsFrom<State extends string, Event extends string>(
  moves: readonly Move<State, Event>[],
  state: State,
): Event[] {
  return [...new Set(moves.filter((move) => move.from === state).map((move) => move.event))]
}
