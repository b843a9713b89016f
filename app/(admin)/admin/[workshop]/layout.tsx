import { SignedFrame } from '@/app/_parts/signed-frame'
import { currentActor } from '@/lib/auth/actor'
import { deskWords as words } from '@/lib/messages/desk'
import { problemWords } from '@/lib/messages/problems'
import { paths } from '@/lib/paths'
import { getDeskWorkshop } from '@/lib/queries/workshops/get-desk-workshop'

type Props = { params: Promise<{ workshop: string }>; children: React.ReactNode }

/** The frame of a workshop's desk. Who may see a page is the page's matter: it alone knows where to come back to. */
export default async function DeskLayout({ params, children }: Props) {
  const { workshop: slug } = await params
  const workshop = await getDeskWorkshop({ actor: await currentActor(), slug, deed: 'workshop:read' })
  const links = [
    { href: paths.admin(slug), label: words.today },
    { href: paths.adminModules(slug), label: words.modules },
    { href: paths.adminRuns(slug), label: words.runs },
    { href: paths.adminMoney(slug, 'books'), label: words.money },
    { href: paths.adminProblems(slug), label: problemWords.title },
    { href: paths.adminSettings(slug), label: words.settings },
    { href: paths.packing(slug), label: words.packing },
  ]
  return (
    <SignedFrame here={paths.admin(slug)} links={workshop ? links : []} marksCurrent>
      {children}
    </SignedFrame>
  )
}
