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
  if (!workshop) return null
  const module = await Module.findOne({
    where: { workshopId: workshop.id, slug: cmd.module, state: 'published' },
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
