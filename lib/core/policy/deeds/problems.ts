import type { DeedRule } from '@/lib/core/policy/audience'

/** Problems after posting: reported and read by the buyer, answered by the owner. Paying back is a refund of its own. */
export const PROBLEM_DEEDS = {
  'problem:open': { for: ['self', 'owner'] },
  'problem:read': { for: ['self', 'owner'] },
  'problem:reply': { for: ['self', 'owner'] },
  'problem:reopen': { for: ['self', 'owner'] },
  'problem:list': { for: ['owner'] },
  'problem:answer': { for: ['owner'] },
  'problem:close': { for: ['self', 'owner'] },
} as const satisfies Record<string, DeedRule>
