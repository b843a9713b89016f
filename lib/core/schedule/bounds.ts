import { certain, type Duration, inParallel, inSeries, soonestOfBoth } from './duration'
import type { Evaluator } from './evaluate'
import type { Network } from './network'

/**
 * The soonest and the latest a network can finish when its crossings are too many to be worked out. At every meeting of
 * ways the truth lies between ways that hang together as far as can be (the smaller chance) and ways that have nothing
 * to do with one another (the product): lengths that are shared make ways agree, never disagree.
 * Domain: `network` as `reduced` leaves it, without shared lengths.
 * Source: G. Kleindorfer, *Operations Research* 19 (1971) 1586.
 */
export function boundsOf(
  { arcs, finish }: Network,
  evaluate: Evaluator,
): { soonest: Duration; latest: Duration } {
  const reached = new Map([[0, { soonest: certain(0), latest: certain(0) }]])
  const reach = (moment: number): { soonest: Duration; latest: Duration } => {
    const known = reached.get(moment)
    if (known) return known
    const ways = arcs
      .filter(({ to }) => to === moment)
      .map(({ from, length }) => {
        const start = reach(from)
        const own = evaluate.of(length)
        return { soonest: inSeries(start.soonest, own), latest: inSeries(start.latest, own) }
      })
    const met = ways.reduce((a, b) => ({
      soonest: soonestOfBoth(a.soonest, b.soonest),
      latest: inParallel(a.latest, b.latest),
    }))
    reached.set(moment, met)
    return met
  }
  return reach(finish)
}
