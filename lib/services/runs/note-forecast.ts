import 'server-only'
import { ok } from '@/lib/core/result'
import { CORE_VERSION } from '@/lib/core/version'
import { inTransaction } from '@/lib/db/in-transaction'
import { figuresOf } from '@/lib/queries/runs/figures-of'
import { getRunFacts } from '@/lib/queries/runs/get-run-facts'
import { setForecastDue } from '@/lib/services/_steps/set-forecast-due'
import { Forecast, Run } from '@/models'

const QUARTERS = [1, 2, 3] as const

/**
 * Writes down what is forecast of a run at a quarter of its window, to be held against what comes. A long jump of the clock
 * leaves earlier quarters out: nobody looked then.
 * Locks: the run. Writes: one forecast, the next due row. Repeat: safe; one per quarter.
 */
export function noteForecast(cmd: { runId: string; now: Date }) {
  const { runId, now } = cmd
  return inTransaction(async (tx) => {
    const run = await Run.findByPk(runId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (run?.state !== 'taking_deposits') return ok({ quarter: null })
    const facts = await getRunFacts({ workshopId: run.workshopId, runId, now, tx })
    if (!facts) return ok({ quarter: null })
    const quarter = QUARTERS.findLast((each) => facts.window.gone >= each / 4) ?? null
    if (quarter !== null && facts.window.gone < 1) {
      const { figures } = figuresOf(facts)
      const where = { runId, quarter }
      const about = { workshopId: run.workshopId, minimum: run.minimum, coreVersion: CORE_VERSION, at: now }
      await Forecast.findOrCreate({
        where,
        defaults: { ...where, ...about, deposited: figures.deposited, figures: figures.forecast },
        transaction: tx,
      })
    }
    await setForecastDue(tx, run, now)
    return ok({ quarter })
  })
}
