/** One movement as the provider lists it, or as our ledger booked it. */
export type Movement = {
  readonly id: string
  readonly kind: 'charge' | 'refund' | 'dispute' | 'fee' | 'payout'
  readonly amount: number
  readonly currency: string
}

/**
 * One difference between our ledger and the provider's list. `ours` and `theirs` are what differs: the two amounts,
 * the two currencies, or for a missing movement the amount on the side that has it and null on the other.
 */
export type Difference = {
  readonly kind: 'missing_here' | 'missing_there' | 'amount' | 'currency'
  readonly id: string
  readonly ours: number | string | null
  readonly theirs: number | string | null
}

const keyOf = ({ kind, id }: Movement) => JSON.stringify([kind, id])
const exactKeyOf = ({ kind, id, amount, currency }: Movement) => JSON.stringify([kind, id, amount, currency])

/**
 * Every difference between the movements of our ledger and the provider's own list, none when they agree.
 * Movements belong together by kind and id; one booked twice on a side is missing once on the other.
 * Where the currencies differ the amounts are not compared.
 * Units:   minor units on both sides (the provider's already through `fromProvider`), signs alike on both sides.
 * Domain:  amounts safe integers → otherwise RangeError.
 * Order:   ours first, as booked; then what is missing here, as listed.
 * Cost:    linear.
 * @example reconcile([{ id: 'c1', kind: 'charge', amount: 2500, currency: 'EUR' }], [{ id: 'c1', kind: 'charge', amount: 2400, currency: 'EUR' }])  // → [{ kind: 'amount', id: 'c1', ours: 2500, theirs: 2400 }]
 */
export function reconcile(ledger: readonly Movement[], list: readonly Movement[]): Difference[] {
  for (const { id, amount } of [...ledger, ...list]) {
    if (!Number.isSafeInteger(amount)) {
      throw new RangeError(`reconcile: amount must be a safe integer, got ${amount} for ${id}`)
    }
  }
  const equal = pairOff(ledger, list, exactKeyOf)
  const unlike = pairOff(equal.oursAlone, equal.theirsAlone, keyOf)
  return [
    ...unlike.pairs.map(([ours, theirs]) => (theirs ? differ(ours, theirs) : missing(ours, 'missing_there'))),
    ...unlike.theirsAlone.map((theirs) => missing(theirs, 'missing_here')),
  ]
}

type Pairing = {
  /** Every one of ours, in order, with its partner if it found one. */
  readonly pairs: [Movement, Movement | undefined][]
  readonly oursAlone: Movement[]
  readonly theirsAlone: Movement[]
}

/** Pairs movements of equal key, the first of ours with the first of theirs. */
function pairOff(
  ours: readonly Movement[],
  theirs: readonly Movement[],
  key: (movement: Movement) => string,
): Pairing {
  const waiting = new Map<string, number[]>()
  theirs.forEach((each, i) => {
    const places = waiting.get(key(each))
    if (places) places.push(i)
    else waiting.set(key(each), [i])
  })
  const pairs = ours.map((each): [Movement, Movement | undefined] => {
    const place = waiting.get(key(each))?.shift()
    return [each, place === undefined ? undefined : theirs[place]]
  })
  const left = [...waiting.values()].flat().sort((a, b) => a - b)
  return {
    pairs,
    oursAlone: pairs.flatMap(([each, partner]) => (partner ? [] : [each])),
    theirsAlone: left.flatMap((place) => theirs[place] ?? []),
  }
}

function missing({ id, amount }: Movement, kind: 'missing_here' | 'missing_there'): Difference {
  return {
    kind,
    id,
    ours: kind === 'missing_there' ? amount : null,
    theirs: kind === 'missing_here' ? amount : null,
  }
}

function differ(ours: Movement, theirs: Movement): Difference {
  const { id } = ours
  return ours.currency === theirs.currency
    ? { kind: 'amount', id, ours: ours.amount, theirs: theirs.amount }
    : { kind: 'currency', id, ours: ours.currency, theirs: theirs.currency }
}
