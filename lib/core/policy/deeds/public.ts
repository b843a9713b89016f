import type { DeedRule } from '@/lib/core/policy/audience'

/** What anybody may do, and what a signed-in person may do before belonging anywhere. */
export const PUBLIC_DEEDS = {
  'site:read': { for: ['anybody'] },
  'workshop:visit': { for: ['anybody'] },
  'module:visit': { for: ['anybody'] },
  'form:resume': { for: ['anybody'] },
  'session:start': { for: ['anybody'] },
  'session:end': { for: ['person'] },
  'session:list': { for: ['self'] },
  'mail:unsubscribe': { for: ['anybody'] },
  'mail:prefer': { for: ['self'] },
  'invitation:decline': { for: ['anybody'] },
  'membership:accept': { for: ['person'] },
  'workshop:start': { for: ['person'] },
  'second_factor:set_up': { for: ['person'] },
  'second_factor:give': { for: ['person'] },
  'sandbox:use': { for: ['anybody'] },
} as const satisfies Record<string, DeedRule>
