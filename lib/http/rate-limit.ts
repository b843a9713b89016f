import { RateLimiterMemory } from 'rate-limiter-flexible'

/**
 * Tries per window and key, on real time, per web process. A person on one address never notices them; a script does.
 * Mail-sending deeds are further limited per address by their services.
 */
const LIMITS = {
  read: new RateLimiterMemory({ points: 6000, duration: 60 }),
  change: new RateLimiterMemory({ points: 3000, duration: 60 }),
  sign_in: new RateLimiterMemory({ points: 300, duration: 60 }),
  code: new RateLimiterMemory({ points: 10, duration: 60 }),
} as const

export type LimitName = keyof typeof LIMITS

/** Seconds to wait, or 0 when the request may go on. */
export async function waitFor(name: LimitName, key: string): Promise<number> {
  try {
    await LIMITS[name].consume(key)
    return 0
  } catch (over) {
    const left = (over as { msBeforeNext?: number }).msBeforeNext
    if (left === undefined) throw over
    return Math.max(1, Math.ceil(left / 1000))
  }
}
