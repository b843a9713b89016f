import 'server-only'
import { ok, refuse, type Result } from '@/lib/core/result'
import { payments } from '@/lib/gateways/payments'

/** A page does not wait longer than this for a figure it can do without. */
const TIME_LIMIT_MS = 2500

/**
 * What lies on a workshop's account at the payment provider in its currency, in minor units: what may be paid out, and
 * what is on its way there, since a refund may use both. Outside any transaction, with a time limit of 2.5 s.
 * Refuses: provider_unreachable (nothing is known then).
 */
export async function balanceAtProvider(
  account: string | null,
  currency: string,
): Promise<Result<number, 'provider_unreachable'>> {
  if (account === null) return refuse('provider_unreachable')
  let timer: NodeJS.Timeout | undefined
  const late = new Promise<null>((resolve) => {
    timer = setTimeout(() => resolve(null), TIME_LIMIT_MS)
  })
  const found = await Promise.race([payments().balance({ account }), late])
  clearTimeout(timer)
  if (found === null || !found.ok) return refuse('provider_unreachable')
  const sums = [...found.value.available, ...found.value.pending]
  return ok(sums.filter((sum) => sum.currency === currency).reduce((total, { amount }) => total + amount, 0))
}
