import { depositPaid } from '@/lib/core/ledger/entries'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { openParcelForOrder } from '@/lib/services/_steps/open-parcel-for-order'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import { type Address, type Order, type Person, type RunOffer } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makeAddress, makeOrder } from '@/tests/support/worlds/order'
import { actorOf, makePerson, makeUser } from '@/tests/support/worlds/person'
import { makeModule } from '@/tests/support/worlds/module'
import { makeRun } from '@/tests/support/worlds/run'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

/** A locked run whose workshop has a packer; a kit weighs 420 g, a built one 460 g, a board set 150 g. */
export async function packingWorld() {
  const { zones, owner, ...shop } = await makeWorkshop()
  const design = await makeModule(shop.workshop)
  const house = await makeRun({ ...shop, ...design }, { state: 'locked', lockedAt: NOW, maximum: 60 })
  const lene = await makePerson({ name: 'Lene Quast' })
  await makeUser({ person: lene, workshopId: house.workshop.id, role: 'packer' })
  const packer = await actorOf(lene)
  const workshopId = house.workshop.id

  /** An order paid in full and booked, as acceptBalance leaves it. */
  async function paidOrder(
    wanted: { offer: RunOffer; quantity: number }[] = [{ offer: house.runOffers.kit, quantity: 1 }],
    over: { country?: string; person?: Person; address?: Address } & Partial<Order> = {},
  ) {
    const { country = 'DE', person: given, address: typed, ...columns } = over
    const person = given ?? (await makePerson())
    const address =
      typed ??
      (country === 'DE' ? undefined : await makeAddress(workshopId, person, { country, city: 'Town' }))
    const made = await makeOrder(
      { run: house.run, lines: wanted, person, address },
      { state: 'paid', ...columns },
    )
    await book(made.order)
    return made
  }

  /** The same, with its parcel in the queue. */
  async function queued(...given: Parameters<typeof paidOrder>) {
    const made = await paidOrder(...given)
    const parcel = await open(made.order)
    if (!parcel) throw new Error('the order did not enter the queue')
    return { ...made, parcel }
  }

  return { ...house, zones, owner, workshopId, lene, packer, paidOrder, queued, open }
}

/** The owner of a workshop that has nothing to do with this one. */
export async function elsewhere() {
  const { workshop, owner } = await makeWorkshop()
  return { workshopId: workshop.id, owner, actor: await actorOf(owner) }
}

export async function open(order: Order) {
  const opened = await inTransaction(async (tx) => ok(await openParcelForOrder(tx, order, NOW)))
  if (!opened.ok) throw new Error('a transaction that refuses nothing refused')
  return opened.value
}

function book(order: Order) {
  return inTransaction(async (tx) => {
    const { workshopId, id, runId, totalMinor, currency } = order
    if (totalMinor === 0) return ok(false)
    const posting = { workshopId, source: 'payment_attempt', sourceId: id, kind: 'deposit_paid' }
    const entries = depositPaid({ amount: totalMinor, currency })
    return ok(await postLedger(tx, { ...posting, orderId: id, runId, at: NOW, entries }))
  })
}
