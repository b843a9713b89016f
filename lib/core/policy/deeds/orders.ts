import type { DeedRule } from '@/lib/core/policy/audience'

/** Orders, as the buyer's own and as the workshop's. What the owner does to a buyer's money asks for a fresh code. */
export const ORDER_DEEDS = {
  'order:place': { for: ['person'] },
  'order:list_own': { for: ['person'] },
  'order:read': { for: ['self', 'owner'] },
  'order:pay': { for: ['self'] },
  'order:cancel': { for: ['self'] },
  'order:withdraw': { for: ['self'] },
  'order:leave_waiting': { for: ['self'] },
  'order:change': { for: ['self'] },
  'order:choose': { for: ['self'] },
  'order:set_address': { for: ['self', 'owner'] },
  'order:list': { for: ['owner'] },
  'order:enter': { for: ['owner'] },
  'order:export': { for: ['owner'] },
  'order:cancel_for_buyer': { for: ['owner'], secondFactor: true },
  'order:reinstate': { for: ['owner'] },
  'order:offer_place': { for: ['owner'] },
  'order:hold': { for: ['owner', 'packer'] },
  'order:receive_return': { for: ['owner', 'packer'] },
  'invoice:read': { for: ['self', 'owner'] },
  'invoice:write': { for: ['owner'] },
  'document:read': { for: ['self', 'owner'] },
  'test_sheet:read': { for: ['self', 'owner', 'bench'] },
} as const satisfies Record<string, DeedRule>
