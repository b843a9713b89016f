import type { CreationAttributes } from 'sequelize'
import { minor } from '@/lib/core/brand'
import { orderTotals } from '@/lib/core/orders/totals'
import type { OrderState } from '@/lib/core/states/order'
import { Address, Counter, Order, OrderLine, type Person, type Run, type RunOffer } from '@/models'
import { hoursAfter, NOW } from './base'
import { makePerson } from './person'
import { hashOf } from './sign-up'

const TAX_BASIS_POINTS = 1900
const POSTAGE_MINOR = 490
/** States in which an order takes places of its run. */
const TAKES_PLACE: readonly OrderState[] = [
  'awaiting_deposit',
  'reserved',
  'balance_due',
  'paid',
  'packed',
  'posted',
]

type Wanted = {
  run: Run
  lines: { offer: RunOffer; quantity: number }[]
  person?: Person
  address?: Address
}

/** An address in Ulm. */
export async function makeAddress(
  workshopId: string,
  person: Person,
  over: Partial<CreationAttributes<Address>> = {},
) {
  const words = {
    name: person.name ?? 'A. Berg',
    lines: ['Hof 1'],
    postcode: '89073',
    city: 'Ulm',
    country: 'DE',
  }
  return Address.create({
    workshopId,
    personId: person.id,
    ...words,
    fingerprint: hashOf(JSON.stringify({ ...words, ...over })),
    createdAt: NOW,
    ...over,
  })
}

/** An order as placing it writes it: sums of the core, places counted on the run. Reserved unless said otherwise. */
export async function makeOrder(wanted: Wanted, over: Partial<CreationAttributes<Order>> = {}) {
  const { run, lines: ordered } = wanted
  const { workshopId } = run
  const person = wanted.person ?? (await makePerson())
  const address = wanted.address ?? (await makeAddress(workshopId, person))
  const state = over.state ?? 'reserved'
  const totals = orderTotals({
    lines: ordered.map(({ offer, quantity }) => ({
      quantity,
      priceMinor: offer.priceMinor,
      surchargeMinor: 0,
      depositMinor: offer.depositMinor,
      basisPoints: TAX_BASIS_POINTS,
    })),
    postageMinor: POSTAGE_MINOR,
    postageBasisPoints: TAX_BASIS_POINTS,
    pricesIncludeTax: true,
  })
  const unitCount = ordered.reduce((sum, { quantity }) => sum + quantity, 0)
  const order = await Order.create({
    workshopId,
    number: await nextNumber(workshopId),
    runId: run.id,
    personId: person.id,
    state,
    unitCount,
    holdUntil: state === 'awaiting_deposit' ? hoursAfter(NOW, 0.5) : null,
    queueNo: state === 'waiting' ? run.nextQueueNo : null,
    placedAt: NOW,
    termsVersionId: run.termsVersionId,
    addressId: address.id,
    addressFingerprint: address.fingerprint,
    country: address.country,
    currency: run.currency,
    taxMode: 'home_rate',
    pricesIncludeTax: true,
    goodsMinor: minor(totals.totalMinor - totals.postageMinor),
    postageMinor: totals.postageMinor,
    postageTaxBasisPoints: TAX_BASIS_POINTS,
    postageTaxMinor: totals.postageTaxMinor,
    taxMinor: totals.taxMinor,
    totalMinor: totals.totalMinor,
    depositMinor: totals.depositMinor,
    balanceMinor: totals.balanceMinor,
    ...momentsOf(state),
    ...over,
  })
  const lines = await OrderLine.bulkCreate(
    ordered.map(({ offer, quantity }, position) => ({
      workshopId,
      orderId: order.id,
      runOfferId: offer.id,
      offerKind: offer.kind,
      position,
      quantity,
      unitPriceMinor: offer.priceMinor,
      unitDepositMinor: offer.depositMinor,
      totalMinor: totals.lines[position]!.totalMinor,
      taxClass: offer.taxClass,
      taxBasisPoints: TAX_BASIS_POINTS,
      taxMinor: totals.lines[position]!.taxMinor,
      postedByOn: offer.postedByOn,
    })),
  )
  if (state === 'waiting') await run.increment('nextQueueNo')
  if (TAKES_PLACE.includes(state)) await takePlaces(run, ordered, unitCount)
  return { order, lines, person, address }
}

/** What the database wants to be known of an order in a state. */
function momentsOf(state: OrderState): Partial<CreationAttributes<Order>> {
  const paidAt = ['paid', 'packed', 'posted', 'withdrawn', 'returned'].includes(state) ? NOW : null
  const postedAt = ['posted', 'withdrawn', 'returned'].includes(state) ? NOW : null
  return {
    paidAt,
    postedAt,
    cancelledAt: state === 'cancelled' ? NOW : null,
    cancelCause: state === 'cancelled' ? 'customer' : null,
    expiredAt: state === 'expired' ? NOW : null,
    lapsedAt: state === 'lapsed' ? NOW : null,
  }
}

async function takePlaces(run: Run, ordered: Wanted['lines'], unitCount: number) {
  await run.increment('committedUnits', { by: unitCount })
  for (const { offer, quantity } of ordered) await offer.increment('committedUnits', { by: quantity })
  await run.reload()
}

async function nextNumber(workshopId: string) {
  const [counter] = await Counter.findOrCreate({
    where: { workshopId, series: 'order' },
    defaults: { workshopId, series: 'order' },
  })
  await counter.increment('last')
  return (await counter.reload()).last
}
