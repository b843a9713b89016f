import { z } from 'zod'
import { AddressInput } from './address'
import { email, minorAmount, offerKind, paragraphs, slug, tick, uuid, wholeNumber } from './fields'

export const OrderLineInput = z.object({
  offer: offerKind,
  quantity: wholeNumber(1, 10),
  /** Choice id → answer id. */
  choices: z.record(z.string(), z.string()).optional(),
})

/** A place in a run. Lines of quantity '' or '0' coming from a form are left out before this is read. */
export const OrderInput = z.object({
  run: uuid,
  lines: z
    .array(OrderLineInput, { error: 'Choose at least one offer.' })
    .min(1, 'Choose at least one offer.')
    .max(3),
  address: AddressInput,
})
export type OrderInput = z.infer<typeof OrderInput>

/** Other lines for an order under deposit. */
export const OrderChangeInput = OrderInput.pick({ lines: true })
export type OrderChangeInput = z.infer<typeof OrderChangeInput>

/** An order the owner enters: paid elsewhere at the price named, or free. */
export const EnterOrderInput = z.object({
  email,
  lines: z
    .array(z.object({ offer: offerKind, quantity: wholeNumber(1, 100), priceMinor: minorAmount() }), {
      error: 'Choose at least one offer.',
    })
    .min(1, 'Choose at least one offer.')
    .max(3),
  address: AddressInput,
  reason: paragraphs(500, 3, 'Say why it is entered by hand.'),
})
export type EnterOrderInput = z.infer<typeof EnterOrderInput>

export const CancelForBuyerInput = z.object({ reason: paragraphs(1000, 3, 'Say why; the buyer reads it.') })
export const OrderParams = z.object({ workshop: slug, order: uuid })

/** An order form's rows that were left at zero or empty are no lines of the order. */
export function readOrderForm(body: Record<string, unknown>): Record<string, unknown> {
  if (!Array.isArray(body.lines)) return body
  const lines = body.lines.filter((line: { quantity?: unknown }) => {
    const typed = String(line.quantity ?? '').trim()
    return typed !== '' && typed !== '0'
  })
  return { ...body, lines }
}

/** `otherCard`: give up the payment that waits for the bank and begin anew with another card. */
export const PayInput = z.object({ otherCard: tick.optional() })
export type PayInput = z.infer<typeof PayInput>

export const AddressChange = z.object({ address: AddressInput })
export type AddressChange = z.infer<typeof AddressChange>

export type OrderPlaced = {
  order: string
  state: 'awaiting_deposit' | 'waiting'
  /** The provider's card page; null while waiting. */
  payUrl: string | null
  /** Place on the waiting list, from 1; null with a place. */
  position: number | null
}

export type PayAnswer = { payUrl: string }
export type CheckAnswer = { state: string }
export type CancelAnswer = { state: string; refundMinor: number }

/** What the order's person may do with it now. */
export type OrderDeed = 'pay' | 'cancel' | 'address' | 'leave' | 'change' | 'withdraw'

export type OrderView = {
  id: string
  number: string
  workshop: { slug: string; name: string }
  module: { slug: string; name: string }
  run: string
  state: string
  lines: {
    id: string
    offer: 'boards' | 'kit' | 'built'
    quantity: number
    priceMinor: number
    postedBy: string
  }[]
  /** Sum of the lines' deposits, price in full and what is still to pay; postage stands within the balance. */
  depositMinor: number
  balanceMinor: number
  postageMinor: number
  taxMinor: number
  totalMinor: number
  paidMinor: number
  refundedMinor: number
  currency: string
  /** ISO instant until which the place is held while the deposit is paid. */
  holdUntil: string | null
  /** Place on the waiting list, from 1. */
  position: number | null
  /** ISO instant at which the saved card is charged. */
  balanceChargedAt: string | null
  card: { brand: string; last4: string } | null
  address: AddressInput
  parcels: { service: string | null; tracking: string | null; handedOverAt: string | null; state: string }[]
  history: { at: string; event: string }[]
  can: OrderDeed[]
}
