import 'server-only'
import type { Delivery, OfferDelivery } from '@/lib/contracts/modules'
import { packedTogether } from '@/lib/core/orders/packed'
import { orderTotals } from '@/lib/core/orders/totals'
import { postage, type Zone } from '@/lib/core/post/postage'
import { loadPost, loadRates } from '@/lib/queries/orders/quote-data'
import { Destination, type Offer, type Workshop } from '@/models'
import type { PriceOf } from './prices-of'

type Asked = { workshop: Workshop; offers: readonly Offer[]; priceOf: PriceOf; country: string; on: string }

/**
 * What one piece of each offer costs in a country, by the rules an order is priced by: postage by packed weight, tax of the
 * destination. Four statements, however many offers.
 */
export async function deliveryOf({ workshop, offers, priceOf, country, on }: Asked): Promise<Delivery> {
  const { zones } = await loadPost(workshop.id)
  const rateOf = await loadRates(workshop, country, on)
  const destinations = await Destination.findAll({
    where: { offerId: offers.map(({ id }) => id), country },
  })
  const rows = offers.map((offer): OfferDelivery => {
    const destination = destinations.find(({ offerId }) => offerId === offer.id)
    const basisPoints = rateOf(offer.taxClass)
    // Nobody entered a destination: the same as closed, as when an order is placed.
    const state = destination?.state ?? 'closed'
    const posted = state === 'open' ? postageOf(zones, country, offer) : null
    return {
      offer: offer.kind,
      state: state === 'open' && posted === null ? 'no_post' : state,
      reason: destination?.reason ?? null,
      ...sumsOf(priceOf(offer), posted, basisPoints, workshop.pricesIncludeTax),
      taxBasisPoints: basisPoints,
      duties: destination?.duties ?? 'none',
      note: destination?.note ?? '',
    }
  })
  return { country, currency: workshop.currency, offers: rows }
}

function postageOf(zones: readonly Zone[], country: string, offer: Offer): number | null {
  const { packedWeightG: grams, lengthMm, widthMm, heightMm } = offer
  if (grams === null || lengthMm === null || widthMm === null || heightMm === null) return null
  const packed = packedTogether([{ quantity: 1, grams, sizeMm: [lengthMm, widthMm, heightMm] }])
  const quote = postage(zones, country, packed.grams, packed.sizeMm)
  return quote.ok ? quote.value.price : null
}

function sumsOf(
  price: ReturnType<PriceOf>,
  posted: number | null,
  basisPoints: number,
  pricesIncludeTax: boolean,
) {
  const totals = orderTotals({
    lines: [
      {
        quantity: 1,
        priceMinor: price?.priceMinor ?? 0,
        surchargeMinor: 0,
        depositMinor: price?.depositMinor ?? 0,
        basisPoints,
      },
    ],
    postageMinor: posted ?? 0,
    postageBasisPoints: basisPoints,
    pricesIncludeTax,
  })
  const isWhole = price !== null && posted !== null
  return {
    priceMinor: price && totals.lines[0]!.totalMinor,
    depositMinor: price && price.depositMinor,
    postageMinor: posted === null ? null : totals.postageMinor,
    totalMinor: isWhole ? totals.totalMinor : null,
    taxMinor: isWhole ? totals.taxMinor : price && totals.lines[0]!.taxMinor,
  }
}
