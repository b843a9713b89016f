import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import type { Deed } from '@/lib/core/policy/deeds'
import { Workshop } from '@/models'

/** A workshop as its own desk needs it on every page. */
export type DeskWorkshop = {
  id: string
  slug: string
  name: string
  state: 'pending' | 'open' | 'suspended'
  currency: string
  timeZone: string
  country: string
  locale: string
  providerAccountId: string | null
  chargesEnabled: boolean
}

/** The workshop of this address, when the actor may do `deed` in it; null otherwise (to them it does not exist). */
export async function getDeskWorkshop(cmd: {
  actor: Actor
  slug: string
  deed: Deed
}): Promise<DeskWorkshop | null> {
  const row = await Workshop.findOne({ where: { slug: cmd.slug } })
  if (!row || !can(cmd.actor, cmd.deed, { workshopId: row.id })) return null
  return {
    id: row.id,
    slug: row.slug,
    name: row.name,
    state: row.state,
    currency: row.currency,
    timeZone: row.timeZone,
    country: row.country,
    locale: row.locale,
    providerAccountId: row.providerAccountId,
    chargesEnabled: row.chargesEnabledAt !== null,
  }
}
