import 'server-only'
import { DatabaseError, type Transaction } from 'sequelize'
import { sequelize } from './sequelize'

const TRIES = 5
/** Serialization failure and deadlock: nothing was written, the same again may succeed. */
const WORTH_REPEATING = new Set(['40001', '40P01'])

type Refusal = { readonly ok: false; readonly reason: string }

class Refused extends Error {
  constructor(readonly refusal: Refusal) {
    super(refusal.reason)
  }
}

/**
 * Runs one change in one transaction: committed when it answers ok, rolled back when it refuses or throws.
 * Run again, up to five times in all, when the database broke off a deadlock or a serialization failure; `fn` must
 * therefore do nothing outside `tx`.
 */
export async function inTransaction<A extends { readonly ok: true } | Refusal>(
  fn: (tx: Transaction) => Promise<A>,
): Promise<A> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await sequelize.transaction(async (tx) => {
        const result = await fn(tx)
        if (!result.ok) throw new Refused(result)
        return result
      })
    } catch (error) {
      if (error instanceof Refused) return error.refusal as A
      if (attempt >= TRIES || !isWorthRepeating(error)) throw error
      await pause(attempt)
    }
  }
}

function isWorthRepeating(error: unknown): boolean {
  if (!(error instanceof DatabaseError)) return false
  return WORTH_REPEATING.has((error.parent as Error & { code?: string }).code ?? '')
}

/** Two that met once must not meet again at the same instant. */
function pause(attempt: number): Promise<void> {
  const milliseconds = Math.random() * 20 * 2 ** attempt
  return new Promise((resolve) => setTimeout(resolve, milliseconds))
}
