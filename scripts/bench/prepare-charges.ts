import { inTransaction } from '@/lib/db/in-transaction'
import { sequelize } from '@/lib/db/sequelize'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { enqueue } from '@/lib/jobs/enqueue'
import { ok } from '@/lib/core/result'
import { settleAttempt } from '@/lib/services/payments/settle-attempt'
import { askBalances } from '@/lib/services/runs/ask-balances'
import { runBulk } from '@/lib/tasks/run-bulk'
import { PaymentAttempt } from '@/models'
import { businessTime, minutesLater, setBusinessTime } from '@/tests/support/business-time'
import { moneyWorld, pay, placed } from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'

// A locked run whose balances were announced a week ago, and the job that finds their day has come.
const orders = Number(process.argv[2])
const WEEK_MINUTES = 7 * 1440 + 10
const world = await moneyWorld({ minimum: 2, maximum: orders + 10 })
for (let nth = 0; nth < orders; nth += 1) {
  const { order, payUrl } = await placed(world.run, {}, await businessTime())
  await pay(payUrl)
  const attempt = await PaymentAttempt.findOne({ where: { orderId: order.id }, rejectOnEmpty: true })
  await settleAttempt({ attemptId: attempt.id, now: await businessTime() })
}
const now = await businessTime()
await world.run.update({ state: 'locked', lockedAt: now })
const about = { actor: await actorOf(world.owner), workshopId: world.workshop.id, runId: world.run.id }
const asked = await askBalances({ ...about, now })
if (!asked.ok) throw new Error(JSON.stringify(asked))
await runBulk({ bulkId: asked.value.bulk }, { jobId: '0', attempt: 1, maxAttempts: 1 })
// Only the charging is measured: what placing and paying promised is not done beside it.
await sequelize.query('delete from graphile_worker._private_jobs')
await sequelize.query(`delete from due_items where kind <> 'balance_charge'`)
await setBusinessTime(minutesLater(now, WEEK_MINUTES))
await inTransaction(async (tx) => {
  await enqueue(tx, 'due', {}, { key: 'due', queue: 'due', maxAttempts: 1 })
  return ok({})
})
await closeSandboxPool()
await sequelize.close()
