import { performance } from 'node:perf_hooks'
import { pathToFileURL } from 'node:url'
import { forecastUnits } from '@/lib/core/demand/forecast'
import { finishDays, type ScheduleStep } from '@/lib/core/schedule/finish'

type Measure = { name: string; value: number; unit: string }

/** The median of several runs after two to warm up, in milliseconds. */
function millisecondsOf(work: () => void, runs = 7): number {
  work()
  work()
  const times = Array.from({ length: runs }, () => {
    const start = performance.now()
    work()
    return performance.now() - start
  })
  return times.sort((a, b) => a - b)[Math.floor(runs / 2)] as number
}

const quantities = (members: number) => Array.from({ length: members }, (_, i) => 1 + (i % 10))
const shares = [
  { alpha: 6, beta: 4 },
  { alpha: 3, beta: 7 },
  { alpha: 1, beta: 9 },
]
const classes = (members: number) =>
  shares.map((each) => ({ ...each, quantities: quantities(Math.round(members / 3)) }))

/** What one would write first: convolve member by member at evenly spaced conversions, then average. */
function naiveForecast(members: number): number[] {
  const asked = quantities(members)
  const units = asked.reduce((a, b) => a + b, 0)
  const values = Math.ceil(4.5 * Math.sqrt(members)) + 16
  const sum = new Array<number>(units + 1).fill(0)
  for (let i = 0; i < values; i += 1) {
    const p = (i + 0.5) / values
    const pmf = new Float64Array(units + 1)
    pmf[0] = 1
    let upTo = 0
    for (const quantity of asked) {
      upTo += quantity
      for (let k = upTo; k >= 0; k -= 1) {
        pmf[k] = (pmf[k] as number) * (1 - p) + (k >= quantity ? (pmf[k - quantity] as number) * p : 0)
      }
    }
    pmf.forEach((chance, k) => (sum[k] = (sum[k] as number) + chance / values))
  }
  return sum
}

/** A plan of four steps per block, three side by side before the fourth. */
function plan(blocks: number): ScheduleStep[] {
  return Array.from({ length: blocks }, (_, b) => {
    const after = b > 0 ? [`join${b - 1}`] : []
    return [
      { id: `boards${b}`, optimistic: 8, likely: 12, pessimistic: 25, after },
      { id: `parts${b}`, optimistic: 3, likely: 6, pessimistic: 30, after },
      { id: `fronts${b}`, optimistic: 5, likely: 10, pessimistic: 20, after },
      {
        id: `join${b}`,
        optimistic: 1,
        likely: 2,
        pessimistic: 9,
        after: [`boards${b}`, `parts${b}`, `fronts${b}`],
      },
    ]
  }).flat()
}

/** Twenty steps, each waiting for the ones two and three before it: crossings nothing can shorten. */
function crossing(): ScheduleStep[] {
  return Array.from({ length: 20 }, (_, i) => ({
    id: `step${i}`,
    optimistic: 2,
    likely: 4,
    pessimistic: 9 + (i % 7),
    after: i < 3 ? [] : [`step${i - 2}`, `step${i - 3}`],
  }))
}

/** Two shared steps among twenty. */
function shared(): ScheduleStep[] {
  const three = { optimistic: 2, likely: 5, pessimistic: 18 }
  const head = [
    { id: 'a', ...three, after: [] },
    { id: 'b', ...three, after: [] },
    { id: 'c', ...three, after: ['a'] },
    { id: 'd', ...three, after: ['a', 'b'] },
    { id: 'e', ...three, after: ['b'] },
    { id: 'f', ...three, after: ['c', 'd', 'e'] },
  ]
  const tail = Array.from({ length: 14 }, (_, i) => ({
    id: `t${i}`,
    ...three,
    after: [i === 0 ? 'f' : `t${i - 1}`],
  }))
  return [...head, ...tail]
}

/** Two thousand simulated finishes with triangular steps, as a spreadsheet would do. */
function naiveFinish(steps: readonly ScheduleStep[]): number {
  let state = 1
  const next = () => (state = (state * 1664525 + 1013904223) % 4294967296) / 4294967296
  let late = 0
  for (let run = 0; run < 2000; run += 1) {
    const ends = new Map<string, number>()
    for (const { id, optimistic, likely, pessimistic, after } of steps) {
      const cut = (likely - optimistic) / (pessimistic - optimistic)
      const u = next()
      const range = pessimistic - optimistic
      const days =
        u < cut
          ? optimistic + range * Math.sqrt(u * cut)
          : pessimistic - range * Math.sqrt((1 - u) * (1 - cut))
      ends.set(id, Math.max(0, ...after.map((each) => ends.get(each) as number)) + days)
    }
    if (Math.max(...ends.values()) > 100) late += 1
  }
  return late
}

function forecastMeasures(): Measure[] {
  const sizes = [1250, 2500, 5000]
  const times = sizes.map((members) => millisecondsOf(() => void forecastUnits(classes(members))))
  const single = millisecondsOf(
    () => void forecastUnits([{ alpha: 2, beta: 3, quantities: quantities(5000) }]),
  )
  const exact = millisecondsOf(() => void forecastUnits([{ alpha: 1, beta: 1, quantities: quantities(400) }]))
  const naive = millisecondsOf(() => void naiveForecast(400), 3)
  return [
    ...sizes.map((members, i) => ({
      name: `forecastUnits, ${members} members of 1–10 in three classes (${2 ** i}×)`,
      value: times[i] as number,
      unit: 'ms',
    })),
    { name: 'forecastUnits, 5000 members of 1–10 in one class', value: single, unit: 'ms' },
    {
      name: 'forecastUnits, 400 members: naive convolution takes',
      value: naive / exact,
      unit: 'times as long',
    },
  ]
}

function finishMeasures(): Measure[] {
  const blocks = [5, 10, 20]
  const times = blocks.map((count) => millisecondsOf(() => void finishDays(plan(count))))
  const naive = millisecondsOf(() => void naiveFinish(plan(5)), 3)
  return [
    ...blocks.map((count, i) => ({
      name: `finishDays, ${4 * count} steps in series and parallel (${2 ** i}×)`,
      value: times[i] as number,
      unit: 'ms',
    })),
    {
      name: 'finishDays, 20 steps: 2,000 simulated runs take',
      value: naive / (times[0] as number),
      unit: 'times as long',
    },
    {
      name: 'finishDays, 20 steps, two of them shared',
      value: millisecondsOf(() => void finishDays(shared())),
      unit: 'ms',
    },
    {
      name: 'finishDays, 20 steps crossing, bounds',
      value: millisecondsOf(() => void finishDays(crossing())),
      unit: 'ms',
    },
  ]
}

/** Times the forecast and the schedule, at 1×, 2× and 4× their size and beside what one would write first. */
export async function benchDemand(): Promise<Measure[]> {
  return [...forecastMeasures(), ...finishMeasures()]
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  for (const { name, value, unit } of await benchDemand()) {
    console.log(`${name.padEnd(66)} ${value.toFixed(value < 10 ? 2 : 0).padStart(8)} ${unit}`)
  }
}
