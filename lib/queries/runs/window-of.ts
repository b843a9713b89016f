import 'server-only'
import type { Run } from '@/models'
import type { RunFacts } from './run-facts'

const DAY_MS = 86_400_000

type Opened = Pick<Run, 'openedAt' | 'opensToAllAt' | 'decideByAt'>

/** The part of the time deposits may be placed in that is gone at an instant: 0 before the opening, 1 from decide-by on. */
export function partOfWindow({ openedAt, decideByAt }: Opened, at: Date): number {
  if (openedAt === null || at <= openedAt) return 0
  const length = decideByAt.getTime() - openedAt.getTime()
  return length <= 0 ? 1 : Math.min(1, (at.getTime() - openedAt.getTime()) / length)
}

/** A run's window as it stands now. A draft's has not begun. */
export function windowOf(run: Opened, now: Date): RunFacts['window'] {
  const { openedAt, opensToAllAt, decideByAt } = run
  return {
    days: openedAt === null ? 0 : Math.max(0, (decideByAt.getTime() - openedAt.getTime()) / DAY_MS),
    gone: partOfWindow(run, now),
    opensToAll: opensToAllAt === null ? 0 : partOfWindow(run, opensToAllAt),
  }
}

/** Days since everyone may order, as long as anybody may. */
export function daysOpenToAll({ opensToAllAt, decideByAt }: Opened, now: Date): number {
  if (opensToAllAt === null) return 0
  const until = Math.min(now.getTime(), decideByAt.getTime())
  return Math.max(0, (until - opensToAllAt.getTime()) / DAY_MS)
}
