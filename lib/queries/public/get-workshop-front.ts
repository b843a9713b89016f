import 'server-only'
import type { WorkshopFront } from '@/lib/contracts/module-page'
import { Workshop } from '@/models'
import { getPublicRecord } from './get-public-record'
import { listModuleCards } from './list-module-cards'
import { toMaker } from './to-maker'

/** A workshop's own front; null while the host has not opened it. Four statements. */
export async function getWorkshopFront(cmd: { slug: string; now: Date }): Promise<WorkshopFront | null> {
  const workshop = await Workshop.findOne({ where: { slug: cmd.slug, state: ['open', 'suspended'] } })
  if (!workshop) return null
  return {
    maker: toMaker(workshop),
    isOpen: workshop.state === 'open',
    modules: await listModuleCards({ workshopId: workshop.id, now: cmd.now }),
    record: await getPublicRecord(workshop),
  }
}
