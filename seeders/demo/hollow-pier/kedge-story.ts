import { closeRun } from '@/lib/services/runs/close-run'
import { done } from '../acts/done'
import { askForBalances, callOff, lock } from '../acts/decide'
import type { Founded } from '../acts/found-workshop'
import { designModule } from '../acts/design-module'
import { gatherInterest, orderOf, type Interested } from '../acts/gather-interest'
import { openRun } from '../acts/open-run'
import { packAndPost } from '../acts/pack-and-post'
import { placeOrders } from '../acts/place-orders'
import { crowd } from '../crowd'
import { PEOPLE } from '../people'
import type { Stage } from '../stage'
import type { Story } from '../story'
import { daysAfter } from '../acts/days'
import { KEDGE } from './kedge'
import { KEDGE_PRICES } from './prices'

const DECIDED = { module: 'kedge', revision: 'B', parts: KEDGE.parts }
const OFFERS = [
  ['boards', 2],
  ['kit', 5],
  ['built', 3],
] as const

/** Kedge before today: one run posted early, one late, and one that did not come together. */
export async function* kedgeStory(stage: Stage, house: Founded): Story {
  await designModule(stage, house, KEDGE)
  const began = await stage.now()
  const interest = { workshop: house.slug, module: 'kedge', offers: OFFERS, days: 8, unconfirmedPercent: 6 }
  const first = yield* gatherInterest(stage, { ...interest, seed: 21, people: crowd(21, 14) })
  yield* wholeRun(stage, house, { buyers: first.slice(0, 11), minimum: 10, postedIn: 96, packedIn: 92 })
  yield daysAfter(began, 112)
  const second = yield* gatherInterest(stage, { ...interest, seed: 22, people: crowd(22, 13) })
  yield* wholeRun(stage, house, { buyers: second.slice(0, 10), minimum: 10, postedIn: 84, packedIn: 103 })

  yield daysAfter(began, 232)
  const run = await openRun(stage, house, {
    ...{ module: 'kedge', revision: 'B', minimum: 25, maximum: 40, decideIn: 30 },
    ...{ postedIn: { boards: 80, kit: 95, built: 110 }, prices: KEDGE_PRICES },
  })
  yield daysAfter(await stage.now(), 3)
  const few = crowd(23, 6).map((buyer) => ({ ...buyer, lines: [{ offer: 'kit' as const, quantity: 1 }] }))
  yield* placeOrders(stage, run, few, 5)
  yield daysAfter(await stage.now(), 18)
  const why = 'Six orders where twenty-five were needed. The design stays; ask for it and we try again.'
  await callOff(stage, house, run, why)
}

type Whole = { buyers: Interested[]; minimum: number; postedIn: number; packedIn: number }

async function* wholeRun(stage: Stage, house: Founded, plan: Whole): Story {
  const opened = await stage.now()
  const { minimum, postedIn } = plan
  const run = await openRun(stage, house, {
    ...{ module: 'kedge', revision: 'B', minimum, maximum: 20, decideIn: 24 },
    ...{ postedIn: { boards: postedIn, kit: postedIn, built: postedIn }, prices: KEDGE_PRICES },
  })
  yield* placeOrders(stage, run, plan.buyers.map(orderOf), 10)
  yield daysAfter(opened, 20)
  await lock(stage, house, run, DECIDED)
  yield daysAfter(opened, plan.packedIn - 12)
  await askForBalances(stage, house, run)
  yield daysAfter(opened, plan.packedIn)
  await packAndPost(stage, house, { packer: PEOPLE.lene, most: 50, from: 'DE' })
  yield daysAfter(opened, plan.packedIn + 6)
  const actor = await stage.person(house.owner)
  const { workshopId } = house
  done(await closeRun({ actor, workshopId, runId: run, now: await stage.now() }), 'closing a run')
}
