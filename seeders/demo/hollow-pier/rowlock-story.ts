import { daysAfter } from '../acts/days'
import { designModule } from '../acts/design-module'
import type { Founded } from '../acts/found-workshop'
import { gatherInterest, orderOf } from '../acts/gather-interest'
import { openRun } from '../acts/open-run'
import { placeOrders } from '../acts/place-orders'
import { crowd } from '../crowd'
import type { Stage } from '../stage'
import type { Story } from '../story'
import { ROWLOCK_PRICES } from './prices'
import { ROWLOCK } from './rowlock'

const OFFERS = [
  ['boards', 2],
  ['kit', 5],
  ['built', 4],
] as const

/** Rowlock: many want it, and it takes deposits today, some two thirds of the minimum. */
export async function* rowlockStory(stage: Stage, house: Founded, today: Date): Story {
  const before = (days: number) => daysAfter(today, -days)
  yield before(70)
  await designModule(stage, house, ROWLOCK)
  const interest = {
    workshop: house.slug,
    module: 'rowlock',
    offers: OFFERS,
    days: 48,
    unconfirmedPercent: 8,
  }
  const interested = yield* gatherInterest(stage, { ...interest, seed: 41, people: crowd(41, 100) })

  yield before(17)
  const run = await openRun(stage, house, {
    ...{ module: 'rowlock', revision: 'B', minimum: 60, maximum: 120, decideIn: 34 },
    ...{ postedIn: { boards: 120, kit: 130, built: 150 }, prices: ROWLOCK_PRICES },
  })
  const willing = interested.filter(({ certainty }) => certainty !== 'curious').slice(0, 35)
  yield* placeOrders(stage, run, willing.map(orderOf), 15)
}
