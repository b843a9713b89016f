import fc from 'fast-check'
import type { OrderState } from '@/lib/core/states/order'
import { afterAll, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { closeQueue } from '../support/queue'
import { COMMANDS, OPENINGS } from './commands'
import { History } from './history'
import { newModel } from './model'

// Random histories of one run: whatever people, provider and machine do, and in whatever order news arrive, no money is
// lost or counted twice. A seed is a history: FAULT_SEED=n runs that one alone, FAULT_SEEDS=n as many as asked for.
const isLong = process.env.FAULTS === 'long'
const only = process.env.FAULT_SEED
const count = only ? 1 : Number(process.env.FAULT_SEEDS ?? (isLong ? 500 : 50))
const first = only ? Number(only) : 1
const MOST_COMMANDS = 60
const MOST_SHOWN = 5
/** From so many histories on, every state is reached by some. */
const MANY = 200
/** In how many histories an order was seen in a state when all was quiet. */
const seen: Partial<Record<OrderState, number>> = {}

const WHERE_ORDERS_GET: OrderState[] = [
  ...(['awaiting_deposit', 'waiting', 'reserved', 'expired', 'cancelled'] as const),
  ...(['balance_due', 'paid', 'lapsed'] as const),
]

afterAll(async () => {
  await closeQueue()
  await closeSandboxPool()
})

async function liveThrough(seed: number): Promise<{ steps: number; failure: string | null }> {
  let steps = 0
  const histories = fc.commands(COMMANDS, { maxCommands: MOST_COMMANDS, size: 'max' })
  const property = fc.asyncProperty(OPENINGS, histories, async (opening, commands) => {
    const [history, told] = [await History.begin(), newModel()]
    for (const command of opening) await command.run(told, history)
    await fc.asyncModelRun(() => ({ model: told, real: history }), commands)
    await history.beQuiet(told)
    steps += opening.length + [...commands].length
    for (const state of history.seen) seen[state] = (seen[state] ?? 0) + 1
  })
  const details = await fc.check(property, { seed, numRuns: 1, endOnFailure: true })
  const happened = details.counterexample && [...details.counterexample[0], ...details.counterexample[1]]
  const failure = happened
    ? `FAULT_SEED=${seed}: ${String(details.errorInstance)}\n  ${happened.join('\n  ')}`
    : null
  return { steps, failure }
}

test(
  `${count} histories of up to ${MOST_COMMANDS} steps from seed ${first} on`,
  async () => {
    const began = performance.now()
    const failed: string[] = []
    let steps = 0
    for (let seed = first; seed < first + count; seed += 1) {
      const lived = await liveThrough(seed)
      steps += lived.steps
      if (lived.failure !== null) failed.push(lived.failure)
    }
    const seconds = Math.round((performance.now() - began) / 1000)
    console.warn(`${count} histories, ${steps} steps, ${seconds} s; orders seen ${JSON.stringify(seen)}`)
    expect(failed.slice(0, MOST_SHOWN).join('\n\n'), `${failed.length} of ${count} failed`).toBe('')
    // Histories in which nothing gets anywhere would prove nothing.
    if (count >= MANY) expect(Object.keys(seen).sort()).toEqual([...WHERE_ORDERS_GET].sort())
  },
  20 * 60_000,
)
