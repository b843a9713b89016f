import { notFound } from 'next/navigation'
import { signedIn } from '@/app/_parts/signed-in'
import type { Deed } from '@/lib/core/policy/deeds'
import { getDeskWorkshop } from '@/lib/queries/workshops/get-desk-workshop'

/** Who looks at a page of a workshop's desk, and the workshop; whoever may not do `deed` there finds nothing. */
export async function deskOf(slug: string, deed: Deed, here: string) {
  const actor = await signedIn(here)
  const workshop = await getDeskWorkshop({ actor, slug, deed })
  if (!workshop) notFound()
  return { actor, workshop }
}
