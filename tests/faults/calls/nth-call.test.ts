import { afterAll, describe, expect, test } from 'vitest'
import { breakCalls, callsSoFar, type Break } from '@/lib/gateways/payments/fake/break-calls'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { Order } from '@/models'
import { History } from '../histories/history'
import { newModel } from '../histories/model'
import { breakStatements, statementsSoFar } from '../support/break-database'
import { closeQueue } from '../support/queue'
import { OPERATIONS, type Operation } from './operations'

// Whatever is done with money, its first call to the database or the provider fails, then its second, its third …: once,
// and for good until somebody mends it. Afterwards everything stands as if nothing had happened.
const isLong = process.env.FAULTS === 'long'
/** Of the calls of an operation, how many are broken each way in the short version, evenly from the first to the last. */
const SHORT = 1

afterAll(async () => {
  breakCalls(null)
  breakStatements(null)
  await closeQueue()
  await closeSandboxPool()
})

async function begin({ before }: Operation): Promise<History> {
  const history = await History.begin()
  await before(history)
  return history
}

/** Does it, badly or well; how it ended is nobody's business but the books'. */
async function attempt(history: History, { act }: Operation): Promise<void> {
  await act(history).catch(() => {})
  breakCalls(null)
  breakStatements(null)
}

async function expectEnd(history: History, { again, ends }: Operation): Promise<void> {
  await again?.(history)
  await history.beQuiet(newModel())
  const orders = await Order.findAll({ where: { runId: history.world.run.id }, order: [['number', 'ASC']] })
  expect(orders.map(({ state }) => state)).toEqual(ends)
}

/** From 1 to the last, all of them or a few. */
function someOf(count: number): number[] {
  const all = Array.from({ length: count }, (_, index) => index + 1)
  if (isLong || count <= SHORT) return all
  return all.filter((n) => (n * SHORT) % count < SHORT)
}

describe.each(Object.entries(OPERATIONS))('%s', (_, operation) => {
  test('whatever statement loses its connection', async () => {
    const first = await begin(operation)
    let commits = 0
    breakStatements(({ text }) => (text.startsWith('COMMIT') && (commits += 1), null))
    await operation.act(first)
    const statements = statementsSoFar()
    breakStatements(null)
    await expectEnd(first, operation)

    for (const nth of someOf(statements)) {
      for (const isForGood of isLong ? [false, true] : [nth % 2 === 0]) {
        const history = await begin(operation)
        breakStatements(({ n }) => (n === nth || (isForGood && n > nth) ? 'before' : null))
        await attempt(history, operation)
        await expectEnd(history, operation)
      }
    }
    // What was carried out before its answer was lost: within a transaction that is the same as above, but for its end.
    for (const nth of someOf(commits)) {
      const history = await begin(operation)
      let commit = 0
      breakStatements(({ text }) => {
        if (text.startsWith('COMMIT')) commit += 1
        return commit === nth && text.startsWith('COMMIT') ? 'after' : null
      })
      await attempt(history, operation)
      await expectEnd(history, operation)
    }
  }, 3_600_000)

  test('whatever call to the provider breaks', async () => {
    const first = await begin(operation)
    breakCalls(null)
    await operation.act(first)
    const calls = callsSoFar()
    await expectEnd(first, operation)

    const ways: Break[] = ['before', 'after', 'error_500', 'error_429']
    for (const nth of someOf(calls)) {
      for (const how of isLong ? ways : [ways[nth % ways.length]!]) {
        for (const isForGood of isLong ? [false, true] : [nth % 2 === 1]) {
          const history = await begin(operation)
          breakCalls(({ n }) => (n === nth || (isForGood && n > nth) ? how : null))
          await attempt(history, operation)
          await expectEnd(history, operation)
        }
      }
    }
  }, 3_600_000)
})
