import type { DeedRule } from '@/lib/core/policy/audience'

/** Test plans, units and results: the bench works here, and sees neither money nor addresses. */
export const BENCH_DEEDS = {
  'bench:read': { for: ['owner', 'bench'] },
  'test_plan:read': { for: ['owner', 'bench'] },
  'test_plan:write': { for: ['owner', 'bench'] },
  'unit:read': { for: ['owner', 'bench'] },
  'unit:start': { for: ['owner', 'bench'] },
  'unit:record': { for: ['owner', 'bench'] },
  'unit:rework': { for: ['owner', 'bench'] },
  'unit:scrap': { for: ['owner', 'bench'] },
  'unit:import': { for: ['owner', 'bench'] },
  'result:read': { for: ['owner', 'bench'] },
  'result:export': { for: ['owner', 'bench'] },
} as const satisfies Record<string, DeedRule>
