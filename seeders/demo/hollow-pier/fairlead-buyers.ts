import { CARD, type Wanted } from '../acts/place-orders'
import { crowd, type Buyer } from '../crowd'

const from = (seed: number, country: string): Buyer => crowd(seed, 1, [[country, 1]])[0]!
const one = (offer: 'boards' | 'kit' | 'built') => [{ offer, quantity: 1 }]

/** Written by name, since something happens to each. */
export const FAIRLEAD_BUYERS = {
  /** Her card is refused for the balance, and she never answers: three units, three places free again. */
  lapses: { ...from(301, 'US'), lines: [{ offer: 'kit', quantity: 3 }], card: CARD.refusedLater },
  /** Pays the balance by link with another card, and disputes it a day later. */
  disputes: { ...from(302, 'FR'), lines: one('kit'), card: CARD.refusedLater },
  japan: { ...from(303, 'JP'), lines: one('built') },
  paused: { ...from(304, 'AU'), lines: one('built') },
  bounces: { ...from(305, 'NL'), email: 'bounce.holt@post.brimline.example', lines: one('kit') },
} satisfies Record<string, Wanted>

/** A studio in Leipzig, with its number on the papers. */
const studio: Wanted = {
  ...from(306, 'DE'),
  lines: [
    { offer: 'built', quantity: 2 },
    { offer: 'boards', quantity: 1 },
  ],
}
studio.address = { ...studio.address, organization: 'Studio Nordwall GbR', taxNumber: 'DE000000000' }

/** One buyer with two orders: one for home, one for a friend. */
const twice: Wanted = { ...from(307, 'DE'), lines: one('kit') }
const friend = from(308, 'AT')

/** Everyone with a place, in the order they come; the run is full then. */
export const FAIRLEAD_ORDERS: readonly Wanted[] = [
  ...crowd(311, 6).map((buyer, index) => ({ ...buyer, lines: one(index % 3 === 0 ? 'built' : 'kit') })),
  FAIRLEAD_BUYERS.lapses,
  studio,
  FAIRLEAD_BUYERS.disputes,
  FAIRLEAD_BUYERS.japan,
  FAIRLEAD_BUYERS.paused,
  twice,
  { ...twice, address: friend.address, country: friend.country },
  FAIRLEAD_BUYERS.bounces,
  ...crowd(312, 7, [
    ['DE', 5],
    ['US', 3],
    ['GB', 2],
  ]).map((buyer, index) => ({ ...buyer, lines: one(index % 2 === 0 ? 'built' : 'boards') })),
]

/** Places in the run: every one of them taken. */
export const FAIRLEAD_PLACES = FAIRLEAD_ORDERS.flatMap(({ lines }) => lines).reduce(
  (sum, { quantity }) => sum + quantity,
  0,
)

/** Those who came too late, wait, and get the places that come free. Their bank asks them each time. */
export const FAIRLEAD_WAITING: readonly Wanted[] = crowd(313, 3, [
  ['DE', 1],
  ['SE', 1],
]).map((buyer, index) => ({
  ...buyer,
  email: buyer.email.replace('@', `.late-${index + 1}@`),
  lines: one('kit'),
  card: CARD.asksAlways,
}))
