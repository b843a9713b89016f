import 'server-only'
import type { InterestBoard } from '@/lib/contracts/demand'
import { can, type Actor } from '@/lib/core/policy/can'
import { Module } from '@/models'
import { interestOf } from './interest-of'
import { readInterest } from './read-interest'

/** The interest in a module, counted; null when the actor may not see it. Two statements, whatever there is. */
export async function getInterestBoard(cmd: {
  actor: Actor
  workshopId: string
  module: string
}): Promise<InterestBoard | null> {
  const { actor, workshopId } = cmd
  if (!can(actor, 'demand:read', { workshopId })) return null
  const module = await Module.findOne({ where: { workshopId, slug: cmd.module }, include: ['workshop'] })
  if (!module?.workshop) return null
  const { slug, name, workshop } = module
  return {
    module: { slug, name },
    currency: workshop.currency,
    locale: workshop.locale,
    ...interestOf(await readInterest(module.id, workshop.timeZone)),
  }
}
