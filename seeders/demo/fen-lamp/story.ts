import { RunInput } from '@/lib/contracts/runs'
import { createRun } from '@/lib/services/runs/create-run'
import { dayAfter, daysAfter } from '../acts/days'
import { designModule } from '../acts/design-module'
import { done } from '../acts/done'
import { foundWorkshop } from '../acts/found-workshop'
import { gatherInterest } from '../acts/gather-interest'
import { crowd } from '../crowd'
import type { Stage } from '../stage'
import type { Story } from '../story'
import { REEDMACE, REEDMACE_PRICES } from './reedmace'
import { FEN_LAMP } from './workshop'

const OFFERS = [
  ['boards', 1],
  ['kit', 3],
  ['built', 3],
] as const

/** Fen Lamp Circuits: one module, thirty-eight who would like it, and a draft that honestly does not pay. */
export async function* fenLampStory(stage: Stage, today: Date): Story {
  yield daysAfter(today, -60)
  const house = await foundWorkshop(stage, FEN_LAMP)
  await designModule(stage, house, REEDMACE)
  const interest = {
    workshop: house.slug,
    module: 'reedmace',
    offers: OFFERS,
    days: 40,
    unconfirmedPercent: 0,
  }
  yield* gatherInterest(stage, { ...interest, seed: 51, people: crowd(51, 38) })

  yield daysAfter(today, -3)
  const [actor, now] = [await stage.person(house.owner), await stage.now()]
  const input = RunInput.parse({
    ...{ module: 'reedmace', revision: 'A', minimum: 30, maximum: 60, decideBy: dayAfter(today, 40) },
    balanceWhen: 'at_lock',
    offers: (['boards', 'kit', 'built'] as const).map((offer) => ({
      offer,
      ...REEDMACE_PRICES[offer],
      postedBy: dayAfter(today, 150),
    })),
  })
  done(await createRun({ actor, workshopId: house.workshopId, input, now }), 'a draft')
}
