import 'server-only'
import { Op, QueryTypes, type Transaction } from 'sequelize'
import type { CostPlan } from '@/lib/core/costs/plan'
import { dayIn } from '@/lib/core/time/zone'
import { sequelize } from '@/lib/db/sequelize'
import { Plan, Run, Waiver, Workshop } from '@/models'
import { readArrivals } from './read-arrivals'
import { readDemand } from './read-demand'
import { readDesign } from './read-design'
import { readMoney } from './read-money'
import { readOffers } from './read-offers'
import { readOrders } from './read-orders'
import type { RunFacts } from './run-facts'

/**
 * Everything the owner's figures and the readiness list of a run are computed from; null when the workshop has no such
 * run. A fixed number of statements whatever the run holds. In a transaction when one is handed in, so that what is
 * decided is decided on one state.
 */
export async function getRunFacts(cmd: {
  workshopId: string
  runId: string
  now: Date
  tx?: Transaction
}): Promise<RunFacts | null> {
  const { workshopId, runId, now } = cmd
  const tx = cmd.tx ?? null
  const run = await Run.findOne({
    where: { id: runId, workshopId },
    include: ['module', 'revision'],
    transaction: tx,
  })
  const workshop = run && (await Workshop.findByPk(workshopId, { transaction: tx }))
  if (!run || !workshop || !run.module || !run.revision) return null
  const zone = workshop.timeZone
  const offers = await readOffers(run.id, tx)
  const orders = await readOrders(run.id, tx)
  const signUps = await readDemand(run, now, tx)
  const coming = await readArrivals(run, now, tx)
  const design = await readDesign(run, run.revision.letter, tx)
  const money = await readMoney(run, tx)
  const waivers = await Waiver.findAll({ where: { runId }, attributes: ['key', 'reason'], transaction: tx })
  return {
    today: dayIn(now, zone),
    run: {
      id: run.id,
      workshopId,
      moduleId: run.moduleId,
      state: run.state,
      minimum: run.minimum,
      maximum: run.maximum,
      decideByOn: run.decideByOn,
      lockedOn: run.lockedAt && dayIn(run.lockedAt, zone),
      balanceWhen: run.balanceWhen,
      currency: run.currency,
    },
    revision: run.revision.letter,
    offers,
    ...orders,
    ...signUps,
    ...coming,
    ...design,
    firstUnits: withRecorded(design.firstUnits, run.revision.firstGoodAt !== null),
    plan: await readPlan(run, tx),
    closedDays: workshop.closedDays,
    page: {
      terms: await hasTerms(workshopId, tx),
      cautions: run.module.cautions.trim() !== '' || offers.every(({ hasCautions }) => hasCautions),
      postalAddress: workshop.postalAddress !== null,
    },
    waivers: waivers.map(({ key, reason }) => ({ key, reason })),
    money,
  }
}

/** A first good unit may be written down on the revision without a unit of its own. */
function withRecorded(units: { tried: number; good: number }, isRecorded: boolean) {
  return isRecorded && units.good === 0 ? { tried: units.tried + 1, good: 1 } : units
}

/** The run's own plan, or the module's while the run has none. */
async function readPlan(run: Run, tx: Transaction | null): Promise<RunFacts['plan']> {
  const plans = await Plan.findAll({
    where: { moduleId: run.moduleId, isBase: true, runId: { [Op.or]: [run.id, null] } },
    transaction: tx,
  })
  const plan = plans.find(({ runId }) => runId === run.id) ?? plans[0]
  if (!plan) return null
  return {
    costs: plan.plan as unknown as CostPlan,
    steps: plan.steps.map(({ name: _, ...step }) => step),
    names: Object.fromEntries(plan.steps.map(({ id, name }) => [id, name])),
  }
}

async function hasTerms(workshopId: string, tx: Transaction | null): Promise<boolean> {
  const [row] = await sequelize.query<{ has: boolean }>(
    'select exists (select 1 from terms_versions where workshop_id = $workshopId) as has',
    { bind: { workshopId }, type: QueryTypes.SELECT, transaction: tx },
  )
  return row?.has ?? false
}
