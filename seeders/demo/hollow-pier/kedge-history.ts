import { closeRun } from '@/lib/services/runs/close-run'
import { done } from '../acts/done'
import { askForBalances, callOff, lock } from '../acts/decide'
import type { Founded } from '../acts/found-workshop'
import { gatherInterest, type Interested } from '../acts/gather-interest'
import { openRun } from '../acts/open-run'
import { packAndPost } from '../acts/pack-and-post'
import { placeOrders } from '../acts/place-orders'
import { crowd } from '../crowd'
import { PEOPLE } from '../people'
import type { Stage } from '../stage'
import { daysAfter } from '../acts/days'
import { KEDGE } from './kedge'
import { KEDGE_PRICES } from './prices'

const DECIDED = { module: 'kedge', revision: 'B', parts: KEDGE.parts }
const OFFERS = [
  ['boards', 2],
  ['kit', 5],
  ['built', 3],
] as const

const orderOf = ({ offer, quantity, ...buyer }: Interested) => ({ ...buyer, lines: [{ offer, quantity }] })

/** Kedge before today: one run posted early, one late, and one that did not come together. */
export async function kedgeHistory(stage: Stage, house: Founded): Promise<void> {
  const began = await stage.now()
  const at = (days: number) => stage.goTo(daysAfter(began, days))
  const interest = { workshop: house.slug, module: 'kedge', offers: OFFERS, days: 8, unconfirmedPercent: 6 }

  const first = await gatherInterest(stage, { ...interest, seed: 21, people: crowd(21, 34) })
  await wholeRun(stage, house, {
    buyers: first.slice(0, 13),
    minimum: 10,
    maximum: 20,
    postedIn: 96,
    packedIn: 92,
  })
  await at(112)
  const second = await gatherInterest(stage, { ...interest, seed: 22, people: crowd(22, 26) })
  await wholeRun(stage, house, {
    buyers: second.slice(0, 12),
    minimum: 10,
    maximum: 20,
    postedIn: 84,
    packedIn: 103,
  })

  await at(232)
  const run = await openRun(stage, house, {
    ...{ module: 'kedge', revision: 'B', minimum: 25, maximum: 40, decideIn: 30 },
    ...{ postedIn: { boards: 60, kit: 75, built: 90 }, prices: KEDGE_PRICES },
  })
  await stage.goTo(daysAfter(await stage.now(), 3))
  await placeOrders(
    stage,
    run,
    crowd(23, 7).map((buyer) => ({ ...buyer, lines: [{ offer: 'kit', quantity: 1 }] })),
    5,
  )
  await stage.goTo(daysAfter(await stage.now(), 18))
  await callOff(
    stage,
    house,
    run,
    'Seven orders where twenty-five were needed. The design stays; ask for it and we try again.',
  )
}

type Whole = { buyers: Interested[]; minimum: number; maximum: number; postedIn: number; packedIn: number }

async function wholeRun(stage: Stage, house: Founded, plan: Whole): Promise<void> {
  const opened = await stage.now()
  const after = (days: number) => stage.goTo(daysAfter(opened, days))
  const { minimum, maximum, postedIn } = plan
  const run = await openRun(stage, house, {
    ...{ module: 'kedge', revision: 'B', minimum, maximum, decideIn: 24 },
    ...{ postedIn: { boards: postedIn, kit: postedIn, built: postedIn }, prices: KEDGE_PRICES },
  })
  await placeOrders(stage, run, plan.buyers.map(orderOf), 10)
  await after(20)
  await lock(stage, house, run, DECIDED)
  await after(plan.packedIn - 12)
  await askForBalances(stage, house, run)
  await after(plan.packedIn)
  await packAndPost(stage, house, { packer: PEOPLE.lene, most: 50, from: 'DE' })
  await after(plan.packedIn + 6)
  const actor = await stage.person(house.owner)
  const { workshopId } = house
  done(await closeRun({ actor, workshopId, runId: run, now: await stage.now() }), 'closing a run')
}
