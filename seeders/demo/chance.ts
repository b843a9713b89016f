/** Numbers that look like chance and are the same at every making. */
export type Chance = {
  /** From 0 up to, not including, 1. */
  next: () => number
  /** A whole number from `least` to `most`. */
  whole: (least: number, most: number) => number
  pick: <T>(list: readonly T[]) => T
  /** One of the entries, each as often as its weight says. */
  weighted: <T>(entries: readonly (readonly [T, number])[]) => T
}

/** Mulberry32: 32 bits of state, enough for people who do not exist. */
export function chanceOf(seed: number): Chance {
  let state = seed >>> 0
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0
    let mixed = Math.imul(state ^ (state >>> 15), state | 1)
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296
  }
  const pick = <T>(list: readonly T[]): T => list[Math.floor(next() * list.length)]!
  return {
    next,
    pick,
    whole: (least, most) => least + Math.floor(next() * (most - least + 1)),
    weighted: (entries) => {
      let rest = next() * entries.reduce((sum, [, weight]) => sum + weight, 0)
      for (const [value, weight] of entries) {
        rest -= weight
        if (rest < 0) return value
      }
      return entries.at(-1)![0]
    },
  }
}
