import type { DeedRule } from '@/lib/core/policy/audience'

/** The pack queue, papers, parcels, customs data and tracking: the packer works here, and sees declared values only. */
export const PACKING_DEEDS = {
  'packing:read': { for: ['owner', 'packer'] },
  'batch:take': { for: ['owner', 'packer'] },
  'batch:assign': { for: ['owner', 'packer'] },
  'paper:print': { for: ['owner', 'packer'] },
  'parcel:read': { for: ['owner', 'packer'] },
  'parcel:open': { for: ['owner', 'packer'] },
  'parcel:hold': { for: ['owner', 'packer'] },
  'parcel:split': { for: ['owner', 'packer'] },
  'parcel:pack': { for: ['owner', 'packer'] },
  'parcel:reopen': { for: ['owner', 'packer'] },
  'parcel:discard': { for: ['owner', 'packer'] },
  'parcel:hand_over': { for: ['owner', 'packer'] },
  'parcel:track': { for: ['owner', 'packer'] },
  'parcel:report': { for: ['owner', 'packer'] },
  'tracking:import': { for: ['owner', 'packer'] },
  'customs:read': { for: ['owner', 'packer'] },
  'customs:write': { for: ['owner', 'packer'] },
  'post:export': { for: ['owner', 'packer'] },
  'postage:write': { for: ['owner'] },
  'unit:allocate': { for: ['owner', 'packer'] },
} as const satisfies Record<string, DeedRule>
