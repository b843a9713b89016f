import type { DeedRule } from '@/lib/core/policy/audience'

/** What a person may do with their own account and data. */
export const ACCOUNT_DEEDS = {
  'account:read': { for: ['person'] },
  'account:write': { for: ['self'] },
  'account:export': { for: ['self'] },
  'account:erase': { for: ['self'] },
} as const satisfies Record<string, DeedRule>
