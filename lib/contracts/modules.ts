import { z } from 'zod'
import { countryCode, type OfferKind } from './fields'

export const ModuleQuery = z.object({ country: countryCode.optional() })

/** One piece of an offer, delivered to one country; amounts as the buyer pays them, tax included. */
export type OfferDelivery = {
  offer: OfferKind
  /** `no_post`: no service of the workshop takes it there, or it has not been weighed yet. */
  state: 'open' | 'closed' | 'paused' | 'no_post'
  /** The maker's reason where it is closed or paused. */
  reason: string | null
  /** null while the price is open. */
  priceMinor: number | null
  depositMinor: number | null
  /** null where it is not posted. */
  postageMinor: number | null
  /** Price and postage. */
  totalMinor: number | null
  /** Tax within the total. */
  taxMinor: number | null
  taxBasisPoints: number
  /** Who pays duties on arrival. */
  duties: 'none' | 'buyer_pays' | 'prepaid' | 'refused'
  note: string
}

export type Delivery = { country: string; currency: string; offers: OfferDelivery[] }

/** `GET /api/w/{workshop}/{module}`: what anyone may know. */
export type ModulePublic = {
  module: { slug: string; name: string; oneLine: string; workshop: string; workshopName: string }
  /** Prices are null while they are still open. */
  offers: { offer: OfferKind; priceMinor: number | null; depositMinor: number | null; currency: string }[]
  /** null while the owner hides it. */
  interest: { confirmed: number; units: number } | null
  run: {
    id: string
    state: 'taking_deposits' | 'locked'
    minimum: number
    maximum: number
    deposited: number
    held: number
    waiting: number
    decideBy: string
    opensToAllAt: string | null
    offers: { offer: OfferKind; priceMinor: number; depositMinor: number; postedBy: string }[]
  } | null
  /** Postage and tax for the country asked for, the workshop's own when none is. */
  delivery: Delivery
}
