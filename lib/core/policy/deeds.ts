import type { DeedRule } from '@/lib/core/policy/audience'
import { ACCOUNT_DEEDS } from '@/lib/core/policy/deeds/account'
import { BENCH_DEEDS } from '@/lib/core/policy/deeds/bench'
import { MODULE_DEEDS } from '@/lib/core/policy/deeds/modules'
import { MONEY_DEEDS } from '@/lib/core/policy/deeds/money'
import { ORDER_DEEDS } from '@/lib/core/policy/deeds/orders'
import { PACKING_DEEDS } from '@/lib/core/policy/deeds/packing'
import { PROBLEM_DEEDS } from '@/lib/core/policy/deeds/problems'
import { PUBLIC_DEEDS } from '@/lib/core/policy/deeds/public'
import { RUN_DEEDS } from '@/lib/core/policy/deeds/runs'
import { SIGNUP_DEEDS } from '@/lib/core/policy/deeds/signups'
import { WORKSHOP_DEEDS } from '@/lib/core/policy/deeds/workshops'

const TABLE = {
  ...PUBLIC_DEEDS,
  ...ACCOUNT_DEEDS,
  ...WORKSHOP_DEEDS,
  ...MODULE_DEEDS,
  ...RUN_DEEDS,
  ...SIGNUP_DEEDS,
  ...ORDER_DEEDS,
  ...MONEY_DEEDS,
  ...BENCH_DEEDS,
  ...PACKING_DEEDS,
  ...PROBLEM_DEEDS,
}

/** Everything that can be done, as `noun:verb`. */
export type Deed = keyof typeof TABLE

/**
 * The rule of each deed. A deed that is not here does not exist; a new one is added to the file of its domain and to the
 * hand-written table of tests/core/policy.
 */
export const DEED_RULES: Readonly<Record<Deed, DeedRule>> = TABLE

/**
 * Every deed there is, in the order of the domains.
 * @example DEEDS.includes('run:lock')  // → true
 */
export const DEEDS: readonly Deed[] = Object.keys(TABLE) as Deed[]

/**
 * Whether a text names a deed.
 * @example isDeed('run:paint')  // → false
 */
export function isDeed(text: string): text is Deed {
  return Object.hasOwn(TABLE, text)
}
