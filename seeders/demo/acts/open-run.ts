import { RunInput } from '@/lib/contracts/runs'
import { createRun } from '@/lib/services/runs/create-run'
import { openRun as openForDeposits } from '@/lib/services/runs/open-run'
import type { Stage } from '../stage'
import type { Prices } from '../hollow-pier/shared'
import { dayAfter } from './days'
import { done } from './done'
import type { Founded } from './found-workshop'

type RunPlan = {
  module: string
  revision: string
  minimum: number
  maximum: number
  /** Days from now. */
  decideIn: number
  postedIn: Record<'boards' | 'kit' | 'built', number>
  prices: Prices
}

/** A run drafted and opened now; whoever has confirmed is invited. Gives back its id. */
export async function openRun(stage: Stage, house: Founded, plan: RunPlan): Promise<string> {
  const { workshopId } = house
  const [actor, now] = [await stage.person(house.owner), await stage.now()]
  const offers = (['boards', 'kit', 'built'] as const).map((offer) => ({
    offer,
    ...plan.prices[offer],
    postedBy: dayAfter(now, plan.postedIn[offer]),
  }))
  const { module, revision, minimum, maximum } = plan
  const input = RunInput.parse({
    ...{ module, revision, minimum, maximum, offers },
    decideBy: dayAfter(now, plan.decideIn),
    balanceWhen: 'before_packing',
  })
  const { run } = done(await createRun({ actor, workshopId, input, now }), `${module}: a run`)
  done(await openForDeposits({ actor, workshopId, runId: run, now }), `${module}: opening the run`)
  await stage.settle()
  return run
}
