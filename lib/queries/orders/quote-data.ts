import 'server-only'
import { Op, type Transaction } from 'sequelize'
import type { OfferKind } from '@/lib/contracts/fields'
import type { Minor } from '@/lib/core/brand'
import { taxRateFor } from '@/lib/core/orders/tax-rate'
import type { Zone } from '@/lib/core/post/postage'
import {
  Choice,
  ChoiceAnswer,
  Destination,
  Offer,
  PostageService,
  PostageZone,
  RunOffer,
  TaxRate,
} from '@/models'
import type { Workshop } from '@/models'
import type { TaxClass } from '@/models/words'

/** An offer of a run with what pricing an order for one country needs to know of it. */
export type QuotedOffer = {
  runOfferId: string
  kind: OfferKind
  priceMinor: Minor
  depositMinor: Minor
  taxClass: TaxClass
  postedByOn: string
  /** Null while it has not been weighed and measured. */
  packed: { grams: number; sizeMm: [number, number, number] } | null
  destination: (ReturnType<Destination['facts']> & { note: string }) | null
  choices: {
    id: string
    question: string
    askedAfterLock: boolean
    answers: { id: string; label: string; surchargeMinor: Minor; isDefault: boolean }[]
  }[]
}

/** The offers of a run, in the order of the page. One statement per table, four in all. */
export async function loadOffers(
  runId: string,
  country: string,
  transaction?: Transaction,
): Promise<QuotedOffer[]> {
  const rows = await RunOffer.findAll({
    where: { runId },
    include: [
      {
        model: Offer,
        as: 'offer',
        required: true,
        include: [
          {
            model: Choice,
            as: 'choices',
            separate: true,
            where: { retiredAt: null },
            order: [['position', 'ASC']],
            include: [{ model: ChoiceAnswer, as: 'answers', separate: true, order: [['position', 'ASC']] }],
          },
          { model: Destination, as: 'destinations', separate: true, where: { country } },
        ],
      },
    ],
    order: [[{ model: Offer, as: 'offer' }, 'position', 'ASC']],
    ...(transaction && { transaction }),
  })
  return rows.map(toQuoted)
}

function toQuoted(row: RunOffer): QuotedOffer {
  const offer = row.offer!
  const { packedWeightG: grams, lengthMm, widthMm, heightMm } = offer
  const [destination] = offer.destinations ?? []
  const isMeasured = grams !== null && lengthMm !== null && widthMm !== null && heightMm !== null
  return {
    runOfferId: row.id,
    kind: row.kind,
    priceMinor: row.priceMinor,
    depositMinor: row.depositMinor,
    taxClass: row.taxClass,
    postedByOn: row.postedByOn,
    packed: isMeasured ? { grams, sizeMm: [lengthMm, widthMm, heightMm] } : null,
    destination: destination ? { ...destination.facts(), note: destination.note } : null,
    choices: (offer.choices ?? []).map(({ id, question, askedAfterLock, answers }) => ({
      id,
      question,
      askedAfterLock,
      answers: (answers ?? []).map(({ id: answer, label, surchargeMinor, isDefault }) => ({
        id: answer,
        label,
        surchargeMinor,
        isDefault,
      })),
    })),
  }
}

/** The workshop's zones with the services it still uses, in its own order. */
export async function loadPost(workshopId: string, transaction?: Transaction) {
  const rows = await PostageZone.findAll({
    where: { workshopId },
    order: [['position', 'ASC']],
    include: [
      {
        model: PostageService,
        as: 'services',
        separate: true,
        where: { endedAt: null },
        order: [['position', 'ASC']],
      },
    ],
    ...(transaction && { transaction }),
  })
  const zones: Zone[] = rows.map(({ id, countries, services }) => ({
    id,
    countries,
    services: (services ?? []).map((service) => service.facts()),
  }))
  const services = rows.flatMap((row) => row.services ?? [])
  return { zones, nameOf: (id: string) => services.find((service) => service.id === id)?.name ?? '' }
}

/** What rate each class of goods bears for a destination on a day: the workshop's own rates before the reference. */
export async function loadRates(
  workshop: Workshop,
  destination: string,
  on: string,
  transaction?: Transaction,
): Promise<(taxClass: TaxClass) => number> {
  const { country: home, taxMode: mode } = workshop
  const rows = await TaxRate.findAll({
    where: { workshopId: { [Op.or]: [workshop.id, null] }, country: [home, destination] },
    ...(transaction && { transaction }),
  })
  return (taxClass) => {
    const own = rows.filter((row) => row.workshopId !== null && row.taxClass === taxClass)
    const rates = rows
      .filter((row) => row.workshopId !== null || !own.some(({ country }) => country === row.country))
      .map((row) => row.facts())
    return taxRateFor({ mode, home, destination, taxClass, on, rates })
  }
}
