import 'server-only'
import { STARTING_CONVERSION, updateConversion, type ConversionClass } from '@/lib/core/demand/conversion'
import { forecastUnits, type Group, type UnitsForecast } from '@/lib/core/demand/forecast'
import type { Conversion } from '@/lib/core/demand/group'
import type { RunFacts } from './run-facts'

const SIGN_UP_CLASSES = ['certain', 'likely', 'curious', 'oldSignUp'] as const

/** What is believed of a class: the starting values, taught by the workshop's closed runs. */
export function conversionOf({ outcomes }: Pick<RunFacts, 'outcomes'>, name: ConversionClass): Conversion {
  return outcomes
    .filter(({ className }) => className === name)
    .reduce<Conversion>((known, seen) => updateConversion(known, seen), STARTING_CONVERSION[name])
}

/**
 * Units in the end: those under deposit, and what confirmed sign-ups that have not ordered are expected to bring while
 * they still can. Nobody is expected any more after decide-by or once the run is decided.
 */
export function forecastOfRun(
  facts: RunFacts,
  deposited: number,
): { groups: Group[]; forecast: UnitsForecast } {
  const { run, today, signUps } = facts
  const isOpen = run.state === 'draft' || (run.state === 'taking_deposits' && today <= run.decideByOn)
  const groups = SIGN_UP_CLASSES.flatMap((name) => {
    const quantities = signUps.notOrdered
      .filter(({ certainty }) => certainty === name)
      .map(({ quantity }) => quantity)
    return isOpen && quantities.length > 0 ? [{ ...conversionOf(facts, name), quantities }] : []
  })
  return { groups, forecast: forecastUnits(groups, { committed: deposited }) }
}
