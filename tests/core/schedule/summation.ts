import { pertShape } from '@/lib/core/schedule/pert'
import type { ScheduleStep } from '@/lib/core/schedule/finish'
import { regularizedBeta } from '@/lib/core/stats/beta'

/** Makes a step in one line. */
export const step = (id: string, o: number, m: number, p: number, ...after: string[]): ScheduleStep => ({
  id,
  optimistic: o,
  likely: m,
  pessimistic: p,
  after,
})

/** A step's length as midpoints of fine cells with their mass, by the distribution function. */
export function fine(
  { optimistic: o, likely, pessimistic: p }: ScheduleStep,
  cells: number,
): { day: number; chance: number }[] {
  if (o === p) return [{ day: o, chance: 1 }]
  const { alpha, beta } = pertShape(o, likely, p)
  const upTo = (i: number) => regularizedBeta(i / cells, alpha, beta)
  return Array.from({ length: cells }, (_, i) => ({
    day: o + ((i + 0.5) * (p - o)) / cells,
    chance: upTo(i + 1) - upTo(i),
  }))
}

/** The chance that a step takes at most `days`. */
export function within({ optimistic: o, likely, pessimistic: p }: ScheduleStep, days: number): number {
  if (days >= p) return 1
  if (days <= o) return 0
  const { alpha, beta } = pertShape(o, likely, p)
  return regularizedBeta((days - o) / (p - o), alpha, beta)
}

/** A small generator of even numbers in (0, 1), the same every time. */
export function evenNumbers(seed: number): () => number {
  let state = seed
  return () => {
    state = (state * 1664525 + 1013904223) % 4294967296
    return (state + 0.5) / 4294967296
  }
}

/** Simulated finishes of a plan whose steps stand in order, sorted; lengths by a table of their quantiles. */
export function simulate(
  steps: readonly ScheduleStep[],
  times: number,
): { days: number[]; critical: Record<string, number> } {
  const next = evenNumbers(7)
  const tables = steps.map((each) => {
    const cells = fine(each, 400)
    let sum = 0
    const upTo = cells.map(({ chance }) => (sum += chance))
    return { cells, upTo }
  })
  const places = new Map(steps.map(({ id }, i) => [id, i]))
  const critical = new Map(steps.map(({ id }) => [id, 0]))
  const days = Array.from({ length: times }, () => {
    const ends: number[] = []
    const last: number[] = []
    steps.forEach(({ after }, i) => {
      const before = after.map((id) => places.get(id)!).sort((a, b) => ends[b]! - ends[a]!)[0] ?? -1
      const { cells, upTo } = tables[i]!
      const at = next()
      let low = 0
      let high = cells.length - 1
      while (low < high) {
        const middle = (low + high) >> 1
        if (upTo[middle]! >= at) high = middle
        else low = middle + 1
      }
      ends.push((ends[before] ?? 0) + cells[low]!.day)
      last.push(before)
    })
    const day = Math.max(...ends)
    for (let i = ends.indexOf(day); i >= 0; i = last[i]!)
      critical.set(steps[i]!.id, critical.get(steps[i]!.id)! + 1)
    return day
  })
  return {
    days: days.sort((a, b) => a - b),
    critical: Object.fromEntries([...critical].map(([id, count]) => [id, count / times])),
  }
}
