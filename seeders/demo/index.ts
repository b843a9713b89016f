import { foundWorkshop } from './acts/found-workshop'
import { fenLampStory } from './fen-lamp/story'
import { fairleadStory } from './hollow-pier/fairlead-story'
import { kedgeStory } from './hollow-pier/kedge-story'
import { rowlockStory } from './hollow-pier/rowlock-story'
import { HOLLOW_PIER } from './hollow-pier/workshop'
import { PEOPLE } from './people'
import type { Stage } from './stage'
import { tellTogether } from './story'

/** Who can sign in to the demo, in the order a visitor would try them. */
export const DEMO_SIGN_INS: readonly { email: string; what: string }[] = [
  { email: PEOPLE.mara, what: 'owner of Hollow Pier Modular: runs, decisions, money' },
  { email: PEOPLE.lene, what: 'packer there: the queue, papers, parcels' },
  { email: PEOPLE.jonas, what: 'bench there: units and test sheets' },
  { email: PEOPLE.gwen, what: 'owner of Fen Lamp Circuits' },
  { email: PEOPLE.host, what: 'host: opens and suspends workshops' },
]

/** Days before today on which the demo's history begins. */
export const DEMO_DAYS = 330

/** Makes the demo by the services, as people act, from a day in the past up to now. */
export async function seedDemo(stage: Stage): Promise<void> {
  const today = new Date()
  const house = await foundWorkshop(stage, HOLLOW_PIER)
  await tellTogether(stage, [
    kedgeStory(stage, house),
    fairleadStory(stage, house, today),
    rowlockStory(stage, house, today),
    fenLampStory(stage, today),
  ])
  await stage.goTo(new Date())
}
