import 'server-only'
import type { ClassBelief, DemandBoard } from '@/lib/contracts/demand'
import { STARTING_CONVERSION, updateConversion } from '@/lib/core/demand/conversion'
import type { Conversion } from '@/lib/core/demand/group'
import { signupsNeeded } from '@/lib/core/demand/needed'
import { betaQuantile } from '@/lib/core/stats/beta'
import { conversionOf, type forecastOfRun, SIGN_UP_CLASSES } from '@/lib/queries/runs/forecast-of'
import type { RunFacts } from '@/lib/queries/runs/run-facts'

type Forecast = ReturnType<typeof forecastOfRun>

/** How sure "sure enough" is when more sign-ups are counted. Our own value. */
const SURE = 0.8
const ASKED = ['certain', 'likely', 'curious'] as const

const meanOf = ({ alpha, beta }: Conversion) => alpha / (alpha + beta)

function range({ alpha, beta }: Conversion): ClassBelief['believed'] {
  const at = (chance: number) => betaQuantile(chance, alpha, beta)
  return { mean: meanOf({ alpha, beta }), low: at(0.1), high: at(0.9) }
}

/** Per class: what it starts from, what closed runs and this one have shown, and what is believed now. */
export function beliefsOf(facts: RunFacts, { groups }: Forecast): ClassBelief[] {
  const seenOf = (name: ClassBelief['name']) =>
    facts.outcomes.find(({ className }) => className === name) ?? { converted: 0, notConverted: 0 }
  const people = SIGN_UP_CLASSES.map((name) => {
    const answered = facts.signUps.answered.find(({ certainty }) => certainty === name)
    const { converted, notConverted } = seenOf(name)
    const here = { ordered: answered?.ordered ?? 0, declined: answered?.declined ?? 0 }
    const silent = facts.signUps.notOrdered.filter(({ certainty }) => certainty === name).length
    return {
      name,
      starting: meanOf(STARTING_CONVERSION[name]),
      seen: { converted, notConverted },
      here: { ...here, silent },
      believed: range(groups.find((group) => group.name === name) ?? freshOf(facts, name)),
    }
  })
  const { converted, notConverted } = seenOf('depositHolder')
  return [
    ...people,
    {
      name: 'depositHolder',
      starting: meanOf(STARTING_CONVERSION.depositHolder),
      seen: { converted, notConverted },
      here: { ordered: 0, declined: 0, silent: 0 },
      believed: range(conversionOf(facts, 'depositHolder')),
    },
  ]
}

/** Somebody who signs up now: taught by closed runs and by those who have answered here, not yet silent. */
function freshOf(facts: RunFacts, name: (typeof SIGN_UP_CLASSES)[number]): Conversion {
  const answered = facts.signUps.answered.find(({ certainty }) => certainty === name)
  return updateConversion(conversionOf(facts, name), {
    converted: answered?.ordered ?? 0,
    notConverted: answered?.declined ?? 0,
  })
}

/** How many more sign-ups of one unit, of each class, make the minimum sure enough; newcomers are left out. */
export function neededOf(facts: RunFacts, { groups }: Forecast, committed: number): DemandBoard['needed'] {
  return ASKED.map((name) => {
    const needed = signupsNeeded({
      groups: [...groups, { ...freshOf(facts, name), quantities: [] }],
      at: groups.length,
      committed,
      minimum: facts.run.minimum,
      chance: SURE,
    })
    return { name, more: needed.ok ? needed.value : needed.reason }
  })
}
