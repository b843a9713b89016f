import type { OfferKind } from './fields'

/** A sign-up as its person sees it. */
export type OwnSignUp = {
  id: string
  workshop: { slug: string; name: string }
  module: { slug: string; name: string }
  offer: OfferKind
  quantity: number
  state: string
  at: string
  timeZone: string
}
