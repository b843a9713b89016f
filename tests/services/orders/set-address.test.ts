import { afterAll, beforeEach, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { placeOrder } from '@/lib/services/orders/place-order'
import { setAddress } from '@/lib/services/orders/set-address'
import { chargeBalance } from '@/lib/services/payments/charge-balance'
import { Address, OrderLine, Parcel, Run } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makeBuyer, moneyWorld, orderInput, placed, reserved, settleAll } from '@/tests/support/worlds/money'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld()
  await settleAll()
})
afterAll(closeSandboxPool)

const ULM = { country: 'DE', name: 'A. Berg', lines: ['Neuer Graben 5'], postcode: '89073', city: 'Ulm' }
const WIEN = { country: 'AT', name: 'A. Berg', lines: ['Ring 1'], postcode: '1010', city: 'Wien' }
const change = async (
  made: { actor: Parameters<typeof setAddress>[0]['actor']; order: { id: string } },
  address = ULM,
) => {
  const done = await setAddress({ actor: made.actor, orderId: made.order.id, address, now: NOW })
  return done.ok ? 'changed' : 'errors' in done ? Object.keys(done.errors) : done.reason
}

test('another house in the same country changes the address and no sum; the old one is kept', async () => {
  const made = await reserved(world.run)
  const before = made.order.totalMinor
  const old = made.order.addressId
  expect(await change(made)).toBe('changed')
  expect(await made.order.reload()).toMatchObject({ totalMinor: before, country: 'DE' })
  expect(await Address.findByPk(made.order.addressId!)).toMatchObject({ lines: ['Neuer Graben 5'] })
  expect(await Address.findByPk(old!)).not.toBeNull()
})

test('another country is quoted again: the balance moves, price and deposit stay', async () => {
  const made = await reserved(world.run)
  expect(await change(made, WIEN)).toBe('changed')
  // Austria is 9.90 instead of 4.90; home rate within the Union, so 19 % in 95.00 and in 9.90: 15.17 + 1.58.
  expect(await made.order.reload()).toMatchObject({
    country: 'AT',
    depositMinor: 2_500,
    postageMinor: 990,
    totalMinor: 10_490,
    balanceMinor: 7_990,
    taxMinor: 1_675,
  })
  const gb = { country: 'GB', name: 'A. Berg', lines: ['1 Quay'], postcode: 'EC1A 1BB', city: 'London' }
  expect(await change(made, gb)).toBe('changed')
  expect(await made.order.reload()).toMatchObject({ taxMinor: 0, totalMinor: 10_490 })
  expect(await OrderLine.findOne({ where: { orderId: made.order.id } })).toMatchObject({ taxMinor: 0 })
})

test('an open parcel follows; its printed label is void', async () => {
  const made = await reserved(world.run)
  await Run.update({ state: 'locked', lockedAt: NOW }, { where: { id: world.run.id } })
  await made.order.update({ state: 'balance_due', balanceAskedAt: NOW, balanceChargeAt: NOW })
  await chargeBalance({ orderId: made.order.id, now: NOW })
  const parcel = await Parcel.findOne({ where: { personId: made.person.id }, rejectOnEmpty: true })
  await parcel.update({ printedAt: NOW })
  expect(await change(made)).toBe('changed')
  expect(await parcel.reload()).toMatchObject({
    addressId: (await made.order.reload()).addressId,
    labelVoidAt: NOW,
  })
  expect(await change(made, WIEN)).toBe('country_is_settled')
  await made.order.update({ state: 'packed', packedAt: NOW })
  expect(await change(made)).toBe('packed_already')
})

test('is refused with a sentence at its field, for a place another live order goes to, and to others', async () => {
  const made = await placed(world.run)
  expect(await change(made, { ...ULM, postcode: '' })).toEqual(['address.postcode'])
  expect(await change(made, { ...ULM, country: 'FR' })).toEqual(['address.country'])
  const second = await placeOrder({
    actor: made.actor,
    input: orderInput(world.run, { address: ULM }),
    now: NOW,
  })
  expect(second.ok).toBe(true)
  expect(await change(made)).toBe('already_ordered')
  const { actor } = await makeBuyer()
  expect(await change({ actor, order: made.order })).toBe('not_found')
})
