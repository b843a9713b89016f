import { SignUpInput, type Certainty } from '@/lib/contracts/signups'
import { confirmSignUp } from '@/lib/services/signups/confirm-signup'
import { submitSignUp } from '@/lib/services/signups/submit-signup'
import { chanceOf } from '../chance'
import type { Buyer } from '../crowd'
import type { Stage } from '../stage'
import type { Story } from '../story'
import { done } from './done'
import { sideBySide } from './side-by-side'

type Interest = {
  workshop: string
  module: string
  seed: number
  people: readonly Buyer[]
  /** How often each form is wanted. */
  offers: readonly (readonly ['boards' | 'kit' | 'built', number])[]
  /** Days over which they come. */
  days: number
  /** Of a hundred, how many never open the link. */
  unconfirmedPercent: number
  topPrices?: readonly number[]
}

export type Interested = Buyer & {
  offer: 'boards' | 'kit' | 'built'
  quantity: number
  certainty: Certainty
}

/** People come in small crowds: fewer moments to wait for make a demo that is there sooner. */
const DAYS_AT_ONCE = 4

const CERTAINTY: readonly (readonly [Certainty, number])[] = [
  ['certain', 4],
  ['likely', 4],
  ['curious', 2],
]
const QUANTITY: readonly (readonly [number, number])[] = [
  [1, 17],
  [2, 3],
]

/** People register interest over some days and confirm from the mail; gives back those who did. */
export async function* gatherInterest(stage: Stage, given: Interest): Story<Interested[]> {
  const chance = chanceOf(given.seed)
  const began = await stage.now()
  const confirmed: Interested[] = []
  for (let day = 0; day < given.days; day += DAYS_AT_ONCE) {
    const upTo = (passed: number) =>
      Math.round((given.people.length * Math.min(passed, given.days)) / given.days)
    const these = given.people.slice(upTo(day), upTo(day + DAYS_AT_ONCE)).map((buyer) => ({
      ...buyer,
      offer: chance.weighted(given.offers),
      quantity: chance.weighted(QUANTITY),
      certainty: chance.weighted(CERTAINTY),
      confirms: chance.next() * 100 >= given.unconfirmedPercent,
      topPriceMinor: given.topPrices && chance.pick(given.topPrices),
      updates: chance.next() < 0.6,
    }))
    const now = await stage.now()
    await sideBySide(these, async ({ confirms: _, name: _name, address: _address, ...asked }) => {
      const input = SignUpInput.parse({ workshop: given.workshop, module: given.module, ...asked })
      done(await submitSignUp({ input, now }), `a sign-up for ${given.module}`)
    })
    await stage.settle()
    const sure = these.filter(({ confirms }) => confirms)
    await sideBySide(sure, async ({ email }) => {
      const token = await stage.tokenFrom(email, '/confirm')
      done(await confirmSignUp({ token, now: await stage.now() }), 'confirming')
    })
    confirmed.push(...sure)
    yield new Date(began.getTime() + Math.min(day + DAYS_AT_ONCE, given.days) * 86_400_000)
  }
  return confirmed
}

/** What somebody who was interested orders: what they said. */
export const orderOf = ({ offer, quantity, ...buyer }: Interested) => ({
  ...buyer,
  lines: [{ offer, quantity }],
})
