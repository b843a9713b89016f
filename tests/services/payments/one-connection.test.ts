import { afterAll, beforeAll, expect, test } from 'vitest'
import { sequelize } from '@/lib/db/sequelize'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { cancelOrder } from '@/lib/services/orders/cancel-order'
import { expireHold } from '@/lib/services/orders/expire-hold'
import { setAddress } from '@/lib/services/orders/set-address'
import { chargeBalance } from '@/lib/services/payments/charge-balance'
import { payOrder } from '@/lib/services/payments/pay-order'
import { Run } from '@/models'
import { minutesLater, setBusinessTime } from '@/tests/support/business-time'
import { NOW } from '@/tests/support/worlds/base'
import { moneyWorld, orderInput, placed, reserved } from '@/tests/support/worlds/money'

type Manager = {
  config: { pool: { max: number; acquire: number } }
  pool: { maxSize: number }
  initPools: () => void
}

// With one connection a statement that forgot its transaction waits for the connection its own transaction holds.
beforeAll(() => {
  const manager = sequelize.connectionManager as unknown as Manager
  Object.assign(manager.config.pool, { max: 1, acquire: 5_000 })
  manager.initPools()
  expect(manager.pool.maxSize).toBe(1)
})
afterAll(closeSandboxPool)

test('every service of orders and money gets by with one connection', async () => {
  const world = await moneyWorld()
  const kept = await reserved(world.run)
  const moved = { ...orderInput(world.run).address, lines: ['Am Kai 9'] }
  expect((await setAddress({ actor: kept.actor, orderId: kept.order.id, address: moved, now: NOW })).ok).toBe(
    true,
  )
  const open = await placed(world.run)
  expect((await payOrder({ actor: open.actor, orderId: open.order.id, now: NOW })).ok).toBe(true)
  const gone = await reserved(world.run)
  expect((await cancelOrder({ actor: gone.actor, orderId: gone.order.id, now: NOW })).ok).toBe(true)
  const later = minutesLater(NOW, 40)
  await setBusinessTime(later)
  expect(await expireHold({ orderId: open.order.id, now: later })).toMatchObject({
    value: { state: 'expired' },
  })
  await Run.update({ state: 'locked', lockedAt: NOW }, { where: { id: world.run.id } })
  await kept.order.update({ state: 'balance_due', balanceAskedAt: NOW, balanceChargeAt: NOW })
  expect(await chargeBalance({ orderId: kept.order.id, now: later })).toMatchObject({
    value: { outcome: 'captured' },
  })
})
