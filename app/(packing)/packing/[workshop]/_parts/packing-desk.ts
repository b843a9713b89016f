import { notFound } from 'next/navigation'
import { signedIn } from '@/app/_parts/signed-in'
import { paths } from '@/lib/paths'
import { getDeskWorkshop } from '@/lib/queries/workshops/get-desk-workshop'

/** Who packs, and where; anyone else finds no page. */
export async function packingDesk(slug: string, here = paths.packing(slug)) {
  const actor = await signedIn(here)
  const workshop = await getDeskWorkshop({ actor, slug, deed: 'packing:read' })
  if (!workshop) notFound()
  return { actor, workshop }
}
