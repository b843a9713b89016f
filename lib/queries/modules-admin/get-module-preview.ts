import 'server-only'
import type { ModulePage } from '@/lib/contracts/module-page'
import { can, type Actor } from '@/lib/core/policy/can'
import { findWithOffers } from '@/lib/queries/public/find-public-module'
import { toModulePage } from '@/lib/queries/public/get-module-page'
import { Workshop } from '@/models'

/**
 * A module's page as it would be read if it were published, whatever its state; null when there is none to see. As many
 * statements as the page itself.
 */
export async function getModulePreview(cmd: {
  actor: Actor
  workshopId: string
  module: string
  now: Date
}): Promise<ModulePage | null> {
  const { actor, workshopId } = cmd
  if (!can(actor, 'module:preview', { workshopId })) return null
  const workshop = await Workshop.findByPk(workshopId)
  const found = workshop && (await findWithOffers(workshop, { slug: cmd.module }))
  return found && toModulePage(found, cmd.now)
}
