import type { DeedRule } from '@/lib/core/policy/audience'

/** The workshop itself: its desk, settings, staff, terms, taxes; and what the host may do with it. */
export const WORKSHOP_DEEDS = {
  'workshop:read': { for: ['owner'] },
  'workshop:write': { for: ['owner'] },
  'workshop:export': { for: ['owner'] },
  'settings:read': { for: ['owner'] },
  'settings:write': { for: ['owner'] },
  'terms:write': { for: ['owner'] },
  'tax:write': { for: ['owner'] },
  'destination:write': { for: ['owner'] },
  'member:list': { for: ['owner'] },
  'member:invite': { for: ['owner'] },
  'member:remove': { for: ['owner'] },
  'payment_account:read': { for: ['owner'] },
  'payment_account:connect': { for: ['owner'], secondFactor: true },
  'digest:read': { for: ['owner'] },
  'audit:read': { for: ['owner'] },
  'host:read': { for: ['host'] },
  'workshop:list': { for: ['host'] },
  'workshop:open': { for: ['host'] },
  'workshop:suspend': { for: ['host'] },
  'workshop:reopen': { for: ['host'] },
  'complaint:read': { for: ['host'] },
  'totals:read': { for: ['host'] },
} as const satisfies Record<string, DeedRule>
