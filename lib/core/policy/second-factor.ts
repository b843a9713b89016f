import type { Actor } from '@/lib/core/policy/can'
import { DEED_RULES, type Deed } from '@/lib/core/policy/deeds'

/**
 * For how long a second factor counts as fresh, in milliseconds: 15 minutes.
 * Source: own rule: long enough for one sitting with the check-answers page, short enough for an unlocked screen.
 */
export const SECOND_FACTOR_FRESH_MS = 15 * 60 * 1000

/**
 * Whether a deed moves money in bulk or for good, so that a code must have been given just now.
 * @example needsSecondFactor('run:lock')  // → true
 * @example needsSecondFactor('run:read')  // → false
 */
export function needsSecondFactor(deed: Deed): boolean {
  return DEED_RULES[deed].secondFactor === true
}

/**
 * Whether the actor gave a second factor within the last 15 minutes, the limit included. A visitor never did,
 * and a factor from the future (a clock set back) does not count.
 * @example secondFactorFresh({ kind: 'visitor' }, new Date('2026-03-02T09:00:00Z'))  // → false
 */
export function secondFactorFresh(actor: Actor, now: Date): boolean {
  if (actor.kind === 'visitor' || actor.secondFactorAt === null) return false
  const age = now.getTime() - actor.secondFactorAt.getTime()
  return age >= 0 && age <= SECOND_FACTOR_FRESH_MS
}
