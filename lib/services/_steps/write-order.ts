import 'server-only'
import type { Transaction } from 'sequelize'
import { minor } from '@/lib/core/brand'
import { INVITATION_MOVES, next } from '@/lib/core/states/invitation'
import type { OrderQuote } from '@/lib/queries/orders/quote-order'
import { nextNumber } from '@/lib/services/_steps/next-number'
import { recordMove } from '@/lib/services/_steps/record-move'
import { type Address, Invitation, Order, OrderLine, type Run, type Workshop } from '@/models'

type Wanted = {
  run: Run
  workshop: Workshop
  personId: string
  quote: OrderQuote
  address: Address
  /** Null: it queues. */
  holdUntil: Date | null
  now: Date
}

/**
 * Writes an order with everything that is fixed for it; an open invitation of the person ends in it.
 * The caller has locked the run. Locks: the order counter. Writes: order, lines, the run's queue number, invitation,
 * audit. Repeat: writes another order.
 */
export async function writeOrder(tx: Transaction, wanted: Wanted): Promise<Order> {
  const { run, workshop, personId, quote, address, now } = wanted
  const { totals } = quote
  const isQueued = wanted.holdUntil === null
  const order = await Order.create(
    {
      workshopId: workshop.id,
      number: await nextNumber(tx, workshop.id, 'order'),
      runId: run.id,
      personId,
      state: isQueued ? 'waiting' : 'awaiting_deposit',
      unitCount: quote.units,
      queueNo: isQueued ? run.nextQueueNo : null,
      holdUntil: wanted.holdUntil,
      holdAttempts: isQueued ? 0 : 1,
      placedAt: now,
      termsVersionId: run.termsVersionId,
      addressId: address.id,
      addressFingerprint: address.fingerprint,
      country: address.country,
      currency: run.currency,
      taxMode: workshop.taxMode,
      pricesIncludeTax: workshop.pricesIncludeTax,
      ...sumsOf(quote),
    },
    { transaction: tx },
  )
  if (isQueued) await run.update({ nextQueueNo: run.nextQueueNo + 1 }, { transaction: tx })
  await OrderLine.bulkCreate(
    quote.lines.map((line, position) => ({
      workshopId: workshop.id,
      orderId: order.id,
      runOfferId: line.offer.runOfferId,
      offerKind: line.offer.kind,
      position,
      quantity: line.quantity,
      unitPriceMinor: line.offer.priceMinor,
      unitSurchargeMinor: minor(line.surchargeMinor),
      unitDepositMinor: line.offer.depositMinor,
      totalMinor: totals.lines[position]!.totalMinor,
      taxClass: line.offer.taxClass,
      taxBasisPoints: line.basisPoints,
      taxMinor: totals.lines[position]!.taxMinor,
      choices: line.choices,
      postedByOn: line.offer.postedByOn,
    })),
    { transaction: tx },
  )
  await recordMove(tx, {
    workshopId: workshop.id,
    subjectType: 'order',
    subjectId: order.id,
    from: null,
    event: isQueued ? 'queue' : 'place',
    to: order.state,
    byPersonId: personId,
    at: now,
  })
  await endInvitations(tx, { runId: run.id, personId, now })
  return order
}

/** The sums of a quote as an order keeps them. */
export function sumsOf({ totals, postage, postageBasisPoints }: OrderQuote) {
  return {
    goodsMinor: minor(totals.totalMinor - totals.postageMinor),
    postageMinor: totals.postageMinor,
    postageQuote: postage,
    postageTaxBasisPoints: postageBasisPoints,
    postageTaxMinor: totals.postageTaxMinor,
    taxMinor: totals.taxMinor,
    totalMinor: totals.totalMinor,
    depositMinor: totals.depositMinor,
    balanceMinor: totals.balanceMinor,
  }
}

async function endInvitations(
  tx: Transaction,
  { runId, personId, now }: { runId: string; personId: string; now: Date },
): Promise<void> {
  const open = await Invitation.findAll({ where: { runId, personId, state: 'sent' }, transaction: tx })
  for (const invitation of open) {
    const to = next(INVITATION_MOVES, invitation.state, 'order')
    if (!to.ok) continue
    await invitation.update({ state: to.value, answeredAt: now }, { transaction: tx })
    await recordMove(tx, {
      workshopId: invitation.workshopId,
      subjectType: 'invitation',
      subjectId: invitation.id,
      from: 'sent',
      event: 'order',
      to: to.value,
      byPersonId: personId,
      at: now,
    })
  }
}
