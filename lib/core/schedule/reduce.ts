import { type Expression, parallel, series, sharedLength } from './expression'
import type { Arc, Network } from './network'

/** A finish worked out as far as it goes: shared lengths to be given one after the other, and the finish given them. */
export type Solved = { readonly shared: readonly Expression[]; readonly finish: Expression }

/** How many lengths may be taken as given; the work multiplies with each. */
const MOST_SHARED = 2

/** Arcs between the same two moments become one. */
function merged(arcs: readonly Arc[]): Arc[] {
  const between = new Map<string, Arc>()
  for (const arc of arcs) {
    const key = `${arc.from}-${arc.to}`
    const other = between.get(key)
    between.set(key, other ? { ...arc, length: parallel(other.length, arc.length) } : arc)
  }
  return [...between.values()]
}

/** Leads every way through a moment past it, joining what comes in to what goes out. */
function without(arcs: readonly Arc[], moment: number): Arc[] {
  const into = arcs.filter(({ to }) => to === moment)
  const out = arcs.filter(({ from }) => from === moment)
  const past = into.flatMap((a) =>
    out.map((b) => ({ from: a.from, to: b.to, length: series(a.length, b.length) })),
  )
  return merged([...arcs.filter(({ from, to }) => from !== moment && to !== moment), ...past])
}

function momentsOf({ arcs, finish }: Network): number[] {
  return [...new Set(arcs.map(({ to }) => to))].filter((moment) => moment !== finish)
}

/** The only arc into, or the only one out of, a moment; these can be taken out when they are a single day. */
function singles(arcs: readonly Arc[], moment: number): { into: Arc | undefined; out: Arc | undefined } {
  const into = arcs.filter(({ to }) => to === moment)
  const out = arcs.filter(({ from }) => from === moment)
  return { into: into.length === 1 ? into[0] : undefined, out: out.length === 1 ? out[0] : undefined }
}

/**
 * Shortens a network by series and parallel lengths until nothing is left to shorten. A moment with one way in that is a
 * single day (or one way out) goes too, since a certain day may be counted on several ways.
 * Source: J. Valdes, R. Tarjan, E. Lawler, *SIAM J. Computing* 11 (1982) 298.
 */
export function reduced(network: Network): Network {
  let arcs = merged(network.arcs)
  for (;;) {
    const gone = momentsOf({ arcs, finish: network.finish }).find((moment) => {
      const { into, out } = singles(arcs, moment)
      return (into && out) || into?.length.point || out?.length.point
    })
    if (gone === undefined) return { arcs, finish: network.finish }
    arcs = without(arcs, gone)
  }
}

/** Networks with one length more taken as given, which opens a moment to `reduced`. */
function openings({ arcs, finish }: Network, shared: number): { given: Expression; network: Network }[] {
  const single = momentsOf({ arcs, finish }).flatMap((moment) => {
    const { into, out } = singles(arcs, moment)
    return [into, out].filter((arc) => arc !== undefined)
  })
  return [...new Set(single)].map((arc) => ({
    given: arc.length,
    network: {
      finish,
      arcs: arcs.map((each) => (each === arc ? { ...arc, length: sharedLength(shared) } : each)),
    },
  }))
}

/** How many days' width the shared lengths multiply to: the work of going through them. */
function workOf({ shared }: Solved): number {
  return shared.reduce((product, { widthDays }) => product * (1 + widthDays), 1)
}

/**
 * The finish as an expression, with up to two shared lengths taken as given; undefined where that is not enough.
 * Among several ways the one with the least work.
 * Source: conditioning on common arcs, as J. Burt, M. Garman, *Management Science* 18 (1971) 207.
 */
export function solved(network: Network, shared: readonly Expression[] = []): Solved | undefined {
  const { arcs, finish } = reduced(network)
  if (arcs.length === 1) return { shared, finish: (arcs[0] as Arc).length }
  if (shared.length === MOST_SHARED) return undefined
  const next = openings({ arcs, finish }, shared.length)
  let best: Solved | undefined
  for (const { given, network: opened } of next) {
    const found = solved(opened, [...shared, given])
    if (!found) continue
    const better = !best || found.shared.length < best.shared.length
    if (better || (found.shared.length === best?.shared.length && workOf(found) < workOf(best))) best = found
  }
  return best
}
