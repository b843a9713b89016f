import {
  FirstUnitInput,
  LessonInput,
  ModuleFactsInput,
  ModuleNewInput,
  OfferInput,
  RevisionInput,
} from '@/lib/contracts/module-forms'
import { PlanInput } from '@/lib/contracts/plan-forms'
import { createModule } from '@/lib/services/modules/create-module'
import { createRevision } from '@/lib/services/modules/create-revision'
import { mendLesson } from '@/lib/services/modules/mend-lesson'
import { publishModule } from '@/lib/services/modules/publish-module'
import { recordFirstUnit } from '@/lib/services/modules/record-first-unit'
import { saveModule } from '@/lib/services/modules/save-module'
import { saveOffer } from '@/lib/services/modules/save-offer'
import { savePlan } from '@/lib/services/modules/save-plan'
import { writeLesson } from '@/lib/services/modules/write-lesson'
import type { Stage } from '../stage'
import { dayAfter } from './days'
import { done } from './done'
import type { Founded } from './found-workshop'
import { keepParts, type PartLine } from './keep-parts'

type Lesson = { symptom: string; howFound: string; cause: string; remedy: string; mendedIn: string }

/** A design as its owner types it in. The last revision is the proven one. */
export type ModulePlan = {
  start: { name: string; slug: string; oneLine: string; widthHp: number; depthMm: number }
  page: Record<string, unknown>
  offers: readonly Record<string, unknown>[]
  revisions: readonly { letter: string; note: string; lessons?: readonly Lesson[] }[]
  firstUnit: string
  parts: readonly PartLine[]
  costs: Record<string, unknown>
  /** What a unit of another currency costs in the workshop's own. */
  rates: readonly { currency: string; rate: string }[]
}

/** A module with everything its page and its figures need, published. */
export async function designModule(stage: Stage, house: Founded, plan: ModulePlan): Promise<void> {
  const { workshopId } = house
  const [actor, now] = [await stage.person(house.owner), await stage.now()]
  const { slug: module } = plan.start
  const on = { actor, workshopId, module, now }
  done(await createModule({ actor, workshopId, input: ModuleNewInput.parse(plan.start), now }), module)
  const facts = ModuleFactsInput.parse({ ...plan.start, ...plan.page })
  done(await saveModule({ ...on, input: facts }), `${module}: facts`)
  for (const offer of plan.offers)
    done(await saveOffer({ ...on, input: OfferInput.parse(offer) }), `${module}: offer`)

  const learned: { lesson: string; revision: string }[] = []
  for (const { letter, note, lessons = [] } of plan.revisions) {
    done(await createRevision({ ...on, input: RevisionInput.parse({ letter, note }) }), `${module} ${letter}`)
    for (const { mendedIn, ...lesson } of lessons) {
      const input = LessonInput.parse({ revision: letter, ...lesson })
      const written = done(await writeLesson({ ...on, input }), `${module}: lesson`)
      learned.push({ lesson: written.lesson, revision: mendedIn })
    }
  }
  for (const input of learned) done(await mendLesson({ ...on, input }), `${module}: mending`)
  const revision = plan.revisions.at(-1)!.letter
  const unit = FirstUnitInput.parse({ revision, on: dayAfter(now, -1), how: plan.firstUnit })
  done(await recordFirstUnit({ ...on, input: unit }), `${module}: first unit`)
  await keepParts(stage, house, { module, revision, lines: plan.parts })
  const rated = {
    ...plan.costs,
    rates: plan.rates.map((rate) => ({ ...rate, on: dayAfter(now, -2), margin: '3' })),
  }
  done(await savePlan({ ...on, input: PlanInput.parse(rated) }), `${module}: plan`)
  done(await publishModule(on), `${module}: publishing`)
}
