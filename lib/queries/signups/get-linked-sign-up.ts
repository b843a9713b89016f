import 'server-only'
import type { LinkedSignUp } from '@/lib/contracts/signups'
import { Module, Offer, SignUp, Workshop } from '@/models'

/** Which link of which mail; the table knows hashes only. */
type Link = { confirmTokenHash: string } | { takeBackTokenHash: string }

/** The sign-up a mailed link is about, as its page shows it before anything is done; null for an unknown link. Two statements. */
export async function getLinkedSignUp(link: Link, now: Date): Promise<LinkedSignUp | null> {
  const row = await SignUp.findOne({
    where: link,
    include: [
      { model: Offer, as: 'offer', required: true, attributes: ['kind'] },
      { model: Module, as: 'module', required: true, attributes: ['slug', 'name'] },
    ],
  })
  if (!row) return null
  const workshop = await Workshop.findByPk(row.workshopId, {
    attributes: ['slug', 'name'],
    rejectOnEmpty: true,
  })
  return {
    state: row.state,
    isExpired: row.state === 'unconfirmed' && row.confirmExpiresAt <= now,
    workshop: { slug: workshop.slug, name: workshop.name },
    module: { slug: row.module!.slug, name: row.module!.name },
    offer: row.offer!.kind,
    quantity: row.quantity,
    country: row.country,
    certainty: row.certainty,
  }
}
