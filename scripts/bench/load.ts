import autocannon, { type Request } from 'autocannon'

const CONNECTIONS = 50
const SLICE_SECONDS = 3
const PAIRS = 6

/**
 * Requests a second of ours against the bare one's, in slices taken in turn so that a busy machine meets both alike; the
 * median of the pairs' ratios.
 */
export async function ratio(ours: () => Promise<number>, bare: () => Promise<number>) {
  await ours()
  await bare()
  const pairs: { ours: number; bare: number }[] = []
  for (let pair = 0; pair < PAIRS; pair += 1) pairs.push({ ours: await ours(), bare: await bare() })
  const median = (list: number[]) => list.sort((a, b) => a - b)[Math.floor(list.length / 2)]!
  return {
    ratio: median(pairs.map((each) => each.ours / each.bare)),
    ours: median(pairs.map((each) => each.ours)),
    bare: median(pairs.map((each) => each.bare)),
  }
}

/** Requests a second, every one of them answered with success. */
export async function load(url: string, request: Request = {}): Promise<number> {
  const answer = await autocannon({
    url,
    connections: CONNECTIONS,
    duration: SLICE_SECONDS,
    requests: [request],
  })
  if (answer.non2xx > 0 || answer.errors > 0)
    throw new Error(`${url}: ${answer.non2xx} answers were not 2xx, ${answer.errors} failed`)
  return answer.requests.average
}
