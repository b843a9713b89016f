import 'server-only'
import { arrivals } from '@/lib/core/demand/arrivals'
import { STARTING_CONVERSION, updateConversion, type ConversionClass } from '@/lib/core/demand/conversion'
import type { Conversion } from '@/lib/core/demand/group'
import type { Newcomers } from '@/lib/core/demand/newcomer-units'
import { arrivedSince, runForecast, type Listed, type RunForecast } from '@/lib/core/demand/run-forecast'
import type { OfferKind } from '@/models/words'
import type { RunFacts, SignUpFacts } from './run-facts'

export const SIGN_UP_CLASSES = ['certain', 'likely', 'curious', 'oldSignUp'] as const
export type SignUpClass = (typeof SIGN_UP_CLASSES)[number]

/** Earlier runs weigh at most as much as so many days watched; before so many days together nothing is said of newcomers. */
const MOST_DAYS_BEFORE = 14
const LEAST_DAYS = 7

/** What is believed of a class: the starting values, taught by the workshop's closed runs. */
export function conversionOf({ outcomes }: Pick<RunFacts, 'outcomes'>, name: ConversionClass): Conversion {
  return outcomes
    .filter(({ className }) => className === name)
    .reduce<Conversion>((known, seen) => updateConversion(known, seen), STARTING_CONVERSION[name])
}

/** Nobody is expected any more after decide-by or once the run is decided. */
export const isExpecting = ({ run, today }: RunFacts) =>
  run.state === 'draft' || (run.state === 'taking_deposits' && today <= run.decideByOn)

/**
 * Units in the end: those under deposit, what confirmed sign-ups that have not ordered are still worth at this part of the
 * window, and people on no list. `only` narrows it to one offer; what is believed of people stays what all of them taught.
 */
export function forecastOfRun(
  facts: RunFacts,
  deposited: number,
  only?: OfferKind,
): RunForecast<SignUpClass> & { curve: ReturnType<typeof arrivals> } {
  const curve = arrivals([facts.arrivalsSeen])
  if (!isExpecting(facts))
    return { ...runForecast({ committed: deposited, listed: [], newcomers: null }), curve }
  const listed = listedOf(facts, curve)
  const whole = { committed: deposited, listed, newcomers: newcomersOf(facts, curve) }
  if (only === undefined) return { ...runForecast(whole), curve }
  // The silent of every offer teach together what is believed; only then is one offer taken out.
  const believed = runForecast({ ...whole, newcomers: null }).groups
  const own = believed.map(({ name, alpha, beta }) => ({
    ...{ name, alpha, beta, ordered: 0, declined: 0 },
    silent: facts.signUps.notOrdered
      .filter(({ certainty, offer }) => certainty === name && offer === only)
      .map(({ quantity }) => ({ quantity, arrivedShare: 0 })),
  }))
  const narrowed = { committed: deposited, listed: own, newcomers: newcomersOf(facts, curve, only) }
  return { ...runForecast(narrowed), curve }
}

function listedOf(facts: RunFacts, curve: ReturnType<typeof arrivals>): Listed<SignUpClass>[] {
  const { notOrdered, answered } = facts.signUps
  const arrived = ({ invitedAt }: SignUpFacts) =>
    invitedAt === null ? 0 : arrivedSince(curve, invitedAt, facts.window.gone)
  return SIGN_UP_CLASSES.map((name) => {
    const seen = answered.find(({ certainty }) => certainty === name)
    return {
      name,
      ...conversionOf(facts, name),
      ordered: seen?.ordered ?? 0,
      declined: seen?.declined ?? 0,
      silent: notOrdered
        .filter(({ certainty }) => certainty === name)
        .map((each) => ({ quantity: each.quantity, arrivedShare: arrived(each) })),
    }
  })
}

/**
 * Newcomers still to come. Days are weighed by how deposits usually come, so that the rush of the first days is not taken
 * for the rule; null before enough days have been watched, here or in earlier runs.
 */
function newcomersOf(
  { newcomers, window, run }: RunFacts,
  curve: ReturnType<typeof arrivals>,
  only?: OfferKind,
): Newcomers | null {
  if (run.state !== 'taking_deposits') return null
  const { here, daysHere, before } = newcomers
  const kept = Math.min(before.days, MOST_DAYS_BEFORE)
  if (daysHere + kept < LEAST_DAYS) return null
  const weighed = (from: number, to: number) =>
    window.days * Math.max(0, curve.shareBy(to) - curve.shareBy(from))
  const peopleBefore = before.days > 0 ? Math.round((before.people * kept) / before.days) : 0
  const came = here.reduce((sum, { people }) => sum + people, 0)
  const own = only === undefined ? here : here.filter(({ offer }) => offer === only)
  const share =
    only === undefined ? 1 : came === 0 ? 0 : own.reduce((sum, { people }) => sum + people, 0) / came
  const watched = weighed(window.opensToAll, window.gone) + kept
  if (watched <= 0) return null
  return {
    rate: { seen: came + peopleBefore, days: watched },
    daysLeft: weighed(window.gone, 1) * share,
    quantities: own.flatMap(({ quantity, people }) => Array.from({ length: people }, () => quantity)),
  }
}
