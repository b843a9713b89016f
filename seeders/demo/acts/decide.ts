import { askBalances } from '@/lib/services/runs/ask-balances'
import { callOffRun } from '@/lib/services/runs/call-off-run'
import { lockRun } from '@/lib/services/runs/lock-run'
import type { Stage } from '../stage'
import { done } from './done'
import type { Founded } from './found-workshop'
import { keepParts, type PartLine } from './keep-parts'

type Decided = { module: string; revision: string; parts: readonly PartLine[] }

/** The go: quotes and stock looked at once more, then the lock. What still lacks is waived with its reason. */
export async function lock(
  stage: Stage,
  house: Founded,
  runId: string,
  { module, revision, parts }: Decided,
  input: { reason?: string; waivers?: { key: 'promise' | 'quotes' | 'repay'; reason: string }[] } = {},
): Promise<void> {
  const { workshopId } = house
  await keepParts(stage, house, { module, revision, lines: parts })
  const [actor, now] = [await stage.person(house.owner), await stage.now()]
  done(await lockRun({ actor, workshopId, runId, input, now }), `${module}: the lock`)
  await stage.settle()
}

/** The no-go: everyone gets everything back. */
export async function callOff(stage: Stage, house: Founded, runId: string, reason: string): Promise<void> {
  const { workshopId } = house
  const [actor, now] = [await stage.person(house.owner), await stage.now()]
  done(await callOffRun({ actor, workshopId, runId, reason, now }), 'calling off')
  await stage.settle()
}

/** Balances announced; a week later the saved cards are charged. */
export async function askForBalances(stage: Stage, house: Founded, runId: string): Promise<void> {
  const { workshopId } = house
  const [actor, now] = [await stage.person(house.owner), await stage.now()]
  done(await askBalances({ actor, workshopId, runId, now }), 'asking for balances')
  await stage.settle()
}
