import 'server-only'
import { QueryTypes } from 'sequelize'
import type { ModulePage, PageOffer } from '@/lib/contracts/module-page'
import { dayIn } from '@/lib/core/time/zone'
import { sequelize } from '@/lib/db/sequelize'
import { type Module, type Offer, type Run, TermsVersion, type Workshop } from '@/models'
import { deliveryOf } from './delivery-of'
import { findPublicModule, type FoundModule } from './find-public-module'
import { countUnits, findPublicRun, toPageRun } from './find-public-run'
import { getInterest } from './get-interest'
import { getPublicRecord } from './get-public-record'
import { pricesOf, type PriceOf } from './prices-of'
import { toMaker } from './to-maker'

/**
 * The public page of a module, priced for the workshop's own country; null when it is not public. The number of
 * statements does not depend on how many offers, orders or sign-ups there are.
 */
export async function getModulePage(cmd: {
  workshop: string
  module: string
  now: Date
}): Promise<ModulePage | null> {
  const found = await findPublicModule(cmd)
  return found && toModulePage(found, cmd.now)
}

/** A module as its page shows it; who may see it has been asked before. */
export async function toModulePage(found: FoundModule, now: Date): Promise<ModulePage> {
  const { workshop, module, offers } = found
  const run = await findPublicRun(module.id)
  const units = await countUnits(run ? [run.id] : [])
  const priceOf = pricesOf(run?.offers ?? [])
  const on = dayIn(now, workshop.timeZone)
  return {
    workshop: factsOfWorkshop(workshop),
    module: factsOfModule(module),
    offers: offers.map((offer) => toPageOffer(offer, priceOf)),
    interest: await getInterest(module),
    run: run && toPageRun(run, workshop, units.get(run.id), now),
    terms: await termsOf(workshop, run),
    maker: toMaker(workshop),
    record: await getPublicRecord(workshop),
    delivery: await deliveryOf({ workshop, offers, priceOf, country: workshop.country, on }),
    countries: await countriesOf(offers),
  }
}

function factsOfWorkshop(workshop: Workshop): ModulePage['workshop'] {
  const { slug, name, country, currency, timeZone, state, pricesIncludeTax, taxMode, taxNote } = workshop
  const isOpen = state === 'open'
  return { slug, name, country, currency, timeZone, isOpen, pricesIncludeTax, taxMode, taxNote }
}

function factsOfModule(module: Module): ModulePage['module'] {
  const { slug, name, oneLine, story, widthHp, depthMm, plus12Ma, minus12Ma, plus5Ma } = module
  const { controls, specification, cautions, videoUrl } = module
  const size = { widthHp, depthMm, plus12Ma, minus12Ma, plus5Ma }
  return { slug, name, oneLine, story, ...size, controls, specification, cautions, videoUrl }
}

function toPageOffer(offer: Offer, priceOf: PriceOf): PageOffer {
  const price = priceOf(offer)
  return {
    offer: offer.kind,
    priceMinor: price?.priceMinor ?? null,
    depositMinor: price?.depositMinor ?? null,
    priceListMinor: price === null ? offer.priceListMinor : [],
    contents: offer.contents,
    cautions: offer.cautions,
    ageFrom: offer.ageFrom,
    choices: (offer.choices ?? []).map(({ question, answers }) => ({
      question,
      answers: (answers ?? []).map(({ label, surchargeMinor }) => ({ label, surchargeMinor })),
    })),
  }
}

/** Those a run was opened under, else the newest. */
async function termsOf(workshop: Workshop, run: Run | null): Promise<ModulePage['terms']> {
  const version = await TermsVersion.findOne({
    where: run?.termsVersionId ? { id: run.termsVersionId } : { workshopId: workshop.id },
    order: [['number', 'DESC']],
  })
  return (
    version && {
      number: version.number,
      body: version.body,
      publishedOn: dayIn(version.publishedAt, workshop.timeZone),
    }
  )
}

async function countriesOf(offers: readonly Offer[]): Promise<string[]> {
  if (offers.length === 0) return []
  const rows = await sequelize.query<{ country: string }>(
    `select distinct country from destinations where offer_id in (:ids) and state <> 'closed' order by country`,
    { replacements: { ids: offers.map(({ id }) => id) }, type: QueryTypes.SELECT },
  )
  return rows.map(({ country }) => country)
}
