import 'server-only'
import { Op } from 'sequelize'
import { taxRateFor } from '@/lib/core/orders/tax-rate'
import { writeShare } from '@/lib/core/plain/share'
import { dayIn } from '@/lib/core/time/zone'
import { TaxRate, type Workshop } from '@/models'

/** What the form shows of one offer's work: as it was entered, or a beginning. */
export function workOf(works: readonly { offer: string }[], offer: string) {
  const isAssembled = offer === 'built'
  const fresh = {
    offer,
    isAssembled,
    minutesPerUnit: 10,
    minutesPerStart: isAssembled ? 30 : 0,
    packaging: '0',
  }
  return works.find((work) => work.offer === offer) ?? fresh
}

/** What a first plan starts from: common practice, no source; every figure is there to be changed. */
export async function firstPlan(workshop: Workshop, now: Date) {
  const rates = await TaxRate.findAll({
    where: { country: workshop.country, workshopId: { [Op.or]: [null, workshop.id] } },
  })
  const rate = taxRateFor({
    mode: workshop.taxMode,
    home: workshop.country,
    destination: workshop.country,
    taxClass: 'standard',
    on: dayIn(now, workshop.timeZone),
    rates: rates.map((each) => each.facts()),
  })
  const step = (name: string, days: [number, number, number], after: string) => {
    const [optimistic, likely, pessimistic] = days
    return { name, optimistic, likely, pessimistic, after }
  }
  return {
    currency: workshop.currency,
    offers: [] as { offer: string }[],
    onceMinutes: 120,
    yieldPercent: '95',
    confidencePercent: '95',
    unitsPerOrder: '1',
    taxes: rate > 0 ? [{ rate: writeShare(rate), weight: 1 }] : [],
    steps: [
      step('Boards and front panels made', [10, 14, 25], ''),
      step('Parts bought', [5, 10, 20], ''),
      step('Building and testing', [5, 10, 20], '1, 2'),
      step('Packing and posting', [3, 5, 10], '3'),
    ],
  }
}
