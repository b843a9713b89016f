import { expect, test } from 'vitest'
import { ok, refuse } from '@/lib/core/result'
import type { OrderState } from '@/lib/core/states/order'
import { mayGoOut } from '@/lib/core/states/parcel-guards'

const fine = {
  order: 'paid' as OrderState,
  disputed: false,
  destinationPaused: false,
  onHold: false,
  labelVoid: false,
}

test('a parcel of a paid or packed order goes out', () => {
  expect(mayGoOut(fine)).toEqual(ok(true))
  expect(mayGoOut({ ...fine, order: 'packed' })).toEqual(ok(true))
})

test.each<[OrderState, string]>([
  ['cancelled', 'order_cancelled'],
  ['expired', 'order_cancelled'],
  ['lapsed', 'order_cancelled'],
  ['withdrawn', 'order_cancelled'],
  ['returned', 'order_cancelled'],
  ['waiting', 'order_not_paid'],
  ['awaiting_deposit', 'order_not_paid'],
  ['reserved', 'order_not_paid'],
  ['balance_due', 'order_not_paid'],
  ['posted', 'order_not_paid'],
])('an order that is %s stops it: %s', (order, reason) => {
  expect(mayGoOut({ ...fine, order })).toEqual(refuse(reason))
})

test('a dispute, a paused destination, a hold and a void label stop it, the gravest named first', () => {
  expect(mayGoOut({ ...fine, labelVoid: true })).toEqual(refuse('label_void'))
  expect(mayGoOut({ ...fine, onHold: true, labelVoid: true })).toEqual(refuse('on_hold'))
  expect(mayGoOut({ ...fine, onHold: true, destinationPaused: true })).toEqual(refuse('destination_paused'))
  expect(mayGoOut({ ...fine, destinationPaused: true, disputed: true })).toEqual(refuse('order_disputed'))
  expect(mayGoOut({ ...fine, disputed: true, order: 'cancelled' })).toEqual(refuse('order_cancelled'))
})

test('what another packer has taken stops last of all', () => {
  expect(mayGoOut({ ...fine, inOtherBatch: true })).toEqual(refuse('in_other_batch'))
  expect(mayGoOut({ ...fine, inOtherBatch: true, labelVoid: true })).toEqual(refuse('label_void'))
})

test('a replacement goes out for a posted order only', () => {
  const replaced = { ...fine, isReplacement: true }
  expect(mayGoOut({ ...replaced, order: 'posted' })).toEqual(ok(true))
  expect(mayGoOut({ ...replaced, order: 'paid' })).toEqual(refuse('order_not_paid'))
  expect(mayGoOut({ ...replaced, order: 'withdrawn' })).toEqual(refuse('order_cancelled'))
})
