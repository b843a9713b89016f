import type { DeedRule } from '@/lib/core/policy/audience'

/** Sign-ups. Confirming and taking back work by a token from a mail, so they need no session. */
export const SIGNUP_DEEDS = {
  'signup:submit': { for: ['anybody'] },
  'signup:confirm': { for: ['anybody'] },
  'signup:take_back': { for: ['anybody'] },
  'signup:read': { for: ['self'] },
  'signup:change': { for: ['self'] },
  'signup:list': { for: ['owner'] },
} as const satisfies Record<string, DeedRule>
