/** An acceptance number, or an arrow to the first plan below or above, with its own sample size. */
type Cell = number | 'down' | 'up'

type Level = 'S-1' | 'S-2' | 'S-3' | 'S-4' | 'I' | 'II' | 'III'

type Tables = {
  /** The columns of `accept`: acceptable quality levels in defectives per hundred. */
  readonly aqlPercents: readonly number[]
  readonly codeLetters: readonly {
    readonly from: number
    readonly to: number | null
    readonly letters: Readonly<Record<Level, string>>
  }[]
  readonly plans: readonly {
    readonly letter: string
    readonly sample: number
    readonly accept: readonly Cell[]
  }[]
}

/**
 * Sampling by attributes: lot sizes to code letters, and single sampling plans for normal inspection.
 * Reject = accept + 1. Letters A to L at AQL 0.65 to 6.5 were confirmed cell by cell from two sources; the other
 * cells follow the table's own diagonal rule (0, up, down, 1, 2, 3, 5, 7, 10, 14, 21), from memory.
 * Source: MIL-STD-105E (1989), tables I and II-A; public domain.
 */
export const SAMPLING_105E: Tables = {
  aqlPercents: [0.1, 0.15, 0.25, 0.4, 0.65, 1, 1.5, 2.5, 4, 6.5],
  codeLetters: [
    {
      from: 2,
      to: 8,
      letters: { 'S-1': 'A', 'S-2': 'A', 'S-3': 'A', 'S-4': 'A', I: 'A', II: 'A', III: 'B' },
    },
    {
      from: 9,
      to: 15,
      letters: { 'S-1': 'A', 'S-2': 'A', 'S-3': 'A', 'S-4': 'A', I: 'A', II: 'B', III: 'C' },
    },
    {
      from: 16,
      to: 25,
      letters: { 'S-1': 'A', 'S-2': 'A', 'S-3': 'B', 'S-4': 'B', I: 'B', II: 'C', III: 'D' },
    },
    {
      from: 26,
      to: 50,
      letters: { 'S-1': 'A', 'S-2': 'B', 'S-3': 'B', 'S-4': 'C', I: 'C', II: 'D', III: 'E' },
    },
    {
      from: 51,
      to: 90,
      letters: { 'S-1': 'B', 'S-2': 'B', 'S-3': 'C', 'S-4': 'C', I: 'C', II: 'E', III: 'F' },
    },
    {
      from: 91,
      to: 150,
      letters: { 'S-1': 'B', 'S-2': 'B', 'S-3': 'C', 'S-4': 'D', I: 'D', II: 'F', III: 'G' },
    },
    {
      from: 151,
      to: 280,
      letters: { 'S-1': 'B', 'S-2': 'C', 'S-3': 'D', 'S-4': 'E', I: 'E', II: 'G', III: 'H' },
    },
    {
      from: 281,
      to: 500,
      letters: { 'S-1': 'B', 'S-2': 'C', 'S-3': 'D', 'S-4': 'E', I: 'F', II: 'H', III: 'J' },
    },
    {
      from: 501,
      to: 1200,
      letters: { 'S-1': 'C', 'S-2': 'C', 'S-3': 'E', 'S-4': 'F', I: 'G', II: 'J', III: 'K' },
    },
    {
      from: 1201,
      to: 3200,
      letters: { 'S-1': 'C', 'S-2': 'D', 'S-3': 'E', 'S-4': 'G', I: 'H', II: 'K', III: 'L' },
    },
    {
      from: 3201,
      to: 10000,
      letters: { 'S-1': 'C', 'S-2': 'D', 'S-3': 'F', 'S-4': 'G', I: 'J', II: 'L', III: 'M' },
    },
    {
      from: 10001,
      to: 35000,
      letters: { 'S-1': 'C', 'S-2': 'D', 'S-3': 'F', 'S-4': 'H', I: 'K', II: 'M', III: 'N' },
    },
    {
      from: 35001,
      to: 150000,
      letters: { 'S-1': 'D', 'S-2': 'E', 'S-3': 'G', 'S-4': 'J', I: 'L', II: 'N', III: 'P' },
    },
    {
      from: 150001,
      to: 500000,
      letters: { 'S-1': 'D', 'S-2': 'E', 'S-3': 'G', 'S-4': 'J', I: 'M', II: 'P', III: 'Q' },
    },
    {
      from: 500001,
      to: null,
      letters: { 'S-1': 'D', 'S-2': 'E', 'S-3': 'H', 'S-4': 'K', I: 'N', II: 'Q', III: 'R' },
    },
  ],
  plans: [
    {
      letter: 'A',
      sample: 2,
      accept: ['down', 'down', 'down', 'down', 'down', 'down', 'down', 'down', 'down', 0],
    },
    {
      letter: 'B',
      sample: 3,
      accept: ['down', 'down', 'down', 'down', 'down', 'down', 'down', 'down', 0, 'up'],
    },
    {
      letter: 'C',
      sample: 5,
      accept: ['down', 'down', 'down', 'down', 'down', 'down', 'down', 0, 'up', 'down'],
    },
    { letter: 'D', sample: 8, accept: ['down', 'down', 'down', 'down', 'down', 'down', 0, 'up', 'down', 1] },
    { letter: 'E', sample: 13, accept: ['down', 'down', 'down', 'down', 'down', 0, 'up', 'down', 1, 2] },
    { letter: 'F', sample: 20, accept: ['down', 'down', 'down', 'down', 0, 'up', 'down', 1, 2, 3] },
    { letter: 'G', sample: 32, accept: ['down', 'down', 'down', 0, 'up', 'down', 1, 2, 3, 5] },
    { letter: 'H', sample: 50, accept: ['down', 'down', 0, 'up', 'down', 1, 2, 3, 5, 7] },
    { letter: 'J', sample: 80, accept: ['down', 0, 'up', 'down', 1, 2, 3, 5, 7, 10] },
    { letter: 'K', sample: 125, accept: [0, 'up', 'down', 1, 2, 3, 5, 7, 10, 14] },
    { letter: 'L', sample: 200, accept: ['up', 'down', 1, 2, 3, 5, 7, 10, 14, 21] },
    { letter: 'M', sample: 315, accept: ['down', 1, 2, 3, 5, 7, 10, 14, 21, 'up'] },
    { letter: 'N', sample: 500, accept: [1, 2, 3, 5, 7, 10, 14, 21, 'up', 'up'] },
    { letter: 'P', sample: 800, accept: [2, 3, 5, 7, 10, 14, 21, 'up', 'up', 'up'] },
    { letter: 'Q', sample: 1250, accept: [3, 5, 7, 10, 14, 21, 'up', 'up', 'up', 'up'] },
    { letter: 'R', sample: 2000, accept: [5, 7, 10, 14, 21, 'up', 'up', 'up', 'up', 'up'] },
  ],
}
