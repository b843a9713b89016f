import type { CreationAttributes } from 'sequelize'
import type { Module, Offer, Revision, TermsVersion, Workshop } from '@/models'
import { Run, RunOffer } from '@/models'
import type { OfferKind } from '@/models/words'
import { at, hoursAfter, NOW } from './base'
import { makeModule } from './module'
import { makeWorkshop } from './workshop'

type Parents = {
  workshop: Workshop
  terms: TermsVersion
  module: Module
  revision: Revision
  offers: Record<OfferKind, Offer>
}

/** A run of all three offers taking deposits from everyone, with the parents it needs where none are given. */
export async function makeRun(given?: Partial<Parents>, over: Partial<CreationAttributes<Run>> = {}) {
  const house =
    given?.workshop && given.terms ? { workshop: given.workshop, terms: given.terms } : await makeWorkshop()
  const design =
    given?.module && given.revision && given.offers
      ? { module: given.module, revision: given.revision, offers: given.offers }
      : await makeModule(house.workshop)
  const number = (await Run.count({ where: { moduleId: design.module.id } })) + 1
  const minimum = over.minimum ?? 3
  const run = await Run.create({
    workshopId: house.workshop.id,
    moduleId: design.module.id,
    revisionId: design.revision.id,
    number,
    state: 'taking_deposits',
    minimum,
    minimumFirst: minimum,
    maximum: 5,
    currency: house.workshop.currency,
    decideByOn: '2027-04-01',
    decideByAt: at('2027-04-01T22:00:00Z'),
    decideByFirstOn: over.decideByOn ?? '2027-04-01',
    opensToAllAt: hoursAfter(NOW, -1),
    balanceWhen: 'units_passed',
    termsVersionId: house.terms.id,
    createdAt: hoursAfter(NOW, -50),
    createdByPersonId: house.workshop.createdByPersonId,
    openedAt: hoursAfter(NOW, -49),
    ...over,
  })
  const runOffers = {} as Record<OfferKind, RunOffer>
  for (const offer of Object.values(design.offers)) runOffers[offer.kind] = await makeRunOffer(run, offer)
  return { ...house, ...design, run, runOffers }
}

function makeRunOffer(run: Run, offer: Offer) {
  if (!offer.priceMinor || !offer.depositMinor) throw new Error(`the offer ${offer.kind} has no price`)
  return RunOffer.create({
    workshopId: run.workshopId,
    runId: run.id,
    offerId: offer.id,
    kind: offer.kind,
    priceMinor: offer.priceMinor,
    depositMinor: offer.depositMinor,
    taxClass: offer.taxClass,
    postedByOn: '2027-08-31',
    postedByFirstOn: '2027-08-31',
  })
}
