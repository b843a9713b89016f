import 'server-only'
import { Op } from 'sequelize'
import type { OrderFormView } from '@/lib/contracts/order-quote'
import { can, type Actor } from '@/lib/core/policy/can'
import { dayIn } from '@/lib/core/time/zone'
import { loadOffers } from '@/lib/queries/orders/quote-data'
import { Destination, Invitation, Module, Run, RunOffer, Workshop } from '@/models'

/**
 * What the order form of a module shows: its newest run that takes or took deposits, the offers, the countries they all
 * go to, and why nobody or this person may order now. Null when there is no such run. Bounded: nine statements.
 */
export async function getOrderForm(asked: {
  actor: Actor
  workshop: string
  module: string
  now: Date
}): Promise<OrderFormView | null> {
  const { actor, now } = asked
  if (actor.kind !== 'person' || !can(actor, 'order:place', {})) return null
  const workshop = await Workshop.findOne({ where: { slug: asked.workshop } })
  const module =
    workshop && (await Module.findOne({ where: { workshopId: workshop.id, slug: asked.module } }))
  if (!workshop || !module) return null
  const run = await Run.findOne({
    where: { moduleId: module.id, state: { [Op.in]: ['taking_deposits', 'locked'] } },
    order: [['number', 'DESC']],
  })
  if (!run) return null
  const offers = await loadOffers(run.id, workshop.country)
  return {
    run: run.id,
    workshop: { slug: workshop.slug, name: workshop.name, country: workshop.country },
    timeZone: workshop.timeZone,
    module: { slug: module.slug, name: module.name },
    currency: run.currency,
    pricesIncludeTax: workshop.pricesIncludeTax,
    closedBecause: await whyClosed(run, workshop, actor.personId, now),
    decideBy: run.decideByOn,
    minimum: run.minimum,
    limitPerPerson: run.limitPerPerson,
    free: run.maximum - run.committedUnits,
    opensToAllAt: run.opensToAllAt?.toISOString() ?? null,
    offers: offers.map(({ kind, priceMinor, depositMinor, postedByOn, choices }) => ({
      offer: kind,
      priceMinor,
      depositMinor,
      postedBy: postedByOn,
      choices,
    })),
    countries: await countriesOf(run.id),
  }
}

async function whyClosed(
  run: Run,
  workshop: Workshop,
  personId: string,
  now: Date,
): Promise<OrderFormView['closedBecause']> {
  if (run.state !== 'taking_deposits') return 'run_not_open'
  if (workshop.state !== 'open') return 'workshop_suspended'
  if (dayIn(now, workshop.timeZone) > run.decideByOn) return 'decide_by_past'
  if (run.opensToAllAt !== null && run.opensToAllAt <= now) return null
  const invited = await Invitation.count({ where: { runId: run.id, personId, state: ['sent', 'ordered'] } })
  return invited > 0 ? null : 'not_open_to_all_yet'
}

/** Where at least one offer goes; the others say so at the field. */
async function countriesOf(runId: string): Promise<string[]> {
  const offers = await RunOffer.findAll({ where: { runId }, attributes: ['offerId'] })
  const rows = await Destination.findAll({
    where: { offerId: offers.map(({ offerId }) => offerId), state: 'open' },
    attributes: ['country'],
  })
  return [...new Set(rows.map(({ country }) => country))].sort()
}
