import { notFound } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { can } from '@/lib/core/policy/can'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { getDeskWorkshop } from '@/lib/queries/workshops/get-desk-workshop'

type Props = { params: Promise<{ workshop: string }>; children: React.ReactNode }

/** The packer's frame: large targets for a tablet beside the work. */
export default async function PackingLayout({ params, children }: Props) {
  const { workshop: slug } = await params
  const actor = await signedIn(paths.packing(slug))
  const workshop = await getDeskWorkshop({ actor, slug, deed: 'packing:read' })
  if (!workshop) notFound()
  const links = [
    { href: paths.packing(slug), label: words.nav.queue },
    { href: `${paths.packing(slug)}?show=packed`, label: words.nav.packed },
    { href: paths.packingPost(slug), label: words.nav.post },
    { href: paths.packingPapers(slug, 'list'), label: words.listTitle },
    { href: paths.packingPapers(slug, 'slips'), label: words.slipsTitle },
    ...(can(actor, 'order:list', { workshopId: workshop.id })
      ? [{ href: paths.admin(slug), label: words.nav.desk }]
      : []),
  ]
  return (
    <SignedFrame
      bench
      here={paths.packing(slug)}
      links={links}
      titleBlock={{ what: words.title, who: workshop.name }}
    >
      {children}
    </SignedFrame>
  )
}
