import { describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { Address } from '@/models'
import { at, NOW } from '../support/worlds/base'
import { makeAddress, makeOrder } from '../support/worlds/order'
import { makeRun } from '../support/worlds/run'
import { refusedBy } from './refused-by'

async function kitOrder() {
  const world = await makeRun(undefined, { maximum: 20 })
  const lines = [{ offer: world.runOffers.kit, quantity: 1 }]
  return { ...world, wanted: lines, ...(await makeOrder({ run: world.run, lines })) }
}

describe('one live order per run, person and address', () => {
  test('a second one is refused, to another address it is not', async () => {
    const { run, wanted, person, address } = await kitOrder()
    const again = () => makeOrder({ run, lines: wanted, person, address })
    expect(await refusedBy(again)).toBe('orders_one_live_key')
    const elsewhere = await makeAddress(run.workshopId, person, { lines: ['Hof 2'] })
    await makeOrder({ run, lines: wanted, person, address: elsewhere })
  })

  test('after the first was cancelled there is room for another', async () => {
    const { run, wanted, person, address, order } = await kitOrder()
    await order.update({ state: 'cancelled', cancelledAt: NOW, cancelCause: 'customer' })
    await makeOrder({ run, lines: wanted, person, address })
  })

  test('orders entered by hand are not counted', async () => {
    const { run, wanted, person, address, workshop } = await kitOrder()
    const byHand = {
      kind: 'manual',
      manualReason: 'Tester',
      enteredByPersonId: workshop.createdByPersonId,
    } as const
    await makeOrder({ run, lines: wanted, person, address }, { ...byHand, state: 'paid' })
  })
})

test('an order’s sums add up', async () => {
  const { order, lines } = await kitOrder()
  // 95.00 kit + 4.90 postage = 99.90, of which 25.00 deposit (worked by hand)
  expect([order.totalMinor, order.depositMinor, order.balanceMinor]).toEqual([9990, 2500, 7490])
  expect(await refusedBy(() => order.update({ balanceMinor: minor(7489) }))).toBe('orders_sums_check')
  await order.reload()
  expect(await refusedBy(() => order.update({ postageMinor: minor(0) }))).toBe('orders_sums_check')
  expect(await refusedBy(() => lines[0]!.update({ quantity: 2 }))).toBe('order_lines_total_check')
})

test('a state comes with what must be known of it', async () => {
  const { order } = await kitOrder()
  const change = async (columns: Parameters<typeof order.update>[0]) => {
    await order.reload()
    return refusedBy(() => order.update(columns))
  }
  expect(await change({ state: 'awaiting_deposit' })).toBe('orders_held_check')
  expect(await change({ holdUntil: NOW })).toBe('orders_held_check')
  expect(await change({ state: 'waiting' })).toBe('orders_waiting_has_number_check')
  expect(await change({ state: 'cancelled', cancelledAt: NOW })).toBe('orders_cancelled_check')
  expect(await change({ state: 'lapsed' })).toBe('orders_lapsed_check')
  expect(await change({ state: 'paid' })).toBe('orders_paid_at_check')
  expect(await change({ state: 'posted', paidAt: NOW })).toBe('orders_posted_check')
  expect(await change({ manualReason: 'A friend' })).toBe('orders_manual_check')
  expect(await change({ termsVersionId: null })).toBe('orders_paid_complete_check')
  expect(await change({ state: 'refunded' as never })).toBe('orders_state_check')
})

test('two waiting orders of a run never have the same number', async () => {
  const { run, wanted } = await kitOrder()
  await makeOrder({ run, lines: wanted }, { state: 'waiting', queueNo: 7 })
  const second = () => makeOrder({ run, lines: wanted }, { state: 'waiting', queueNo: 7 })
  expect(await refusedBy(second)).toBe('orders_run_id_queue_no_key')
})

describe('addresses are only added', () => {
  test('an address is neither changed nor deleted', async () => {
    const { address } = await kitOrder()
    expect(await refusedBy(() => address.update({ city: 'Bonn' }))).toMatch(/never changed/)
    expect(await refusedBy(() => address.destroy())).toMatch(/never changed/)
  })

  test('erasing blanks it, once, and nothing may be left', async () => {
    const { address } = await kitOrder()
    const erasedAt = at('2028-01-01T00:00:00Z')
    const blank = { name: '', lines: [], city: null, postcode: null, fingerprint: 'x', erasedAt }
    const partly = () => Address.update({ ...blank, postcode: '89073' }, { where: { id: address.id } })
    expect(await refusedBy(partly)).toBe('addresses_erased_blank_check')
    await Address.update(blank, { where: { id: address.id } })
    const again = () => Address.update({ ...blank, name: 'Someone' }, { where: { id: address.id } })
    expect(await refusedBy(again)).toMatch(/never changed/)
    expect((await address.reload()).facts()).toMatchObject({ country: 'DE', name: '', lines: [] })
  })
})
