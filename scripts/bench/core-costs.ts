import { performance } from 'node:perf_hooks'
import { pathToFileURL } from 'node:url'
import { costCurve } from '@/lib/core/costs/curve'
import { costRun } from '@/lib/core/costs/run-cost'
import { ADDRESS_COUNTRIES } from '@/lib/core/data/address-countries'
import { ADDRESS_POSTCODES } from '@/lib/core/data/address-postcodes'
import { divide } from '@/lib/core/money/allocate'
import { addressProblems, type Address } from '@/lib/core/post/address'
import { samplePlan } from '@/tests/core/costs/sample-plan'

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

const MIX = { boards: 45, kit: 95, built: 165 }
const QUANTITIES = 1000

/** What one would write first: cost every quantity for itself. Timed at every fiftieth one, and multiplied. */
function naiveCurve(parts: number): number {
  const plan = samplePlan(parts)
  const sampled = Array.from({ length: QUANTITIES / 50 }, (_, i) => 50 * (i + 1))
  const once = millisecondsOf(() => {
    for (const units of sampled) {
      const split = divide(units, Object.values(MIX))
      const [boards = 0, kit = 0, built = 0] = split.ok ? split.value : []
      costRun(plan, { boards, kit, built })
    }
  }, 3)
  return once * 50
}

const ADDRESSES: readonly Address[] = [
  { country: 'DE', name: 'A. Berg', lines: ['Hof 1'], city: 'Ulm', postcode: '89073' },
  { country: 'US', name: 'A. Lee', lines: ['1 Low Rd'], city: 'Salem', region: 'OR', postcode: '97301-12' },
  { country: 'GB', name: 'A. Hull', lines: ['2 Quay St'], city: 'Hull', postcode: 'HU1 1AA' },
  { country: 'KE', name: 'A. Otieno', lines: [] },
  {
    country: 'JP',
    name: '森 花',
    lines: ['神宮前1-2-3'],
    city: '渋谷区',
    region: '東京都',
    postcode: '150-0001',
    latin: { name: 'Hana Mori', lines: ['1-2-3 Jingumae'], city: 'Shibuya-ku', region: 'Tokyo' },
  },
]

function checkAddresses(count: number): void {
  for (let i = 0; i < count; i += 1) addressProblems(ADDRESSES[i % ADDRESSES.length] as Address)
}

/** The costs and addresses of the core at 1×, 2× and 4× their usual size, and how many times a naive way takes. */
export async function benchCosts(): Promise<Measure[]> {
  const curve = [300, 600, 1200].map((parts) => {
    const plan = samplePlan(parts)
    return { parts, ms: millisecondsOf(() => costCurve(plan, MIX, QUANTITIES)) }
  })
  const addresses = [10_000, 20_000, 40_000].map((count) => ({
    count,
    ms: millisecondsOf(() => checkAddresses(count)),
  }))
  return [
    ...curve.map(({ parts, ms }) => ({
      name: `costCurve, ${parts} parts × ${QUANTITIES} quantities`,
      value: ms,
      unit: 'ms',
    })),
    { name: 'costCurve, one costRun per quantity instead', value: naiveCurve(300) / curve[0]!.ms, unit: '×' },
    ...addresses.map(({ count, ms }) => ({
      name: `addressProblems, ${count} addresses`,
      value: ms,
      unit: 'ms',
    })),
    {
      name: 'addressProblems, tables searched per address instead',
      value: naiveChecks(10_000) / addresses[0]!.ms,
      unit: '×',
    },
  ]
}

/** The same checks with every table searched from its start and a pattern compiled for each address. */
function naiveChecks(count: number): number {
  return millisecondsOf(() => {
    for (let i = 0; i < count; i += 1) {
      const address = ADDRESSES[i % ADDRESSES.length] as Address
      const isHere = ([country]: readonly [string, unknown]) => country === address.country
      Object.entries(ADDRESS_COUNTRIES).find(isHere)
      const pattern = Object.entries(ADDRESS_POSTCODES).find(isHere)?.[1] ?? ''
      // A fresh source each time, or the engine would keep the pattern too.
      new RegExp(`${pattern}|^${i}$`).test(address.postcode ?? '')
      addressProblems(address)
    }
  })
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href) {
  for (const { name, value, unit } of await benchCosts()) {
    console.log(`${name.padEnd(66)} ${value.toFixed(value < 10 ? 2 : 0).padStart(8)} ${unit}`)
  }
}
