import { DestinationInput } from '@/lib/contracts/settings'
import { saveDestination } from '@/lib/services/settings/save-destination'
import { dayAfter, daysAfter } from '../acts/days'
import { askForBalances, lock } from '../acts/decide'
import { designModule } from '../acts/design-module'
import { done } from '../acts/done'
import type { Founded } from '../acts/found-workshop'
import { gatherInterest } from '../acts/gather-interest'
import { openRun } from '../acts/open-run'
import { packAndPost } from '../acts/pack-and-post'
import { payWhatIsDue, placeOrders } from '../acts/place-orders'
import { crowd } from '../crowd'
import { PEOPLE } from '../people'
import type { Stage } from '../stage'
import type { Story } from '../story'
import { FAIRLEAD } from './fairlead'
import { FAIRLEAD_BUYERS, FAIRLEAD_ORDERS, FAIRLEAD_PLACES, FAIRLEAD_WAITING } from './fairlead-buyers'
import { FAIRLEAD_PRICES } from './prices'

const OFFERS = [
  ['boards', 2],
  ['kit', 5],
  ['built', 4],
] as const

/** Fairlead: full, locked, built, and in packing today, with what goes wrong in any run. */
export async function* fairleadStory(stage: Stage, house: Founded, today: Date): Story {
  const before = (days: number, hour?: number) => daysAfter(today, -days, hour)
  const { workshopId } = house
  yield before(112)
  await designModule(stage, house, FAIRLEAD)
  const interest = {
    workshop: house.slug,
    module: 'fairlead',
    offers: OFFERS,
    days: 14,
    unconfirmedPercent: 9,
  }
  yield* gatherInterest(stage, { ...interest, seed: 31, people: crowd(31, 36) })

  yield before(96)
  const run = await openRun(stage, house, {
    ...{ module: 'fairlead', revision: 'A', minimum: 20, maximum: FAIRLEAD_PLACES, decideIn: 24 },
    ...{ postedIn: { boards: 98, kit: 100, built: 104 }, prices: FAIRLEAD_PRICES },
  })
  yield before(93)
  const placed = yield* placeOrders(stage, run, FAIRLEAD_ORDERS, 9)
  const waiting = yield* placeOrders(stage, run, FAIRLEAD_WAITING, 1)
  const orderOf = (buyer: { email: string }) =>
    placed[FAIRLEAD_ORDERS.findIndex(({ email }) => email === buyer.email)]!

  yield before(75)
  await lock(stage, house, run, { module: 'fairlead', revision: 'A', parts: FAIRLEAD.parts })
  yield before(35)
  await askForBalances(stage, house, run)
  yield before(26)
  const { disputes } = FAIRLEAD_BUYERS
  await payWhatIsDue(stage, disputes.email, orderOf(disputes), '4000 0000 0000 2685')
  // Two weeks after her card was refused one order lapses; its places go to those who waited, whose
  // balances are asked for as their deposits arrive.
  yield before(13)
  for (const [index, { email, card }] of FAIRLEAD_WAITING.entries())
    await payWhatIsDue(stage, email, waiting[index]!, card!)
  yield before(6)
  const actor = await stage.person(house.owner)
  const input = DestinationInput.parse({
    ...{ module: 'fairlead', country: 'AU', state: 'paused' },
    reason: `The post takes no parcels to Australia until ${dayAfter(today, 9)}.`,
  })
  done(await saveDestination({ actor, workshopId, input, now: await stage.now() }), 'pausing a destination')
  yield before(4)
  await packAndPost(stage, house, { packer: PEOPLE.lene, most: 6, from: 'DE' })
  yield before(1, 7)
  await packAndPost(stage, house, { packer: PEOPLE.lene, most: 2, from: 'DE', isHandedOver: false })
}
