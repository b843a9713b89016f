import 'server-only'
import type { RepayAnswer, RunPage } from '@/lib/contracts/run-page'
import type { RunFigures, RunWeighed } from '@/lib/contracts/runs'
import { can, type Actor } from '@/lib/core/policy/can'
import { readinessFigures } from '@/lib/core/states/readiness-figures'
import { readinessOf } from '@/lib/core/states/run-guards'
import { Decision, Run } from '@/models'
import { figuresOf } from './figures-of'
import { getRunFacts } from './get-run-facts'
import { listRunBulk } from './list-run-bulk'
import { runLineOf } from './promise-of'
import { readinessFactsOf, repayOf } from './readiness-facts-of'
import type { RunFacts } from './run-facts'
import { unitsOf } from './units-of'

/**
 * The owner's page of a run: its figures, its readiness list and what they rest on; null when the actor may not see it.
 * `balanceMinor` is what lies at the payment provider, null when it did not answer: being able to pay everyone back is
 * then unknown. A fixed number of statements, whatever the run holds.
 */
export async function getRunPage(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  balanceMinor: number | null
  now: Date
}): Promise<RunPage | null> {
  const { actor, workshopId, runId, balanceMinor, now } = cmd
  if (!can(actor, 'run:read', { workshopId })) return null
  const row = await Run.findOne({
    where: { id: runId, workshopId },
    include: ['module', 'workshop', 'offers'],
  })
  const facts = row && (await getRunFacts({ workshopId, runId, now }))
  if (!row?.module || !row.workshop || !facts) return null
  const judged = readinessFactsOf(facts, balanceMinor)
  const instant = (at: Date | null) => at?.toISOString() ?? null
  return {
    ...basicsOf(row, facts),
    ...figuresOf(facts),
    openedAt: instant(row.openedAt),
    opensToAllAt: instant(row.opensToAllAt),
    lockedAt: instant(row.lockedAt),
    lockReason: row.lockReason,
    calledOffAt: instant(row.calledOffAt),
    callOffReason: row.callOffReason,
    balancesAskedAt: instant(row.balancesAskedAt),
    readiness: readinessOf(judged).map(({ key, state }) => ({
      key,
      state,
      waivedFor:
        state === 'waived' ? (facts.waivers.find((waiver) => waiver.key === key)?.reason ?? null) : null,
    })),
    readinessFigures: readinessFigures(judged),
    runLine: runLineOf(facts),
    repay: repayAnswer(facts, balanceMinor),
    ...moneyOf(facts),
    withdrawableUnits: unitsOf(facts).withdrawable,
    signUps: { confirmed: facts.signUps.confirmed, notOrdered: facts.signUps.notOrdered.length },
    bulk: await listRunBulk(runId),
    decided: await decidedOf(runId, facts),
  }
}

function basicsOf(row: Run, facts: RunFacts) {
  const { module, workshop } = row
  return {
    id: row.id,
    number: row.number,
    module: { slug: module!.slug, name: module!.name },
    workshop: {
      id: workshop!.id,
      slug: workshop!.slug,
      timeZone: workshop!.timeZone,
      locale: workshop!.locale,
    },
    revision: facts.revision,
    state: row.state,
    currency: row.currency,
    minimum: row.minimum,
    maximum: row.maximum,
    decideBy: row.decideByOn,
    today: facts.today,
    balanceWhen: row.balanceWhen,
    headStartHours: row.headStartHours,
    decideByMoved: row.decideByMovedAt !== null,
    limitPerPerson: row.limitPerPerson,
    offers: facts.offers.map(({ kind, priceMinor, depositMinor, postedByOn }) => ({
      offer: kind,
      priceMinor,
      depositMinor,
      postedBy: postedByOn,
    })),
  }
}

function repayAnswer(facts: RunFacts, balanceMinor: number | null): RepayAnswer {
  const repay = repayOf(facts, balanceMinor)
  if (repay === null) return { state: 'unknown' }
  return repay.yes ? { state: 'yes' } : { state: 'short', shortByMinor: repay.shortBy }
}

function moneyOf({ sums, money }: RunFacts): Pick<RunPage, 'orders' | 'money'> {
  const own = sums.filter(({ kind }) => kind === 'paid')
  return {
    orders: Object.fromEntries(own.map(({ state, orders }) => [state, orders])),
    money: {
      heldMinor: money.heldMinor,
      balancesMinor: own
        .filter(({ state }) => state === 'reserved')
        .reduce((sum, { balanceMinor }) => sum + balanceMinor, 0),
    },
  }
}

/** The figures frozen with the lock, and the lines that were let pass. */
async function decidedOf(runId: string, { waivers }: RunFacts): Promise<RunPage['decided']> {
  const decision = await Decision.findOne({ where: { runId, kind: 'lock' } })
  if (!decision) return null
  const { readiness, weighed, ...figures } = decision.figures as RunFigures & {
    weighed: RunWeighed
    readiness: { key: string; state: string }[]
  }
  const passed = readiness.filter(({ state }) => state === 'waived').map(({ key }) => key)
  return {
    at: decision.at.toISOString(),
    figures,
    weighed,
    coreVersion: decision.coreVersion,
    waived: waivers.filter(({ key }) => passed.includes(key)).map(({ key, reason }) => ({ key, reason })),
  }
}
