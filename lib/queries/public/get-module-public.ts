import 'server-only'
import type { ModulePublic } from '@/lib/contracts/modules'
import { dayIn } from '@/lib/core/time/zone'
import { deliveryOf } from './delivery-of'
import { findPublicModule } from './find-public-module'
import { countUnits, findPublicRun, toPageRun } from './find-public-run'
import { getInterest } from './get-interest'
import { pricesOf } from './prices-of'

/**
 * What anyone may know of a module, with postage and tax for one country; null when it is not public. A bounded number
 * of statements.
 */
export async function getModulePublic(cmd: {
  workshop: string
  module: string
  country: string | undefined
  now: Date
}): Promise<ModulePublic | null> {
  const found = await findPublicModule(cmd)
  if (!found) return null
  const { workshop, module, offers } = found
  const run = await findPublicRun(module.id)
  const units = await countUnits(run ? [run.id] : [])
  const view = run && toPageRun(run, workshop, units.get(run.id), cmd.now)
  return {
    module: {
      slug: module.slug,
      name: module.name,
      oneLine: module.oneLine,
      workshop: workshop.slug,
      workshopName: workshop.name,
    },
    offers: offers.map(({ kind, priceMinor, depositMinor }) => ({
      offer: kind,
      priceMinor,
      depositMinor,
      currency: workshop.currency,
    })),
    interest: await getInterest(module),
    run: view && {
      id: view.id,
      state: view.state,
      minimum: view.minimum,
      maximum: view.maximum,
      deposited: view.deposited,
      held: view.held,
      waiting: view.waiting,
      decideBy: view.decideBy,
      opensToAllAt: view.opensToAllAt,
      offers: view.offers,
    },
    delivery: await deliveryOf({
      workshop,
      offers,
      priceOf: pricesOf(run?.offers ?? []),
      country: cmd.country ?? workshop.country,
      on: dayIn(cmd.now, workshop.timeZone),
    }),
  }
}
