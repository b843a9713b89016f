import type { Minor } from '@/lib/core/brand'
import type { Offer, RunOffer } from '@/models'

/** Price and deposit of one piece; null while the price is open. */
export type PriceOf = (offer: Offer) => { priceMinor: Minor; depositMinor: Minor } | null

/** What a run sells an offer for, the module's own price where no run sells it. */
export function pricesOf(runOffers: readonly RunOffer[]): PriceOf {
  return (offer) => {
    const { priceMinor, depositMinor } = runOffers.find(({ offerId }) => offerId === offer.id) ?? offer
    return priceMinor === null || depositMinor === null ? null : { priceMinor, depositMinor }
  }
}
