import 'server-only'
import { Choice, ChoiceAnswer, Module, Offer, Workshop } from '@/models'

export type FoundModule = { workshop: Workshop; module: Module; offers: Offer[] }

/**
 * A published module of a workshop the public may see, with its offers and their questions. A suspended workshop's pages
 * stay, for those who have ordered there. Null when there is none. Four statements.
 */
export async function findPublicModule(cmd: {
  workshop: string
  module: string
}): Promise<FoundModule | null> {
  const workshop = await Workshop.findOne({ where: { slug: cmd.workshop, state: ['open', 'suspended'] } })
  return workshop && findWithOffers(workshop, { slug: cmd.module, state: 'published' })
}

/** A module of a workshop with its offers and their questions, whatever its state unless that is named. Three statements. */
export async function findWithOffers(
  workshop: Workshop,
  where: { slug: string; state?: 'published' },
): Promise<FoundModule | null> {
  const module = await Module.findOne({
    where: { ...where, workshopId: workshop.id },
    include: [
      {
        model: Offer,
        as: 'offers',
        required: false,
        where: { withdrawnAt: null },
        include: [
          {
            model: Choice,
            as: 'choices',
            separate: true,
            where: { retiredAt: null },
            order: [['position', 'ASC']],
            include: [{ model: ChoiceAnswer, as: 'answers', separate: true, order: [['position', 'ASC']] }],
          },
        ],
      },
    ],
    order: [[{ model: Offer, as: 'offers' }, 'position', 'ASC']],
  })
  return module && { workshop, module, offers: module.offers ?? [] }
}
