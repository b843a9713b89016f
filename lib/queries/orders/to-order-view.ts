import 'server-only'
import type { AddressInput } from '@/lib/contracts/address'
import type { OrderDeed, OrderView } from '@/lib/contracts/orders'
import { mayCancelFreely } from '@/lib/core/states/order-guards'
import { mayWithdraw } from '@/lib/core/states/withdrawal-guards'
import { dayIn } from '@/lib/core/time/zone'
import type { OrderState } from '@/lib/core/states/order'
import type { FoundOrder } from '@/lib/queries/orders/find-orders'
import { withdrawalOf } from '@/lib/queries/orders/withdrawal-of'
import type { ProviderCustomer } from '@/models'

const UNTIL_PACKING: readonly OrderState[] = [
  'waiting',
  'awaiting_deposit',
  'reserved',
  'balance_due',
  'paid',
]

/** An order as the API and the lists tell it; times as ISO text, money in minor units. */
export function toOrderView(found: FoundOrder, card: ProviderCustomer | null, now: Date): OrderView {
  const { order, run, module, workshop, parcels } = found
  return {
    id: order.id,
    number: String(order.number),
    workshop: { slug: workshop.slug, name: workshop.name },
    module: { slug: module.slug, name: module.name },
    run: run.id,
    state: order.state,
    lines: (order.lines ?? []).map((line) => ({
      id: line.id,
      offer: line.offerKind,
      quantity: line.quantity,
      priceMinor: line.unitPriceMinor + line.unitSurchargeMinor,
      postedBy: line.revisedPostedByOn ?? line.postedByOn,
    })),
    depositMinor: order.depositMinor,
    balanceMinor: order.balanceMinor,
    postageMinor: order.postageMinor,
    taxMinor: order.taxMinor,
    totalMinor: order.totalMinor,
    paidMinor: sumOf((order.attempts ?? []).filter(({ state }) => state === 'captured')),
    refundedMinor: sumOf(
      (order.refunds ?? []).filter(({ state }) => state === 'succeeded' || state === 'pending'),
    ),
    currency: order.currency,
    holdUntil: order.holdUntil?.toISOString() ?? null,
    position: found.position,
    balanceChargedAt: order.state === 'balance_due' ? (order.balanceChargeAt?.toISOString() ?? null) : null,
    card: card?.methodLast4 ? { brand: card.methodBrand ?? 'card', last4: card.methodLast4 } : null,
    address: addressOf(found),
    parcels: parcels
      .filter(({ state }) => state !== 'discarded')
      .map((parcel) => ({
        service: parcel.serviceName,
        tracking: parcel.tracking,
        handedOverAt: parcel.handedOverAt?.toISOString() ?? null,
        state: parcel.state,
      })),
    history: historyOf(found),
    can: deedsOf(found, now),
  }
}

const sumOf = (rows: readonly { amountMinor: number }[]) =>
  rows.reduce((sum, { amountMinor }) => sum + amountMinor, 0)

function addressOf({ order }: FoundOrder): AddressInput {
  const facts = order.address?.facts()
  if (!facts) return { country: order.country, name: '', lines: [] }
  return {
    ...facts,
    lines: [...facts.lines],
    latin: facts.latin && { ...facts.latin, lines: [...facts.latin.lines] },
  }
}

/** Moves of the order, money that went back, parcels handed over; oldest first. */
function historyOf({ order, audit, parcels }: FoundOrder): OrderView['history'] {
  const happened = [
    ...audit.map(({ at, event }) => ({ at, event })),
    ...(order.refunds ?? []).flatMap(({ succeededAt: at }) => (at ? [{ at, event: 'refunded' }] : [])),
    ...parcels.flatMap(({ handedOverAt: at }) => (at ? [{ at, event: 'parcel_handed_over' }] : [])),
  ]
  return happened
    .sort((a, b) => a.at.getTime() - b.at.getTime())
    .map(({ at, event }) => ({ at: at.toISOString(), event }))
}

function deedsOf({ order, run, workshop }: FoundOrder, now: Date): OrderDeed[] {
  const isDue = order.state === 'awaiting_deposit' || order.state === 'balance_due'
  const isCancellable =
    order.state === 'awaiting_deposit' || (order.state === 'reserved' && mayCancelFreely(run.state).ok)
  const isOpen = order.state === 'reserved' && order.kind === 'paid' && run.state === 'taking_deposits'
  const isChangeDue = isOpen && (order.changes ?? []).length > 0
  const today = dayIn(now, workshop.timeZone)
  const isWithdrawable =
    order.kind === 'paid' &&
    mayWithdraw({ run: run.state, state: order.state, today, ...withdrawalOf(order, workshop) }).ok
  return [
    ...((isDue || isChangeDue) && workshop.state === 'open' ? (['pay'] as const) : []),
    ...(isCancellable && order.disputedAt === null ? (['cancel'] as const) : []),
    ...(isWithdrawable ? (['withdraw'] as const) : []),
    ...(order.state === 'waiting' ? (['leave'] as const) : []),
    ...(isOpen && order.disputedAt === null ? (['change'] as const) : []),
    ...(UNTIL_PACKING.includes(order.state) ? (['address'] as const) : []),
  ]
}
