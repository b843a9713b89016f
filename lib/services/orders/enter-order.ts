import 'server-only'
import type { Transaction } from 'sequelize'
import type { EnterOrderInput } from '@/lib/contracts/orders'
import { orderMistakes } from '@/lib/contracts/order-mistakes'
import { refuseFields } from '@/lib/contracts/problem'
import { minor } from '@/lib/core/brand'
import { paidOutside } from '@/lib/core/ledger/entries'
import { freeUnits } from '@/lib/core/orders/free'
import { orderTotals } from '@/lib/core/orders/totals'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { dayIn } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { addressErrors } from '@/lib/queries/orders/address-errors'
import { loadOffers, loadRates, type QuotedOffer } from '@/lib/queries/orders/quote-data'
import { addAddress } from '@/lib/services/_steps/add-address'
import { findOrAddPerson } from '@/lib/services/_steps/find-or-add-person'
import { nextNumber } from '@/lib/services/_steps/next-number'
import { openParcelForOrder } from '@/lib/services/_steps/open-parcel-for-order'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import { issueOutsidePrepayment } from '@/lib/services/_steps/prepayment-invoice'
import { recordMove } from '@/lib/services/_steps/record-move'
import { takePlace } from '@/lib/services/_steps/take-place'
import { Order, OrderLine, Run, RunOffer, Workshop } from '@/models'

type Cmd = { actor: Actor; workshopId: string; runId: string; input: EnterOrderInput; now: Date }

/**
 * The owner enters an order paid elsewhere, or free, with a reason (a tester, a friend, a dealer): it takes places and is
 * packed like any other, and never counts towards the minimum. What was paid outside is booked so.
 * Refuses: not_found · run_not_open (neither taking deposits nor locked) · no_place · field mistakes.
 * Locks: the run. Writes: person, address, order, lines, counts, ledger, invoice, parcel once locked, audit. Repeat: enters
 * another.
 */
export function enterOrder(cmd: Cmd) {
  const { actor, workshopId, runId, input } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'order:enter', { workshopId })) return refuse('not_found')
    const run = await Run.findOne({ where: { id: runId, workshopId }, transaction: tx, lock: tx.LOCK.UPDATE })
    if (!run) return refuse('not_found')
    if (run.state !== 'taking_deposits' && run.state !== 'locked') return refuse('run_not_open')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, rejectOnEmpty: true })
    const errors = addressErrors(input.address)
    const offers = await loadOffers(run.id, input.address.country, tx)
    const lines = input.lines.map((line, i) => {
      const offer = offers.find(({ kind }) => kind === line.offer)
      if (!offer) errors[`lines.${i}.offer`] = orderMistakes.offer
      return { ...line, offer: offer as QuotedOffer }
    })
    if (Object.keys(errors).length > 0) return refuseFields(errors)
    const room = await RunOffer.findAll({ where: { runId: run.id }, transaction: tx })
    const units = lines.reduce((sum, { quantity }) => sum + quantity, 0)
    const wanted = lines.map(({ offer, quantity }) => ({ runOfferId: offer.runOfferId, quantity }))
    if (freeUnits(run, room, wanted) < units) return refuse('no_place')
    return write(tx, { ...cmd, run, workshop, lines, units, byPersonId: actor.personId })
  })
}

type Entering = Cmd & {
  run: Run
  workshop: Workshop
  lines: { offer: QuotedOffer; quantity: number; priceMinor: number }[]
  units: number
  byPersonId: string
}

async function write(tx: Transaction, given: Entering) {
  const { workshop, run, input, now, byPersonId, lines } = given
  const { country } = input.address
  const rateOf = await loadRates(workshop, country, dayIn(now, workshop.timeZone), tx)
  const priced = lines.map(({ offer, quantity, priceMinor }) => ({
    quantity,
    priceMinor,
    surchargeMinor: 0,
    depositMinor: 0,
    basisPoints: rateOf(offer.taxClass),
  }))
  // The price the owner names is what was paid, tax in it.
  const totals = orderTotals({
    lines: priced,
    postageMinor: 0,
    postageBasisPoints: 0,
    pricesIncludeTax: true,
  })
  const person = await findOrAddPerson(tx, input.email, now)
  const { id: workshopId, taxMode } = workshop
  const address = await addAddress(tx, { workshopId, personId: person.id, address: input.address, now })
  const { totalMinor, taxMinor } = totals
  const order = await Order.create(
    {
      workshopId,
      number: await nextNumber(tx, workshopId, 'order'),
      runId: run.id,
      personId: person.id,
      kind: 'manual',
      state: 'paid',
      unitCount: given.units,
      placedAt: now,
      paidAt: now,
      addressId: address.id,
      addressFingerprint: address.fingerprint,
      country,
      currency: run.currency,
      taxMode,
      pricesIncludeTax: true,
      goodsMinor: totalMinor,
      postageMinor: minor(0),
      taxMinor,
      totalMinor,
      depositMinor: totalMinor,
      balanceMinor: minor(0),
      manualReason: input.reason,
      enteredByPersonId: byPersonId,
    },
    { transaction: tx },
  )
  await OrderLine.bulkCreate(
    lines.map(({ offer, quantity, priceMinor }, position) => ({
      workshopId,
      orderId: order.id,
      runOfferId: offer.runOfferId,
      offerKind: offer.kind,
      position,
      quantity,
      unitPriceMinor: minor(priceMinor),
      unitDepositMinor: minor(priceMinor),
      totalMinor: totals.lines[position]!.totalMinor,
      taxClass: offer.taxClass,
      taxBasisPoints: priced[position]!.basisPoints,
      taxMinor: totals.lines[position]!.taxMinor,
      postedByOn: offer.postedByOn,
    })),
    { transaction: tx },
  )
  const by = { workshopId, subjectType: 'order' as const, subjectId: order.id, byPersonId, at: now }
  await recordMove(tx, { ...by, from: null, event: 'enter', to: 'paid' })
  await takePlace(tx, order)
  await bookOutside(tx, order, now)
  if (run.state === 'locked') await openParcelForOrder(tx, order, now)
  return ok({ order: order.id, number: order.number })
}

async function bookOutside(tx: Transaction, order: Order, now: Date): Promise<void> {
  const { workshopId, id, runId, totalMinor: amount, currency } = order
  if (amount === 0) return
  await postLedger(tx, {
    workshopId,
    source: 'order',
    sourceId: id,
    kind: 'paid_outside',
    orderId: id,
    runId,
    at: now,
    entries: paidOutside({ amount, currency }),
  })
  await issueOutsidePrepayment(tx, order, now)
}
