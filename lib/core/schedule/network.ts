import { ok, refuse, type Result } from '../result'
import { type Expression, NOTHING, stepLength } from './expression'

/** A length between two moments of a plan. */
export type Arc = { readonly from: number; readonly to: number; readonly length: Expression }

/** A plan as lengths between moments; 0 is the start. */
export type Network = { readonly arcs: readonly Arc[]; readonly finish: number }

/** A step by number, with the steps it waits for. */
export type Link = { readonly widthDays: number; readonly after: readonly number[] }

/** All steps before each step, as bit sets; 'cycle' when the steps wait for one another. */
export function stepsBefore(links: readonly Link[]): Result<bigint[], 'cycle'> {
  const before = new Array<bigint | undefined>(links.length).fill(undefined)
  for (let done = 0; done < links.length;) {
    const settled = done
    links.forEach(({ after }, i) => {
      if (before[i] !== undefined || after.some((p) => before[p] === undefined)) return
      before[i] = after.reduce((set, p) => set | (before[p] as bigint) | (1n << BigInt(p)), 0n)
      done += 1
    })
    if (done === settled) return refuse('cycle')
  }
  return ok(before as bigint[])
}

/** Drops what follows from the rest: waiting for b, which waits for a, is waiting for a too. */
function direct(after: readonly number[], before: readonly bigint[]): number[] {
  const through = after.reduce((set, p) => set | (before[p] as bigint), 0n)
  return [...new Set(after)].filter((p) => ((through >> BigInt(p)) & 1n) === 0n).sort((a, b) => a - b)
}

/**
 * Turns steps that wait for one another into lengths between moments. Steps that wait for the same set share a moment,
 * and a set that contains a smaller one is reached through the smaller one's moment, which keeps needless crossings out.
 * Domain: `before` as `stepsBefore` gives it.
 */
export function networkOf(links: readonly Link[], before: readonly bigint[]): Network {
  const arcs: Arc[] = []
  const waits = links.map(({ after }) => direct(after, before))
  const last = links.map((_, i) => i).filter((i) => before.every((set) => ((set >> BigInt(i)) & 1n) === 0n))
  const sets = new Map([...waits, last].filter((set) => set.length > 1).map((set) => [set.join(), set]))
  const moments = new Map<string, number>([['', 0]])
  links.forEach((_, i) => moments.set(String(i), i + 1))
  const made: { set: readonly number[]; moment: number }[] = []
  for (const [key, set] of [...sets].sort(([, a], [, b]) => a.length - b.length)) {
    const moment = links.length + 1 + made.length
    let rest = set
    for (const { set: smaller, moment: at } of [...made].reverse()) {
      if (!smaller.every((p) => rest.includes(p))) continue
      arcs.push({ from: at, to: moment, length: NOTHING })
      rest = rest.filter((p) => !smaller.includes(p))
    }
    for (const p of rest) arcs.push({ from: p + 1, to: moment, length: NOTHING })
    moments.set(key, moment)
    made.push({ set, moment })
  }
  links.forEach(({ widthDays }, i) => {
    const from = moments.get((waits[i] as number[]).join()) as number
    arcs.push({ from, to: i + 1, length: stepLength(i, widthDays) })
  })
  return { arcs, finish: moments.get(last.join()) as number }
}
