import type { DeedRule } from '@/lib/core/policy/audience'

/** Balances, refunds, disputes, payouts, the ledger and the tax report. */
export const MONEY_DEEDS = {
  'money:read': { for: ['owner'] },
  'balance:charge': { for: ['owner'], secondFactor: true },
  'balance:remind': { for: ['owner'] },
  'refund:read': { for: ['owner'] },
  'refund:send': { for: ['owner'], secondFactor: true },
  'refund:retry': { for: ['owner'], secondFactor: true },
  'attempt:look_up': { for: ['owner'] },
  'dispute:read': { for: ['owner'] },
  'dispute:answer': { for: ['owner'] },
  'payout:send': { for: ['owner'], secondFactor: true },
  'ledger:read': { for: ['owner'] },
  'ledger:export': { for: ['owner'] },
  'ledger:reconcile': { for: ['owner'] },
  'tax:report': { for: ['owner'] },
} as const satisfies Record<string, DeedRule>
