import { arrivals } from '@/lib/core/demand/arrivals'
import { STARTING_CONVERSION } from '@/lib/core/demand/conversion'
import { runForecast } from '@/lib/core/demand/run-forecast'

/** Numbers from 0 to 1, the same for the same seed (mulberry32, public domain). */
export function chanceFrom(seed: number): () => number {
  let state = seed >>> 0
  return () => {
    state = (state + 0x6d2b79f5) >>> 0
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296
  }
}

type Chance = () => number
const normal = (chance: Chance) => Math.sqrt(-2 * Math.log(1 - chance())) * Math.cos(2 * Math.PI * chance())

/** Marsaglia and Tsang, ACM TOMS 26 (2000) 363; below shape 1 by the usual power of a uniform. */
function gamma(shape: number, chance: Chance): number {
  if (shape < 1) return gamma(shape + 1, chance) * (1 - chance()) ** (1 / shape)
  const d = shape - 1 / 3
  for (;;) {
    const x = normal(chance)
    const v = (1 + x / Math.sqrt(9 * d)) ** 3
    if (v > 0 && Math.log(1 - chance()) < x ** 2 / 2 + d - d * v + d * Math.log(v)) return d * v
  }
}

function beta(a: number, b: number, chance: Chance): number {
  const x = gamma(a, chance)
  return x / (x + gamma(b, chance))
}

function poisson(mean: number, chance: Chance): number {
  let count = 0
  for (let product = 1 - chance(); product > Math.exp(-mean); count += 1) product *= 1 - chance()
  return count
}

/** How the world of a simulated run differs from what the forecast believes. */
export type World = {
  /** Conversions are drawn around so much of what is believed. */
  sincerity?: number
  /** Standard deviation, in log-odds, of a shock all classes share. */
  shock?: number
  /** When somebody who converts does so, as a part of the window. */
  answersAt?: (chance: Chance) => number
}

const CURVE = arrivals([])
const CLASSES = ['certain', 'likely', 'curious', 'oldSignUp'] as const
const SIZES = { certain: 90, likely: 120, curious: 80, oldSignUp: 60 }

/** A part of the window drawn from the starting curve, by halving. */
function byTheCurve(chance: Chance): number {
  const wanted = chance()
  let [low, high] = [0, 1]
  for (let i = 0; i < 30; i += 1) {
    const middle = (low + high) / 2
    if (CURVE.shareBy(middle) < wanted) low = middle
    else high = middle
  }
  return high
}

/**
 * Draws a run as the world makes it, looks at it at a part of its window as an owner would, and says whether what came in
 * the end lay within the forecast's 80 % range.
 */
export function isWithinRange(seed: number, lookAt: number, world: World = {}): boolean {
  const chance = chanceFrom(seed)
  const { sincerity = 1, shock = 0, answersAt = byTheCurve } = world
  const shared = shock * normal(chance)
  let [committed, later] = [0, 0]
  const listed = CLASSES.map((name) => {
    const { alpha, beta: b } = STARTING_CONVERSION[name]
    const drawn = beta(alpha * sincerity, alpha + b - alpha * sincerity, chance)
    const p = 1 / (1 + ((1 - drawn) / drawn) * Math.exp(-shared))
    const people = { name, alpha, beta: b, ordered: 0, declined: 0 }
    const silent: { quantity: number; arrivedShare: number }[] = []
    for (let i = 0; i < SIZES[name]; i += 1) {
      const quantity = chance() < 0.8 ? 1 : chance() < 0.7 ? 2 : 5
      const converts = chance() < p
      const at = converts ? answersAt(chance) : 1
      if (converts && at <= lookAt) {
        committed += quantity
        people.ordered += 1
        continue
      }
      if (converts) later += quantity
      silent.push({ quantity, arrivedShare: CURVE.shareBy(lookAt) })
    }
    return { ...people, silent }
  })
  const seen = Math.floor(chance() * 12)
  const [watched, left] = [12, 9]
  const rate = gamma(seen + 0.5, chance) / watched
  const newcomers = { rate: { seen, days: watched }, daysLeft: left, quantities: [1, 1, 2] }
  for (let i = poisson(rate * left, chance); i > 0; i -= 1) later += chance() < 1 / 3 ? 2 : 1
  const { forecast } = runForecast({ committed, listed, newcomers })
  const end = committed + later
  return forecast.quantile(0.1) <= end && end <= forecast.quantile(0.9)
}
